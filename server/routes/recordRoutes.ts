import { z } from 'zod'
import { farmParamsSchema, thingParamsSchema } from '../../shared/contract/common.ts'
import { recordSchema } from '../../shared/contract/record.ts'
import { createRecordSchema, signRecordSchema, updateRecordSchema } from '../../shared/contract/recordChanges.ts'
import { recordVersionsSchema } from '../../shared/contract/recordVersions.ts'
import { collectRecordReport } from '../services/records/collectRecordReport.ts'
import { createRecord } from '../services/records/createRecord.ts'
import { listRecordVersions } from '../services/records/listRecordVersions.ts'
import { getRecord } from '../services/records/readRecords.ts'
import { signRecord } from '../services/records/signRecord.ts'
import { updateRecord } from '../services/records/updateRecord.ts'
import { noteForOutsider } from '../services/season/takeAway.ts'
import { defineRoute } from './defineRoute.ts'
import { EVERY_ROLE, FARM_PEOPLE } from './roleGroups.ts'
import { sendReport } from './sendReport.ts'

/** An older version prints as it was signed; without one, the newest. */
const printQuerySchema = z.strictObject({ language: z.enum(['en', 'es']).optional(), version: z.coerce.number().int().min(1).max(9999).optional() })

export const recordRoutes = [
  defineRoute({
    method: 'post', path: '/farms/:farmId/records', summary: 'Take in a draft or a started record.', roles: FARM_PEOPLE,
    params: farmParamsSchema, body: createRecordSchema, answer: recordSchema,
    run: async ({ services, actor, body }) => {
      const { made, record } = await createRecord(services, actor, body)
      return { status: made ? 201 : 200, body: record }
    },
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/records/:id', summary: 'One record with its figures and checks.', roles: EVERY_ROLE,
    params: thingParamsSchema, answer: recordSchema,
    run: async ({ services, actor, params }) => ({ body: await getRecord(services, actor, params.id) }),
  }),
  defineRoute({
    method: 'put', path: '/farms/:farmId/records/:id', summary: 'Write an unsigned record anew.', roles: FARM_PEOPLE,
    params: thingParamsSchema, body: updateRecordSchema, answer: recordSchema,
    run: async ({ services, actor, params, body }) => ({ body: await updateRecord(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/records/:id/sign', summary: 'Sign a record with the password: it gets its number, its lots are drawn down.', roles: FARM_PEOPLE,
    guardsPassword: true, params: thingParamsSchema, body: signRecordSchema, answer: recordSchema,
    run: async ({ services, actor, params, body }) => ({ body: await signRecord(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/records/:id/versions', summary: 'Signed versions with the text their digests are over, and what changed from one to the next.', roles: EVERY_ROLE,
    params: thingParamsSchema, answer: recordVersionsSchema,
    run: async ({ services, actor, params }) => ({ body: await listRecordVersions(services, actor, params.id) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/records/:id/pdf', summary: 'The application record as PDF, as it stands or as an older version said it.', roles: EVERY_ROLE,
    params: thingParamsSchema, query: printQuerySchema, answer: z.null(), contentType: 'application/pdf',
    run: async (call) => {
      const { language = call.language, version } = call.query
      const data = await collectRecordReport(call.services, call.actor, call.params.id, { language, version })
      const name = version === undefined ? data.signed.record.number : `${data.signed.record.number}-version-${version}`
      await sendReport(call, { kind: 'record', data }, {
        fileName: `record-${name}.pdf`, beforeSending: () => noteForOutsider(call.services, call.actor, { format: 'record', subjectId: call.params.id, number: data.signed.record.number }),
      })
      return 'sent'
    },
  }),
]
