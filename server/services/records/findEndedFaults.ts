import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import type { FieldError } from '../../errors.ts'
import type { RecordGround } from './loadRecordGround.ts'

/**
 * Lines on blocks that have ended. What was begun before the day a block ended can always be recorded, and a draft keeps the
 * blocks it has. @param kept ids of blocks that stand in the draft already. @param zone the farm's.
 */
export function findEndedFaults({ lines }: RecordContent, { blocks }: Pick<RecordGround, 'blocks'>, zone: string, kept: readonly string[]): FieldError[] {
  return lines.flatMap(({ blockId, startedAt }, index) => {
    const block = blocks.find(({ id }) => id === blockId)
    if (!block || block.endedOn === null || kept.includes(blockId)) return []
    if (startedAt !== null && civilDateIn(zone, startedAt) < block.endedOn) return []
    return [{ path: `lines.${index}.blockId`, code: 'block.ended', params: { code: block.code, endedOn: block.endedOn } }]
  })
}
