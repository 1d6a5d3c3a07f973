import { farmParamsSchema, thingParamsSchema } from '../../shared/contract/common.ts'
import { holdsSchema } from '../../shared/contract/hold.ts'
import { sheetQuerySchema } from '../../shared/contract/job.ts'
import { listBlockHolds, listHolds } from '../services/holds/readHolds.ts'
import { defineRoute } from './defineRoute.ts'
import { EVERY_ROLE } from './roleGroups.ts'

export const holdRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/holds', summary: 'What the labels in signed records hold today, by block: until when nobody enters, from when one may pick.', roles: EVERY_ROLE,
    params: farmParamsSchema, answer: holdsSchema,
    run: async ({ services, actor }) => ({ body: await listHolds(services, actor) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/blocks/:id/holds', summary: 'What held a block on the days from one to another.', roles: EVERY_ROLE,
    params: thingParamsSchema, query: sheetQuerySchema, answer: holdsSchema,
    run: async ({ services, actor, params, query }) => ({ body: await listBlockHolds(services, actor, params.id, query) }),
  }),
]
