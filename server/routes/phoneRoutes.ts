import type { Request } from 'express'
import { z } from 'zod'
import { farmParamsSchema, thingParamsSchema } from '../../shared/contract/common.ts'
import { sessionSchema } from '../../shared/contract/session.ts'
import { enrolPhoneSchema, phoneHereSchema, pinSignInSchema, sharedPhoneSchema, sharedPhonesSchema } from '../../shared/contract/sharedPhone.ts'
import { logSecurity } from '../middleware/logSecurity.ts'
import { describeSession } from '../services/describeSession.ts'
import { enrolPhone, revokePhone } from '../services/phones/enrolPhone.ts'
import { listPhones } from '../services/phones/listPhones.ts'
import { readPhoneMark, writePhoneMark, type PhoneMark } from '../services/phones/phoneCookie.ts'
import { readPhoneHere, signInOnPhone } from '../services/phones/signInOnPhone.ts'
import type { Services } from '../services/services.ts'
import { defineRoute } from './defineRoute.ts'
import { LEADERS } from './roleGroups.ts'

const YEAR_MS = 365 * 86_400_000

const markOf = ({ config }: Services, request: Request): PhoneMark | null => readPhoneMark(config.cookies.phoneName, request.get('Cookie'))

export const phoneRoutes = [
  defineRoute({
    method: 'get', path: '/shared-phone', summary: 'Whose phone this is, and who signs in on it by PIN.', roles: 'everybody',
    answer: phoneHereSchema,
    run: async ({ services, request }) => ({ body: { phone: await readPhoneHere(services, markOf(services, request)) } }),
  }),
  defineRoute({
    method: 'post', path: '/shared-phone/session', summary: 'Sign in by PIN on a phone of the farm; the session lasts 12 hours.', roles: 'everybody',
    guardsPassword: true, body: pinSignInSchema, answer: sessionSchema,
    run: async ({ services, request, body, openFor }) => {
      const mark = markOf(services, request)
      const accountId = await signInOnPhone(services, mark, body)
      await openFor(accountId, mark)
      logSecurity(services, request, 'sign-in.ok', { accountId })
      return { body: await describeSession(services, accountId) }
    },
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/shared-phones', summary: 'The farm’s shared phones, and when they were used last.', roles: LEADERS,
    params: farmParamsSchema, answer: sharedPhonesSchema,
    run: async ({ services, actor }) => ({ body: { items: await listPhones(services, actor), next: null } }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/shared-phones', summary: 'Make the phone that asks one of the farm’s.', roles: LEADERS,
    guardsPassword: true, params: farmParamsSchema, body: enrolPhoneSchema, answer: sharedPhoneSchema,
    run: async ({ services, actor, body, request, response }) => {
      const { made, phone, secret } = await enrolPhone(services, actor, body)
      const { phoneName, secure } = services.config.cookies
      response.cookie(phoneName, writePhoneMark({ farmId: actor.farmId, phoneId: phone.id, secret }), {
        httpOnly: true, sameSite: 'lax', secure, maxAge: YEAR_MS, path: '/api/shared-phone',
      })
      logSecurity(services, request, 'phone.enrolled', { code: phone.id })
      return { status: made ? 201 : 200, body: phone }
    },
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/shared-phones/:id/revoke', summary: 'Take a phone away from the farm; who signed in on it is out.', roles: LEADERS,
    params: thingParamsSchema, answer: z.null(),
    run: async ({ services, actor, params }) => {
      await revokePhone(services, actor, params.id)
      return { status: 204, body: null }
    },
  }),
]
