import { jobSchema, seasonSheetSchema, type Job, type SeasonSheet } from '../../shared/contract/job.ts'
import { seasonPlanSchema, type SeasonPlan } from '../../shared/contract/seasonPlan.ts'
import { allPages } from './allPages.ts'
import { http } from './http.ts'

/** Season plans, their jobs and the season sheet; writes go through submit(command). */
export const roundApi = {
  plans: (farmId: string): Promise<SeasonPlan[]> => allPages(`/farms/${farmId}/season-plans`, seasonPlanSchema),
  sheet: (farmId: string, span: { from: string; to: string }): Promise<SeasonSheet> => http.get(`/farms/${farmId}/season-sheet`, seasonSheetSchema, span),
  /** Due and late, by their day. */
  waiting: (farmId: string): Promise<Job[]> => allPages(`/farms/${farmId}/jobs`, jobSchema, { state: 'waiting' }),
  /** All jobs of a block. */
  ofBlock: (farmId: string, blockId: string): Promise<Job[]> => allPages(`/farms/${farmId}/jobs`, jobSchema, { blockId }),
}
