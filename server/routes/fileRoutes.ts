import { z } from 'zod'
import { addFileSchema, attachmentSchema, fileQuerySchema } from '../../shared/contract/attachment.ts'
import { thingParamsSchema } from '../../shared/contract/common.ts'
import { addFile } from '../services/files/addFile.ts'
import { findFile, listFiles } from '../services/files/readFiles.ts'
import { removeFile } from '../services/files/removeFile.ts'
import { defineRoute } from './defineRoute.ts'
import { EVERY_ROLE, FARM_PEOPLE } from './roleGroups.ts'
import { sendFile } from './sendFile.ts'

export const fileRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/records/:id/files', summary: 'Photos and papers of a record.', roles: EVERY_ROLE,
    params: thingParamsSchema, answer: z.object({ items: z.array(attachmentSchema), next: z.null() }),
    run: async ({ services, actor, params }) => ({ body: await listFiles(services, actor, { about: 'record', id: params.id }) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/records/:id/files', summary: 'Add a photo or paper to a record: one file of at most 10 MB, JPEG, PNG, WebP or, as a paper, PDF.', roles: FARM_PEOPLE,
    params: thingParamsSchema, upload: true, body: addFileSchema, answer: attachmentSchema,
    run: async ({ services, actor, params, body, file }) => {
      const { made, file: added } = await addFile(services, actor, { about: 'record', id: params.id }, body, file)
      return { status: made ? 201 : 200, body: added }
    },
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/files/:id', summary: 'A photo as it is shown, or a PDF; with `original`, as it came in.', roles: EVERY_ROLE,
    params: thingParamsSchema, query: fileQuerySchema, answer: z.null(), contentType: 'application/octet-stream',
    run: async (call) => {
      await sendFile(call, await findFile(call.services, call.actor, call.params.id, call.query))
      return 'sent'
    },
  }),
  defineRoute({
    method: 'delete', path: '/farms/:farmId/files/:id', summary: 'Take a photo or paper back, while no signed version names it.', roles: FARM_PEOPLE,
    params: thingParamsSchema, answer: z.null(),
    run: async ({ services, actor, params }) => {
      await removeFile(services, actor, params.id)
      return { status: 204, body: null }
    },
  }),
]
