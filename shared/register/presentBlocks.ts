import type { RegisterLine } from './registerLine.ts'

/** Codes that a narrow column has room for. */
const MOST = 2

/** The blocks of a line: all their codes, and the first with how many more, for a narrow column. */
export function presentBlocks(blocks: readonly { id: string; code: string }[]): Pick<RegisterLine, 'blockIds' | 'codes' | 'codesShort'> {
  const codes = blocks.map(({ code }) => code)
  return {
    blockIds: blocks.map(({ id }) => id),
    codes: codes.join(', '),
    codesShort: codes.length > MOST ? `${codes[0] ?? ''} +${codes.length - 1}` : codes.join(', '),
  }
}
