import { z } from 'zod'
import { farmParamsSchema } from '../../shared/contract/common.ts'
import { defineRoute } from './defineRoute.ts'
import { FARM_PEOPLE } from './roleGroups.ts'
import { sendReport } from './sendReport.ts'

export const reportRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/reports/blank-record', summary: 'The fields of a record as a form to print, for paper in the rows.', roles: FARM_PEOPLE,
    params: farmParamsSchema, query: z.strictObject({ language: z.enum(['en', 'es']).optional() }), answer: z.null(), contentType: 'application/pdf',
    run: async (call) => {
      const { actor: { farmName: name, zone }, services } = call
      const data = { farm: { name, zone }, printedAt: services.clock.now().toISOString(), language: call.query.language ?? call.language }
      await sendReport(call, { kind: 'blankRecord', data }, 'blank-record.pdf')
      return 'sent'
    },
  }),
]
