import { farmParamsSchema, pageOf, pageQuerySchema, thingParamsSchema } from '../../shared/contract/common.ts'
import { changeGrantSchema, endGrantSchema, giveGrantSchema, grantedSeasonsSchema, grantSchema } from '../../shared/contract/grant.ts'
import { registerRowSchema } from '../../shared/contract/record.ts'
import { filterQuerySchema, registerQuerySchema, registerTotalsSchema } from '../../shared/contract/register.ts'
import { changeGrant, endGrant } from '../services/grants/changeGrant.ts'
import { giveGrant } from '../services/grants/giveGrant.ts'
import { listGrantedSeasons } from '../services/grants/listGrantedSeasons.ts'
import { listGrants } from '../services/grants/listGrants.ts'
import { seeAsGranted } from '../services/grants/seeAsGranted.ts'
import { listRegister } from '../services/register/listRegister.ts'
import { registerTotals } from '../services/register/registerTotals.ts'
import { defineRoute } from './defineRoute.ts'

const OWNER = ['owner'] as const

export const grantRoutes = [
  defineRoute({
    method: 'get', path: '/my-farms', summary: 'Seasons of farms that are granted to the caller, with what was taken away last.', roles: 'account',
    answer: grantedSeasonsSchema,
    run: async ({ services, accountId }) => ({ body: await listGrantedSeasons(services, accountId) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/grants', summary: 'Whom the farm lets read which seasons, and until when.', roles: OWNER,
    params: farmParamsSchema, query: pageQuerySchema, answer: pageOf(grantSchema),
    run: async ({ services, actor, query }) => ({ body: await listGrants(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/grants', summary: 'Let a certifier read seasons until a day; they are told by letter.', roles: OWNER,
    guardsPassword: true, params: farmParamsSchema, body: giveGrantSchema, answer: grantSchema,
    run: async ({ services, actor, body, language }) => {
      const { made, grant } = await giveGrant(services, actor, body, language)
      return { status: made ? 201 : 200, body: grant }
    },
  }),
  defineRoute({
    method: 'patch', path: '/farms/:farmId/grants/:id', summary: 'Change the seasons, the last day or the organisation of a grant.', roles: OWNER,
    guardsPassword: true, params: thingParamsSchema, body: changeGrantSchema, answer: grantSchema,
    run: async ({ services, actor, params, body }) => ({ body: await changeGrant(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/grants/:id/end', summary: 'End a grant now; the certifier’s next request finds nothing.', roles: OWNER,
    guardsPassword: true, params: thingParamsSchema, body: endGrantSchema, answer: grantSchema,
    run: async ({ services, actor, params, body }) => ({ body: await endGrant(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/grants/:id/records', summary: 'The register as the certifier of a grant sees it now, for the owner.', roles: OWNER,
    params: thingParamsSchema, query: registerQuerySchema, answer: pageOf(registerRowSchema),
    run: async ({ services, actor, params, query }) => ({ body: await listRegister(services, await seeAsGranted(services, actor, params.id), query) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/grants/:id/totals', summary: 'What the register adds up to as the certifier of a grant sees it now, for the owner.', roles: OWNER,
    params: thingParamsSchema, query: filterQuerySchema, answer: registerTotalsSchema,
    run: async ({ services, actor, params, query }) => ({ body: await registerTotals(services, await seeAsGranted(services, actor, params.id), query) }),
  }),
]
