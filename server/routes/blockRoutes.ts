import { blockSchema, createBlockSchema } from '../../shared/contract/block.ts'
import { farmParamsSchema, pageOf, pageQuerySchema, thingParamsSchema } from '../../shared/contract/common.ts'
import { createBlock } from '../services/blocks/createBlock.ts'
import { getBlock, listBlocks } from '../services/blocks/readBlocks.ts'
import { defineRoute } from './defineRoute.ts'
import { EVERY_ROLE, LEADERS } from './roleGroups.ts'

export const blockRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/blocks', summary: 'Blocks with their boundaries, by code.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: pageQuerySchema, answer: pageOf(blockSchema),
    run: async ({ services, actor, query }) => ({ body: await listBlocks(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/blocks', summary: 'Draw a block; its area and perimeter are worked out.', roles: LEADERS,
    params: farmParamsSchema, body: createBlockSchema, answer: blockSchema,
    run: async ({ services, actor, body }) => {
      const { made, block } = await createBlock(services, actor, body)
      return { status: made ? 201 : 200, body: block }
    },
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/blocks/:id', summary: 'One block.', roles: EVERY_ROLE,
    params: thingParamsSchema, answer: blockSchema,
    run: async ({ services, actor, params }) => ({ body: await getBlock(services, actor, params.id) }),
  }),
]
