import { addFileSchema, attachmentSchema } from '../../shared/contract/attachment.ts'
import { farmParamsSchema, thingParamsSchema } from '../../shared/contract/common.ts'
import { addPaperSchema, changePaperSchema, paperQuerySchema, personPaperSchema, personPapersSchema } from '../../shared/contract/person.ts'
import { addFile } from '../services/files/addFile.ts'
import { addPaper, changePaper, listPapers } from '../services/people/papers.ts'
import { defineRoute } from './defineRoute.ts'
import { FARM_PEOPLE, LEADERS } from './roleGroups.ts'

/** Training and licences of the farm's people. */
export const paperRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/person-papers', summary: 'Training and licences of people; those that run out first come first.', roles: FARM_PEOPLE,
    params: farmParamsSchema, query: paperQuerySchema, answer: personPapersSchema,
    run: async ({ services, actor, query }) => ({ body: { items: await listPapers(services, actor, query), next: null } }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/person-papers', summary: 'Write down training or a licence of a person.', roles: LEADERS,
    params: farmParamsSchema, body: addPaperSchema, answer: personPaperSchema,
    run: async ({ services, actor, body }) => {
      const { made, paper } = await addPaper(services, actor, body)
      return { status: made ? 201 : 200, body: paper }
    },
  }),
  defineRoute({
    method: 'put', path: '/farms/:farmId/person-papers/:id', summary: 'Write training or a licence anew, or take it out of the list.', roles: LEADERS,
    params: thingParamsSchema, body: changePaperSchema, answer: personPaperSchema,
    run: async ({ services, actor, params, body }) => ({ body: await changePaper(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/person-papers/:id/files', summary: 'Add the paper itself: one file of at most 10 MB, JPEG, PNG, WebP or PDF.', roles: LEADERS,
    params: thingParamsSchema, upload: true, body: addFileSchema, answer: attachmentSchema,
    run: async ({ services, actor, params, body, file }) => {
      const { made, file: added } = await addFile(services, actor, { about: 'person-paper', id: params.id }, body, file)
      return { status: made ? 201 : 200, body: added }
    },
  }),
]
