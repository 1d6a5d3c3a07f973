import { z } from 'zod'
import { farmParamsSchema } from '../../shared/contract/common.ts'
import { translate } from '../../shared/messages/translate.ts'
import { collectFarmMap } from '../services/ground/collectFarmMap.ts'
import { defineRoute } from './defineRoute.ts'
import { EVERY_ROLE, FARM_PEOPLE } from './roleGroups.ts'
import { sendReport } from './sendReport.ts'

export const reportRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/reports/farm-map', summary: 'The map of the farm to print: blocks, ground, what is kept clear of.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: z.strictObject({ language: z.enum(['en', 'es']).optional(), paper: z.enum(['a4', 'a3', 'letter']).default('a4') }),
    answer: z.null(), contentType: 'application/pdf',
    run: async (call) => {
      const { services, actor, query: { paper, language = call.language } } = call
      await sendReport(call, { kind: 'farmMap', data: await collectFarmMap(services, actor, { paper, language }) }, { fileName: `${translate(language, 'mapPrint.file')}.pdf` })
      return 'sent'
    },
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/reports/blank-record', summary: 'The fields of a record as a form to print, for paper in the rows.', roles: FARM_PEOPLE,
    params: farmParamsSchema, query: z.strictObject({ language: z.enum(['en', 'es']).optional() }), answer: z.null(), contentType: 'application/pdf',
    run: async (call) => {
      const { actor: { farmName: name, zone }, services } = call
      const data = { farm: { name, zone }, printedAt: services.clock.now().toISOString(), language: call.query.language ?? call.language }
      await sendReport(call, { kind: 'blankRecord', data }, { fileName: 'blank-record.pdf' })
      return 'sent'
    },
  }),
]
