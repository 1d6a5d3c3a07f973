import { z } from 'zod'
import { farmParamsSchema, idSchema } from '../../shared/contract/common.ts'
import { farmSchema } from '../../shared/contract/farm.ts'
import { startSchema, updateStartSchema } from '../../shared/contract/start.ts'
import { makePracticeFarm, putPracticeAway } from '../demo/practiceFarm.ts'
import { readStart, updateStart } from '../services/farms/startSteps.ts'
import { defineRoute } from './defineRoute.ts'
import { LEADERS } from './roleGroups.ts'

export const startRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/start', summary: 'How far the first hour of the farm is, read off the farm itself.', roles: LEADERS,
    params: farmParamsSchema, answer: startSchema,
    run: async ({ services, actor }) => ({ body: await readStart(services, actor) }),
  }),
  defineRoute({
    method: 'patch', path: '/farms/:farmId/start', summary: 'Pass steps of the first hour over, or put it away.', roles: LEADERS,
    params: farmParamsSchema, body: updateStartSchema, answer: startSchema,
    run: async ({ services, actor, body }) => ({ body: await updateStart(services, actor, body) }),
  }),
  defineRoute({
    method: 'post', path: '/practice-farm', summary: 'Make a farm to try things on, one an account; it is not counted among its farms.', roles: 'account',
    body: z.strictObject({ id: idSchema }), answer: farmSchema,
    run: async ({ services, accountId, body }) => {
      const { made, farm } = await makePracticeFarm(services, accountId, body.id)
      return { status: made ? 201 : 200, body: farm }
    },
  }),
  defineRoute({
    method: 'delete', path: '/practice-farm', summary: 'Put the practice farm away.', roles: 'account',
    answer: z.null(),
    run: async ({ services, accountId }) => {
      await putPracticeAway(services, accountId)
      return { status: 204, body: null }
    },
  }),
]
