import { bedSchema, createBedSchema, updateBedSchema } from '../../shared/contract/bed.ts'
import { farmParamsSchema, pageOf, thingParamsSchema } from '../../shared/contract/common.ts'
import { createFarmEventSchema, farmEventQuerySchema, farmEventSchema, withdrawFarmEventSchema } from '../../shared/contract/farmEvent.ts'
import { createPlantingSchema, ofBlockQuerySchema, plantingSchema, updatePlantingSchema } from '../../shared/contract/planting.ts'
import { createBed, listBeds, updateBed } from '../services/blocks/beds.ts'
import { createFarmEvent, listFarmEvents, withdrawFarmEvent } from '../services/blocks/farmEvents.ts'
import { createPlanting, listPlantings, updatePlanting } from '../services/blocks/plantings.ts'
import { defineRoute } from './defineRoute.ts'
import { EVERY_ROLE, FARM_PEOPLE, LEADERS } from './roleGroups.ts'

export const growingRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/plantings', summary: 'What grows and grew on the blocks.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: ofBlockQuerySchema, answer: pageOf(plantingSchema),
    run: async ({ services, actor, query }) => ({ body: await listPlantings(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/plantings', summary: 'Write down what grows on a block or a part of it.', roles: LEADERS,
    params: farmParamsSchema, body: createPlantingSchema, answer: plantingSchema,
    run: async ({ services, actor, body }) => {
      const { made, planting } = await createPlanting(services, actor, body)
      return { status: made ? 201 : 200, body: planting }
    },
  }),
  defineRoute({
    method: 'patch', path: '/farms/:farmId/plantings/:id', summary: 'Write a planting anew.', roles: LEADERS,
    params: thingParamsSchema, body: updatePlantingSchema, answer: plantingSchema,
    run: async ({ services, actor, params, body }) => ({ body: await updatePlanting(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/beds', summary: 'Beds and rows of the blocks.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: ofBlockQuerySchema, answer: pageOf(bedSchema),
    run: async ({ services, actor, query }) => ({ body: await listBeds(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/beds', summary: 'Write down beds or rows of a block.', roles: LEADERS,
    params: farmParamsSchema, body: createBedSchema, answer: bedSchema,
    run: async ({ services, actor, body }) => {
      const { made, bed } = await createBed(services, actor, body)
      return { status: made ? 201 : 200, body: bed }
    },
  }),
  defineRoute({
    method: 'patch', path: '/farms/:farmId/beds/:id', summary: 'Write beds or rows anew.', roles: LEADERS,
    params: thingParamsSchema, body: updateBedSchema, answer: bedSchema,
    run: async ({ services, actor, params, body }) => ({ body: await updateBed(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/farm-events', summary: 'What else was done on the blocks, newest first.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: farmEventQuerySchema, answer: pageOf(farmEventSchema),
    run: async ({ services, actor, query }) => ({ body: await listFarmEvents(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/farm-events', summary: 'Write down what was done on blocks besides applications.', roles: FARM_PEOPLE,
    params: farmParamsSchema, body: createFarmEventSchema, answer: farmEventSchema,
    run: async ({ services, actor, body }) => {
      const { made, event } = await createFarmEvent(services, actor, body)
      return { status: made ? 201 : 200, body: event }
    },
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/farm-events/:id/withdraw', summary: 'Take an event back, with the reason.', roles: FARM_PEOPLE,
    params: thingParamsSchema, body: withdrawFarmEventSchema, answer: farmEventSchema,
    run: async ({ services, actor, params, body }) => ({ body: await withdrawFarmEvent(services, actor, params.id, body) }),
  }),
]
