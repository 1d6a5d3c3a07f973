import type { BlockLine } from '../../../shared/contract/recordContent.ts'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { partArea } from '../../../shared/geo/partArea.ts'

export type SignedBlock = SignedRecord['blocks'][number]

export interface PairedLine {
  line: BlockLine
  /** The block as it was when the record was signed. */
  block: SignedBlock
  /** Ground treated on the line, square metres. */
  areaM2: string | number
  /** Null where the signed text is older than holds on lines. */
  signed: SignedRecord['computed']['lines'][number] | null
}

/** Each block line with what was signed of it. @throws {RangeError} if the record does not hold a line's block. */
export function pairBlocks({ content, blocks, computed }: SignedRecord): PairedLine[] {
  return content.lines.map((line, index) => {
    const block = blocks.find(({ id }) => id === line.blockId)
    if (!block) throw new RangeError(`the record does not hold block ${line.blockId}`)
    const signed = computed.lines[index] ?? null
    return { line, block, signed, areaM2: signed?.areaM2 ?? partArea(line.part, Number(block.areaM2)) }
  })
}
