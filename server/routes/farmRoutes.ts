import { farmParamsSchema } from '../../shared/contract/common.ts'
import { createFarmSchema, farmSchema } from '../../shared/contract/farm.ts'
import { updateFarmSchema } from '../../shared/contract/farmChanges.ts'
import { createFarm } from '../services/farms/createFarm.ts'
import { describeFarm } from '../services/farms/describeFarm.ts'
import { updateFarm } from '../services/farms/updateFarm.ts'
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
    method: 'get', path: '/farms/:farmId', summary: 'The farm: name, zone, season, certificate, contact.', roles: EVERY_ROLE,
    params: farmParamsSchema, answer: farmSchema,
    run: async ({ services, actor }) => ({ body: await describeFarm(services, actor) }),
  }),
  defineRoute({
    method: 'patch', path: '/farms/:farmId', summary: 'Change the profile of the farm.', roles: LEADERS,
    params: farmParamsSchema, body: updateFarmSchema, answer: farmSchema,
    run: async ({ services, actor, body }) => ({ body: await updateFarm(services, actor, body) }),
  }),
]
