import { ImportFault } from './importFault.ts'

const MARKS: readonly (readonly [bytes: readonly number[], encoding: string])[] = [
  [[0xef, 0xbb, 0xbf], 'utf-8'], [[0xff, 0xfe], 'utf-16le'], [[0xfe, 0xff], 'utf-16be'],
]
const DECLARED = /^\s*<\?xml[^>]*?encoding\s*=\s*["']([\w.:-]{1,40})["']/i

/** The text of a file in the encoding that its first bytes or its XML declaration name; UTF-8 where they name none. */
export function readText(bytes: Uint8Array): string {
  const marked = MARKS.find(([mark]) => mark.every((byte, index) => bytes[index] === byte))?.[1]
  const declared = DECLARED.exec(new TextDecoder('latin1').decode(bytes.subarray(0, 200)))?.[1]
  try {
    return new TextDecoder(marked ?? declared ?? 'utf-8', { fatal: true }).decode(bytes)
  } catch {
    throw new ImportFault('encoding')
  }
}
