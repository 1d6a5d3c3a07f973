import { farmParamsSchema, idSchema, pageOf, pageQuerySchema, thingParamsSchema } from '../../shared/contract/common.ts'
import { countLotSchema, createLotSchema, createMaterialSchema, lotSchema, materialSchema } from '../../shared/contract/input.ts'
import { countLot } from '../services/inputs/countLot.ts'
import { createMaterial } from '../services/inputs/createMaterial.ts'
import { listLots, listMaterials } from '../services/inputs/readInputs.ts'
import { receiveLot } from '../services/inputs/receiveLot.ts'
import { defineRoute } from './defineRoute.ts'
import { EVERY_ROLE, LEADERS } from './roleGroups.ts'

export const inputRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/materials', summary: 'Materials by name, with status and label limits.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: pageQuerySchema, answer: pageOf(materialSchema),
    run: async ({ services, actor, query }) => ({ body: await listMaterials(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/materials', summary: 'Take a material into the list.', roles: LEADERS,
    params: farmParamsSchema, body: createMaterialSchema, answer: materialSchema,
    run: async ({ services, actor, body }) => {
      const { made, material } = await createMaterial(services, actor, body)
      return { status: made ? 201 : 200, body: material }
    },
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/lots', summary: 'Lots by code, with what is left.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: pageQuerySchema.extend({ materialId: idSchema.optional() }), answer: pageOf(lotSchema),
    run: async ({ services, actor, query }) => ({ body: await listLots(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/lots', summary: 'Receive a lot of a material.', roles: LEADERS,
    params: farmParamsSchema, body: createLotSchema, answer: lotSchema,
    run: async ({ services, actor, body }) => {
      const { made, lot } = await receiveLot(services, actor, body)
      return { status: made ? 201 : 200, body: lot }
    },
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/lots/:id/count', summary: 'Set what is left to what was counted, with the reason.', roles: LEADERS,
    params: thingParamsSchema, body: countLotSchema, answer: lotSchema,
    run: async ({ services, actor, params, body }) => ({ body: await countLot(services, actor, params.id, body) }),
  }),
]
