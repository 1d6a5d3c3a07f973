import { blockSchema, createBlockSchema } from '../../shared/contract/block.ts'
import { blocksImportedSchema, importBlocksSchema } from '../../shared/contract/blockImport.ts'
import {
  blockQuerySchema, blocksChangedSchema, boundaryVersionsSchema, mergeBlocksSchema, reopenBlockSchema, splitBlockSchema, updateBlockSchema,
} from '../../shared/contract/blockChanges.ts'
import { farmParamsSchema, pageOf, thingParamsSchema } from '../../shared/contract/common.ts'
import { putLandSchema } from '../../shared/contract/land.ts'
import { createBlock } from '../services/blocks/createBlock.ts'
import { importBlocks } from '../services/blocks/importBlocks.ts'
import { listBoundaries } from '../services/blocks/listBoundaries.ts'
import { mergeBlocks } from '../services/blocks/mergeBlocks.ts'
import { putLand } from '../services/blocks/putLand.ts'
import { getBlock, listBlocks } from '../services/blocks/readBlocks.ts'
import { reopenBlock } from '../services/blocks/reopenBlock.ts'
import { splitBlock } from '../services/blocks/splitBlock.ts'
import { updateBlock } from '../services/blocks/updateBlock.ts'
import { defineRoute } from './defineRoute.ts'
import { EVERY_ROLE, LEADERS } from './roleGroups.ts'

export const blockRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/blocks', summary: 'Blocks with their boundaries, by code; with `ended=true` also those that have ended.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: blockQuerySchema, answer: pageOf(blockSchema),
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
    method: 'post', path: '/farms/:farmId/blocks/merge', summary: 'Put blocks together: they end, one begins, all or nothing.', roles: LEADERS,
    params: farmParamsSchema, body: mergeBlocksSchema, answer: blocksChangedSchema,
    run: async ({ services, actor, body }) => ({ body: await mergeBlocks(services, actor, body) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/blocks/import', summary: 'Draw several blocks, all or none; each is judged after those before it.', roles: LEADERS,
    params: farmParamsSchema, body: importBlocksSchema, answer: blocksImportedSchema,
    run: async ({ services, actor, body }) => {
      const { made, imported } = await importBlocks(services, actor, body)
      return { status: made ? 201 : 200, body: imported }
    },
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/blocks/:id', summary: 'One block.', roles: EVERY_ROLE,
    params: thingParamsSchema, answer: blockSchema,
    run: async ({ services, actor, params }) => ({ body: await getBlock(services, actor, params.id) }),
  }),
  defineRoute({
    method: 'patch', path: '/farms/:farmId/blocks/:id', summary: 'Change a block; another outline makes a new boundary version.', roles: LEADERS,
    params: thingParamsSchema, body: updateBlockSchema, answer: blockSchema,
    run: async ({ services, actor, params, body }) => ({ body: await updateBlock(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/blocks/:id/boundaries', summary: 'Every version of a block’s outline, newest first, with the records that rest on it.', roles: EVERY_ROLE,
    params: thingParamsSchema, answer: boundaryVersionsSchema,
    run: async ({ services, actor, params }) => ({ body: await listBoundaries(services, actor, params.id) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/blocks/:id/split', summary: 'Cut a block into parts: it ends, they begin, all or nothing.', roles: LEADERS,
    params: thingParamsSchema, body: splitBlockSchema, answer: blocksChangedSchema,
    run: async ({ services, actor, params, body }) => ({ body: await splitBlock(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/blocks/:id/reopen', summary: 'Undo the cut or the join that ended a block.', roles: LEADERS,
    params: thingParamsSchema, body: reopenBlockSchema, answer: blocksChangedSchema,
    run: async ({ services, actor, params, body }) => ({ body: await reopenBlock(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'put', path: '/farms/:farmId/blocks/:id/land', summary: 'Say how the land of a block stands.', roles: LEADERS,
    params: thingParamsSchema, body: putLandSchema, answer: blockSchema,
    run: async ({ services, actor, params, body }) => ({ body: await putLand(services, actor, params.id, body) }),
  }),
]
