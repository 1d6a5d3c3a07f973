import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import { checkBoundary } from '../../../shared/geo/checkBoundary.ts'
import { MOST_OUTSIDE, outsideShare } from '../../../shared/geo/outsideShare.ts'
import { partArea } from '../../../shared/geo/partArea.ts'
import type { FieldError } from '../../errors.ts'
import type { RecordGround } from './loadRecordGround.ts'

/** Parts of one block together, over its area: room for rounding alone. */
const MOST_TOGETHER = 1.001

/** What is impossible about the parts treated: no valid shape, ground outside the block, or more of a block than there is. */
export function findPartFaults(content: RecordContent, { blocks }: RecordGround): FieldError[] {
  const faults = content.lines.flatMap(({ part, blockId }, index): FieldError[] => {
    const block = blocks.find(({ id }) => id === blockId)
    if (part.kind !== 'drawn' || !block) return []
    const path = `lines.${index}.part.geometry`
    const { geometry, findings } = checkBoundary(part.geometry)
    if (geometry === null) return findings.map(({ code, params }) => ({ path, code, params }))
    return outsideShare(geometry, block.geometry) > MOST_OUTSIDE ? [{ path, code: 'part.outside_block', params: { code: block.code } }] : []
  })
  return faults.length > 0 ? faults : findTooMuchOfBlocks(content, blocks)
}

function findTooMuchOfBlocks({ lines }: RecordContent, blocks: RecordGround['blocks']): FieldError[] {
  const taken = new Map<string, number>()
  return lines.flatMap(({ part, blockId }, index): FieldError[] => {
    const block = blocks.find(({ id }) => id === blockId)
    if (!block) return []
    const before = taken.get(blockId) ?? 0
    const together = before + partArea(part, Number(block.areaM2))
    taken.set(blockId, together)
    if (together <= Number(block.areaM2) * MOST_TOGETHER) return []
    // Twice the whole of a block is a slip of the finger; parts that add up to more are one of counting.
    return [{ path: `lines.${index}.blockId`, code: before > 0 && part.kind === 'whole' ? 'record.same_block' : 'part.more_than_block', params: { code: block.code } }]
  })
}
