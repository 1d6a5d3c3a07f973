import { farmParamsSchema, pageOf, pageQuerySchema } from '../../shared/contract/common.ts'
import { createFarmSchema, createSprayerSchema, farmSchema, sprayerSchema } from '../../shared/contract/farm.ts'
import { createFarm } from '../services/farms/createFarm.ts'
import { describeFarm } from '../services/farms/describeFarm.ts'
import { createSprayer, listSprayers } from '../services/farms/sprayers.ts'
import { defineRoute } from './defineRoute.ts'
import { EVERY_ROLE, LEADERS } from './roleGroups.ts'

export const farmRoutes = [
  defineRoute({
    method: 'post', path: '/farms', summary: 'Make a farm; the caller becomes its owner.', roles: 'account',
    body: createFarmSchema, answer: farmSchema,
    run: async ({ services, accountId, body }) => {
      const { made, farm } = await createFarm(services, accountId, body)
      return { status: made ? 201 : 200, body: farm }
    },
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId', summary: 'The farm: name, zone, season.', roles: EVERY_ROLE,
    params: farmParamsSchema, answer: farmSchema,
    run: async ({ services, actor }) => ({ body: await describeFarm(services, actor) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/sprayers', summary: 'Sprayers and drenchers, by code.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: pageQuerySchema, answer: pageOf(sprayerSchema),
    run: async ({ services, actor, query }) => ({ body: await listSprayers(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/sprayers', summary: 'Take a sprayer into the list.', roles: LEADERS,
    params: farmParamsSchema, body: createSprayerSchema, answer: sprayerSchema,
    run: async ({ services, actor, body }) => {
      const { made, sprayer } = await createSprayer(services, actor, body)
      return { status: made ? 201 : 200, body: sprayer }
    },
  }),
]
