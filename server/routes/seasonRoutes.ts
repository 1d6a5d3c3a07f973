import { z } from 'zod'
import { farmParamsSchema } from '../../shared/contract/common.ts'
import { seasonParamsSchema } from '../../shared/contract/grant.ts'
import { reportQuerySchema, reportVolumeQuerySchema, reportVolumesSchema, seasonsSchema } from '../../shared/contract/seasonReport.ts'
import { translate } from '../../shared/messages/translate.ts'
import { registerCsv } from '../services/register/registerCsv.ts'
import { asReaderOf } from '../services/season/asReaderOf.ts'
import { assertStillMay } from '../services/season/assertStillMay.ts'
import { collectSeasonReport, countSeasonVolumes } from '../services/season/collectSeasonReport.ts'
import { collectSheetsReport } from '../services/season/collectSheetsReport.ts'
import { describeSeason, seasonPlace } from '../services/season/describeSeason.ts'
import { listSeasons } from '../services/season/listSeasons.ts'
import { takeAway } from '../services/season/takeAway.ts'
import { defineRoute } from './defineRoute.ts'
import { sendCsv } from './sendCsv.ts'
import { sendReport } from './sendReport.ts'

/** Who takes reports of a whole season away. */
const READERS = ['owner', 'manager', 'certifier'] as const
const volumeOf = (volume: number, volumes: number): string | null => (volumes === 1 ? null : `${volume}/${volumes}`)

export const seasonRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/seasons', summary: 'The seasons with signed records, and the running one.', roles: READERS,
    params: farmParamsSchema, answer: seasonsSchema,
    run: async ({ services, actor }) => ({ body: await listSeasons(services, actor) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/seasons/:season/volumes', summary: 'Into how many volumes the season report goes, and the sheets of its records.', roles: READERS,
    params: seasonParamsSchema, query: reportQuerySchema, answer: reportVolumesSchema,
    run: async ({ services, actor, params: { season }, query, ...call }) => ({ body: await countSeasonVolumes(services, actor, { season, language: query.language ?? call.language }) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/seasons/:season/pdf', summary: 'A volume of the season report: cover, summary by block, register.', roles: READERS,
    params: seasonParamsSchema, query: reportVolumeQuerySchema, answer: z.null(), contentType: 'application/pdf',
    run: async (call) => {
      const { services, actor, params: { season }, query: { volume, language = call.language } } = call
      const data = await collectSeasonReport(services, actor, { season, volume, language })
      const of = volumeOf(volume, data.volumes)
      await sendReport(call, { kind: 'season', data }, {
        fileName: `${translate(language, 'seasonPrint.file')}-${season}${of === null ? '' : `-${volume}`}.pdf`,
        beforeSending: () => takeAway(services, actor, { season, format: 'pdf', volume: of, head: data.head }),
      })
      return 'sent'
    },
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/seasons/:season/sheets', summary: 'A volume of the sheets of a season’s records, one after the other.', roles: READERS,
    params: seasonParamsSchema, query: reportVolumeQuerySchema, answer: z.null(), contentType: 'application/pdf',
    run: async (call) => {
      const { services, actor, params: { season }, query: { volume, language = call.language } } = call
      const data = await collectSheetsReport(services, actor, { season, volume, language })
      await sendReport(call, { kind: 'sheets', data }, {
        fileName: `${translate(language, 'seasonPrint.sheets.file')}-${season}-${volume}.pdf`,
        beforeSending: () => takeAway(services, actor, { season, format: 'sheets', volume: volumeOf(volume, data.volumes), head: data.head }),
      })
      return 'sent'
    },
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/seasons/:season/csv', summary: 'The register of a season as CSV, one line a block of a record.', roles: READERS,
    params: seasonParamsSchema, query: reportQuerySchema, answer: z.null(), contentType: 'text/csv',
    run: async (call) => {
      const { services, actor, params: { season }, query: { language = call.language } } = call
      const reader = asReaderOf(actor, season)
      const { head } = await describeSeason(services, reader, season)
      await takeAway(services, actor, { season, format: 'csv', volume: null, head })
      const table = registerCsv(services, reader, seasonPlace(season), language, () => assertStillMay(services, actor, season))
      await sendCsv(call, table, `${translate(language, 'registerPrint.file')}-${season}`)
      return 'sent'
    },
  }),
]
