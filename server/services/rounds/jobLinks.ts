import { In, type EntityManager } from 'typeorm'
import { readJobId } from '../../../shared/rounds/jobKey.ts'
import { Block } from '../../entities/Block.ts'
import { PlanJobRecord } from '../../entities/PlanJobRecord.ts'
import { PlanStep } from '../../entities/PlanStep.ts'
import { invalid } from '../../errors.ts'
import { holdNumbers } from './holdNumbers.ts'
import type { RoundsAt } from './readJobs.ts'

/** A record's own key. */
interface RecordKey { farmId: string; recordId: string }

/**
 * Writes down which jobs a record was opened from: the last word counts. Signing it then does them, withdrawing it undoes them.
 * @throws {AppError} `job.unknown` for a job of no step or block of the farm.
 */
export async function linkJobs(manager: EntityManager, at: RoundsAt, recordId: string, jobIds: readonly string[]): Promise<void> {
  const { farmId } = at
  const keys = [...new Set(jobIds)].map(readJobId)
  const steps = await manager.find(PlanStep, { select: { id: true }, where: { farmId, id: In(keys.map((key) => key?.stepId ?? '')) } })
  const blocks = await manager.find(Block, { select: { id: true }, where: { farmId, id: In(keys.map((key) => key?.blockId ?? '')) } })
  const has = (things: { id: string }[], id: string | undefined): boolean => things.some((thing) => thing.id === id)
  const faults = keys.flatMap((key, index) => (has(steps, key?.stepId) && has(blocks, key?.blockId) ? [] : [{ path: `jobs.${index}`, code: 'job.unknown' }]))
  if (faults.length > 0) throw invalid(faults)
  await unlinkJobs(manager, { farmId, recordId })
  for (const { id } of steps) await holdNumbers(manager, at, id)
  // One block of a step is done once by a record, whichever of its jobs was named last.
  const rows = new Map(keys.flatMap((key) => (key === null ? [] : [[`${key.stepId}.${key.blockId}`, { farmId, recordId, ...key }]])))
  if (rows.size > 0) await manager.insert(PlanJobRecord, [...rows.values()])
}

/** Forgets which jobs a record was opened from, as before a draft goes. */
export async function unlinkJobs(manager: EntityManager, { farmId, recordId }: RecordKey): Promise<void> {
  await manager.delete(PlanJobRecord, { farmId, recordId })
}
