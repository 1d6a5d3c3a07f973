import { z } from 'zod'
import { farmParamsSchema, thingParamsSchema } from '../../shared/contract/common.ts'
import { recordSchema } from '../../shared/contract/record.ts'
import {
  amendRecordSchema, discardRecordSchema, reviewRecordSchema, signManyAnswerSchema, signManySchema, withdrawRecordSchema,
} from '../../shared/contract/recordChanges.ts'
import { presentRefusal } from '../middleware/presentProblem.ts'
import { amendRecord } from '../services/records/amendRecord.ts'
import { discardRecord } from '../services/records/discardRecord.ts'
import { reviewRecord } from '../services/records/reviewRecord.ts'
import { signMany } from '../services/records/signMany.ts'
import { withdrawRecord } from '../services/records/withdrawRecord.ts'
import { defineRoute } from './defineRoute.ts'
import { FARM_PEOPLE } from './roleGroups.ts'

/** What becomes of a record after it was written. */
export const recordLifeRoutes = [
  defineRoute({
    method: 'post', path: '/farms/:farmId/records/sign', summary: 'Sign several records with one password; each is signed, or says why not.', roles: FARM_PEOPLE,
    guardsPassword: true, params: farmParamsSchema, body: signManySchema, answer: signManyAnswerSchema,
    run: async ({ services, actor, body, language, request }) => {
      const { signed, refused } = await signMany(services, actor, body)
      return { body: { signed, refused: refused.map(({ id, refusal }) => ({ id, problem: presentRefusal(refusal, language, String(request.id)) })) } }
    },
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/records/:id/amend', summary: 'Write a new version of a signed record, with the reason.', roles: FARM_PEOPLE,
    guardsPassword: true, params: thingParamsSchema, body: amendRecordSchema, answer: recordSchema,
    run: async ({ services, actor, params, body }) => ({ body: await amendRecord(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/records/:id/withdraw', summary: 'Take a signed record back, with the reason: it stays, and counts nowhere.', roles: FARM_PEOPLE,
    guardsPassword: true, params: thingParamsSchema, body: withdrawRecordSchema, answer: recordSchema,
    run: async ({ services, actor, params, body }) => ({ body: await withdrawRecord(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/records/:id/review', summary: 'Say that the version that stands was read; it changes nothing.', roles: ['owner', 'manager'],
    params: thingParamsSchema, body: reviewRecordSchema, answer: recordSchema,
    run: async ({ services, actor, params, body }) => ({ body: await reviewRecord(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/records/:id/discard', summary: 'Take an unsigned record away; one that was started stays in the journal.', roles: FARM_PEOPLE,
    params: thingParamsSchema, body: discardRecordSchema, answer: z.null(),
    run: async ({ services, actor, params, body }) => {
      await discardRecord(services, actor, params.id, body)
      return { status: 204, body: null }
    },
  }),
]
