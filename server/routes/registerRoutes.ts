import { z } from 'zod'
import { farmParamsSchema, pageOf, pageQuerySchema, thingParamsSchema } from '../../shared/contract/common.ts'
import { translate } from '../../shared/messages/translate.ts'
import { registerRowSchema } from '../../shared/contract/record.ts'
import { filterQuerySchema, printQuerySchema, registerQuerySchema, registerTotalsSchema, registerVolumesSchema, volumeQuerySchema } from '../../shared/contract/register.ts'
import { createSavedFilterSchema, savedFilterSchema } from '../../shared/contract/savedFilter.ts'
import { collectRegisterReport, countVolumes } from '../services/register/collectRegisterReport.ts'
import { listRegister } from '../services/register/listRegister.ts'
import { registerCsv } from '../services/register/registerCsv.ts'
import { registerTotals } from '../services/register/registerTotals.ts'
import { forgetFilter, listSavedFilters, saveFilter } from '../services/register/savedFilters.ts'
import { noteForOutsider } from '../services/season/takeAway.ts'
import { defineRoute } from './defineRoute.ts'
import { EVERY_ROLE } from './roleGroups.ts'
import { sendCsv } from './sendCsv.ts'
import { sendReport } from './sendReport.ts'

export const registerRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/records', summary: 'The register by filter, newest work first unless another order is asked for.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: registerQuerySchema, answer: pageOf(registerRowSchema),
    run: async ({ services, actor, query }) => ({ body: await listRegister(services, actor, query) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/register/totals', summary: 'What the records of a filter add up to: signed ones alone; withdrawn and unsigned ones are counted beside them.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: filterQuerySchema, answer: registerTotalsSchema,
    run: async ({ services, actor, query }) => ({ body: await registerTotals(services, actor, query) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/register/csv', summary: 'The records of a filter as CSV, one line a block of a record.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: printQuerySchema, answer: z.null(), contentType: 'text/csv',
    run: async (call) => {
      const { sort, language = call.language, ...filter } = call.query
      await noteForOutsider(call.services, call.actor, { format: 'registerCsv' })
      await sendCsv(call, registerCsv(call.services, call.actor, { filter, sort }, language), translate(language, 'registerPrint.file'))
      return 'sent'
    },
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/register/volumes', summary: 'Into how many volumes the printed register of a filter goes.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: printQuerySchema, answer: registerVolumesSchema,
    run: async ({ services, actor, query: { sort, language, ...filter }, ...call }) => ({ body: await countVolumes(services, actor, { filter, sort }, language ?? call.language) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/register/pdf', summary: 'A volume of the printed register of a filter.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: volumeQuerySchema, answer: z.null(), contentType: 'application/pdf',
    run: async (call) => {
      const { sort, volume, language = call.language, ...filter } = call.query
      const data = await collectRegisterReport(call.services, call.actor, { filter, sort }, { volume, language })
      await sendReport(call, { kind: 'register', data }, {
        fileName: data.volumes === 1 ? 'register.pdf' : `register-${volume}-of-${data.volumes}.pdf`,
        beforeSending: () => noteForOutsider(call.services, call.actor, { format: 'register', volume: data.volumes === 1 ? null : `${volume}/${data.volumes}` }),
      })
      return 'sent'
    },
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/saved-filters', summary: 'Filters of the register that the caller keeps.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: pageQuerySchema, answer: pageOf(savedFilterSchema),
    run: async ({ services, actor, query }) => ({ body: await listSavedFilters(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/saved-filters', summary: 'Keep a filter under a name, for oneself.', roles: EVERY_ROLE,
    params: farmParamsSchema, body: createSavedFilterSchema, answer: savedFilterSchema,
    run: async ({ services, actor, body }) => {
      const { made, filter } = await saveFilter(services, actor, body)
      return { status: made ? 201 : 200, body: filter }
    },
  }),
  defineRoute({
    method: 'delete', path: '/farms/:farmId/saved-filters/:id', summary: 'Forget a filter of one’s own.', roles: EVERY_ROLE,
    params: thingParamsSchema, answer: z.null(),
    run: async ({ services, actor, params }) => {
      await forgetFilter(services, actor, params.id)
      return { status: 204, body: null }
    },
  }),
]
