import { calibrationQuerySchema, calibrationSchema, createCalibrationSchema, retireSprayerSchema, withdrawCalibrationSchema } from '../../shared/contract/calibration.ts'
import { farmParamsSchema, pageOf, pageQuerySchema, thingParamsSchema } from '../../shared/contract/common.ts'
import { createSprayerSchema, sprayerSchema, updateSprayerSchema } from '../../shared/contract/farm.ts'
import { createCalibration, listCalibrations, withdrawCalibration } from '../services/farms/calibrations.ts'
import { createSprayer, listSprayers, retireSprayer, updateSprayer } from '../services/farms/sprayers.ts'
import { defineRoute } from './defineRoute.ts'
import { EVERY_ROLE, FARM_PEOPLE, LEADERS } from './roleGroups.ts'

export const sprayerRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/sprayers', summary: 'Sprayers and drenchers by code, each with the calibration it goes by.', roles: EVERY_ROLE,
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
  defineRoute({
    method: 'patch', path: '/farms/:farmId/sprayers/:id', summary: 'Change a sprayer or what is fitted to it.', roles: LEADERS,
    params: thingParamsSchema, body: updateSprayerSchema, answer: sprayerSchema,
    run: async ({ services, actor, params, body }) => ({ body: await updateSprayer(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/sprayers/:id/retire', summary: 'Put a sprayer out of use; its records stay.', roles: LEADERS,
    params: thingParamsSchema, body: retireSprayerSchema, answer: sprayerSchema,
    run: async ({ services, actor, params, body }) => ({ body: await retireSprayer(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/calibrations', summary: 'Calibrations, newest day first, those taken back among them.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: calibrationQuerySchema, answer: pageOf(calibrationSchema),
    run: async ({ services, actor, query }) => ({ body: await listCalibrations(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/calibrations', summary: 'Write down what was measured on a sprayer; written once.', roles: FARM_PEOPLE,
    params: farmParamsSchema, body: createCalibrationSchema, answer: calibrationSchema,
    run: async ({ services, actor, body }) => {
      const { made, calibration } = await createCalibration(services, actor, body)
      return { status: made ? 201 : 200, body: calibration }
    },
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/calibrations/:id/withdraw', summary: 'Take a calibration back, with the reason; it stays readable.', roles: FARM_PEOPLE,
    params: thingParamsSchema, body: withdrawCalibrationSchema, answer: calibrationSchema,
    run: async ({ services, actor, params, body }) => ({ body: await withdrawCalibration(services, actor, params.id, body) }),
  }),
]
