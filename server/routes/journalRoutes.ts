import { z } from 'zod'
import { farmParamsSchema, pageOf } from '../../shared/contract/common.ts'
import { journalCsvQuerySchema, journalEntrySchema, journalQuerySchema } from '../../shared/contract/journal.ts'
import { translate } from '../../shared/messages/translate.ts'
import { journalCsv } from '../services/journal/journalCsv.ts'
import { listJournal } from '../services/journal/listJournal.ts'
import { defineRoute } from './defineRoute.ts'
import { LEADERS } from './roleGroups.ts'
import { sendCsv } from './sendCsv.ts'

export const journalRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/journal', summary: 'Who did what, when and from where, the newest first.', roles: LEADERS,
    params: farmParamsSchema, query: journalQuerySchema, answer: pageOf(journalEntrySchema),
    run: async ({ services, actor, query }) => ({ body: await listJournal(services, actor, query) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/journal/csv', summary: 'The same as CSV.', roles: LEADERS,
    params: farmParamsSchema, query: journalCsvQuerySchema, answer: z.null(), contentType: 'text/csv',
    run: async (call) => {
      const { language = call.language, ...filter } = call.query
      await sendCsv(call, journalCsv(call.services, call.actor, filter, language), translate(language, 'journal.file'))
      return 'sent'
    },
  }),
]
