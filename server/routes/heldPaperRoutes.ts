import { z } from 'zod'
import { addFileSchema, attachmentSchema } from '../../shared/contract/attachment.ts'
import { thingParamsSchema } from '../../shared/contract/common.ts'
import { addFile } from '../services/files/addFile.ts'
import type { FileHolder } from '../services/files/findHolder.ts'
import { listFiles } from '../services/files/readFiles.ts'
import { defineRoute, type Route } from './defineRoute.ts'
import { FARM_PEOPLE, LEADERS } from './roleGroups.ts'

const listSchema = z.object({ items: z.array(attachmentSchema), next: z.null() })

/** Papers of one kind of thing: read by the farm's people, added by who leads the farm. */
function papersOf(about: FileHolder['about'], path: string, what: string): Route[] {
  const params = thingParamsSchema
  return [
    defineRoute({
      method: 'get', path, summary: `Papers of ${what}.`, roles: FARM_PEOPLE, params, answer: listSchema,
      run: async ({ services, actor, params: read }) => ({ body: await listFiles(services, actor, { about, id: read.id }) }),
    }),
    defineRoute({
      method: 'post', path, summary: `Add a paper of ${what}: one file of at most 10 MB, JPEG, PNG, WebP or PDF.`, roles: LEADERS,
      params, upload: true, body: addFileSchema, answer: attachmentSchema,
      run: async ({ services, actor, params: read, body, file }) => {
        const { made, file: added } = await addFile(services, actor, { about, id: read.id }, body, file)
        return { status: made ? 201 : 200, body: added }
      },
    }),
  ]
}

export const heldPaperRoutes = [
  ...papersOf('land', '/farms/:farmId/blocks/:id/papers', 'how the land of a block stands, such as the proof of the last prohibited substance'),
  ...papersOf('calibration', '/farms/:farmId/calibrations/:id/papers', 'a calibration'),
  ...papersOf('certificate', '/farms/:farmId/certificates/:id/papers', 'a certificate'),
]
