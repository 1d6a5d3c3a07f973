import { In, IsNull, type EntityManager } from 'typeorm'
import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import { PlanJobRecord } from '../../entities/PlanJobRecord.ts'
import { PlanStep } from '../../entities/PlanStep.ts'
import { readJobs, type RoundsAt } from './readJobs.ts'

/**
 * Writes down which job of a step each record does that was opened from none, so that an earlier one entered later takes no number away
 * from it: what was decided on a job, and a record that was opened from it, stay with the turn they were meant for.
 */
export async function holdNumbers(manager: EntityManager, at: RoundsAt, stepId: string): Promise<void> {
  const { jobs } = await readJobs(manager, at, { stepId })
  const rows = jobs.flatMap(({ blockId, number, done }) => (done === null ? [] : [{ farmId: at.farmId, recordId: done.recordId, stepId, blockId, number }]))
  if (rows.length > 0) await manager.createQueryBuilder().insert().into(PlanJobRecord).values(rows).orIgnore().execute()
}

/** The same for every step that a record, just signed, may do a job of. */
export async function holdNumbersAfter(manager: EntityManager, at: RoundsAt, { method, components, lines }: Pick<RecordContent, 'method' | 'components' | 'lines'>): Promise<void> {
  const materialIds = components.flatMap(({ materialId }) => materialId ?? [])
  const steps = await manager.find(PlanStep, { select: { id: true, blockIds: true }, where: { farmId: at.farmId, method, materialId: In(materialIds), removedAt: IsNull() } })
  for (const { id, blockIds } of steps) if (lines.some(({ blockId }) => blockIds.includes(blockId))) await holdNumbers(manager, at, id)
}
