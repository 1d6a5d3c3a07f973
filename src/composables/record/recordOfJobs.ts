import type { Job } from '../../../shared/contract/job.ts'
import type { SeasonPlan } from '../../../shared/contract/seasonPlan.ts'
import { readJobId } from '../../../shared/rounds/jobKey.ts'
import type { UnitSystem } from '../../../shared/units/readingUnit.ts'
import { emptyLine } from './lineDraft.ts'
import { draftOfPlan, type RecordDraft } from './recordDraft.ts'

/** Where the record of jobs is written: gone on with where one of them has one already. */
export function recordAddress(jobs: readonly Pick<Job, 'id' | 'openRecordId'>[]): string {
  const begun = jobs.find(({ openRecordId }) => openRecordId !== null)?.openRecordId
  return begun ? `/register/new?draft=${begun}` : `/register/new?job=${jobs.map(({ id }) => id).join(',')}`
}

/** A form filled in from jobs: their blocks, and the preparation, method and rate of their step; null where no plan has them. */
export function draftOfJobs(jobIds: readonly string[], plans: readonly SeasonPlan[], blockIds: ReadonlySet<string>, units: UnitSystem): RecordDraft | null {
  const keys = jobIds.map(readJobId).filter((key) => key !== null)
  const step = plans.flatMap(({ steps }) => steps).find(({ id }) => id === keys[0]?.stepId)
  if (step === undefined) return null
  // Of one step: another has its own mix, and so its own record.
  const own = keys.filter(({ stepId, blockId }) => stepId === step.id && blockIds.has(blockId))
  return {
    ...draftOfPlan(step, units),
    lines: own.map(({ blockId }) => emptyLine(blockId)),
    jobs: jobIds.filter((id) => readJobId(id)?.stepId === step.id),
  }
}
