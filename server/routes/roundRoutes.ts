import { farmParamsSchema, pageOf, pageQuerySchema, thingParamsSchema } from '../../shared/contract/common.ts'
import { jobParamsSchema, jobQuerySchema, jobSchema, moveJobSchema, seasonSheetSchema, sheetQuerySchema, skipJobSchema, unskipJobSchema } from '../../shared/contract/job.ts'
import { createPlanSchema, endPlanSchema, reopenPlanSchema, seasonPlanSchema, updatePlanSchema } from '../../shared/contract/seasonPlan.ts'
import { moveJob, skipJob, unskipJob } from '../services/rounds/decideJobs.ts'
import { listJobs, readSheet } from '../services/rounds/listJobs.ts'
import { createPlan, endPlan, getPlan, listPlans, reopenPlan, updatePlan } from '../services/rounds/seasonPlans.ts'
import { defineRoute } from './defineRoute.ts'
import { FARM_PEOPLE, LEADERS } from './roleGroups.ts'

export const roundRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/season-plans', summary: 'Season plans, those that ended too.', roles: FARM_PEOPLE,
    params: farmParamsSchema, query: pageQuerySchema, answer: pageOf(seasonPlanSchema),
    run: async ({ services, actor, query }) => ({ body: await listPlans(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/season-plans', summary: 'Write a season plan: preparations put on blocks in a rhythm.', roles: LEADERS,
    params: farmParamsSchema, body: createPlanSchema, answer: seasonPlanSchema,
    run: async ({ services, actor, body }) => {
      const { made, plan } = await createPlan(services, actor, body)
      return { status: made ? 201 : 200, body: plan }
    },
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/season-plans/:id', summary: 'One season plan.', roles: FARM_PEOPLE,
    params: thingParamsSchema, answer: seasonPlanSchema,
    run: async ({ services, actor, params }) => ({ body: await getPlan(services, actor, params.id) }),
  }),
  defineRoute({
    method: 'put', path: '/farms/:farmId/season-plans/:id', summary: 'Write a season plan anew.', roles: LEADERS,
    params: thingParamsSchema, body: updatePlanSchema, answer: seasonPlanSchema,
    run: async ({ services, actor, params, body }) => ({ body: await updatePlan(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/season-plans/:id/end', summary: 'End a season plan: nothing of it is due any more.', roles: LEADERS,
    params: thingParamsSchema, body: endPlanSchema, answer: seasonPlanSchema,
    run: async ({ services, actor, params, body }) => ({ body: await endPlan(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/season-plans/:id/reopen', summary: 'Take the end of a season plan back.', roles: LEADERS,
    params: thingParamsSchema, body: reopenPlanSchema, answer: seasonPlanSchema,
    run: async ({ services, actor, params, body }) => ({ body: await reopenPlan(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/jobs', summary: 'Jobs of the season plans by their day: of a window, a state, a block or a plan.', roles: FARM_PEOPLE,
    params: farmParamsSchema, query: jobQuerySchema, answer: pageOf(jobSchema),
    run: async ({ services, actor, query }) => ({ body: await listJobs(services, actor, query) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/season-sheet', summary: 'Jobs, signed work, holds and harvests between two days.', roles: FARM_PEOPLE,
    params: farmParamsSchema, query: sheetQuerySchema, answer: seasonSheetSchema,
    run: async ({ services, actor, query }) => ({ body: await readSheet(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/jobs/:id/move', summary: 'Move a job to another day, or back to its target.', roles: LEADERS,
    params: jobParamsSchema, body: moveJobSchema, answer: jobSchema,
    run: async ({ services, actor, params, body }) => ({ body: await moveJob(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/jobs/:id/skip', summary: 'Skip a job, with the reason.', roles: LEADERS,
    params: jobParamsSchema, body: skipJobSchema, answer: jobSchema,
    run: async ({ services, actor, params, body }) => ({ body: await skipJob(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/jobs/:id/unskip', summary: 'Take a skip back.', roles: LEADERS,
    params: jobParamsSchema, body: unskipJobSchema, answer: jobSchema,
    run: async ({ services, actor, params, body }) => ({ body: await unskipJob(services, actor, params.id, body) }),
  }),
]
