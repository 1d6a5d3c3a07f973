import { z } from 'zod'
import {
  beginFactorSchema, changeMeSchema, changePasswordSchema, confirmFactorSchema, factorOfferSchema, factorStateSchema, ownSessionsSchema, proveFactorSchema,
  recoveryCodesSchema, sessionParamsSchema,
} from '../../shared/contract/me.ts'
import { sessionSchema } from '../../shared/contract/session.ts'
import { logSecurity } from '../middleware/logSecurity.ts'
import { beginFactor, confirmFactor, readFactor, removeFactor, renewCodes } from '../services/factor/ownFactor.ts'
import { changeMe, changePassword } from '../services/me/changeMe.ts'
import { endOwnSession, endOtherSessions, listOwnSessions } from '../services/sessions/ownSessions.ts'
import { defineRoute } from './defineRoute.ts'

/** Who asks, and by which session. */
const whoOf = ({ accountId, request }: { accountId: string; request: Express.Request }) => ({ accountId, sessionId: request.user?.open?.id ?? '' })

export const meRoutes = [
  defineRoute({
    method: 'patch', path: '/me', summary: 'Change one’s own name, language and preferences.', roles: 'account',
    body: changeMeSchema, answer: sessionSchema.shape.user,
    run: async ({ services, accountId, body }) => ({ body: await changeMe(services, accountId, body) }),
  }),
  defineRoute({
    method: 'put', path: '/me/password', summary: 'Take another password, or PIN; all other sessions end.', roles: 'account',
    guardsPassword: true, body: changePasswordSchema, answer: z.null(),
    run: async (call) => {
      await changePassword(call.services, whoOf(call), call.body)
      logSecurity(call.services, call.request, 'password.changed')
      return { status: 204, body: null }
    },
  }),
  defineRoute({
    method: 'get', path: '/me/sessions', summary: 'Where one is signed in.', roles: 'account', answer: ownSessionsSchema,
    run: async (call) => ({ body: { items: await listOwnSessions(call.services, whoOf(call)), next: null } }),
  }),
  defineRoute({
    method: 'delete', path: '/me/sessions/:id', summary: 'End one of one’s own sessions.', roles: 'account',
    params: sessionParamsSchema, answer: z.null(),
    run: async ({ services, accountId, params }) => {
      await endOwnSession(services, accountId, params.id)
      return { status: 204, body: null }
    },
  }),
  defineRoute({
    method: 'delete', path: '/me/sessions', summary: 'End all of one’s own sessions but this one.', roles: 'account', answer: z.null(),
    run: async (call) => {
      await endOtherSessions(call.services, whoOf(call))
      return { status: 204, body: null }
    },
  }),
  defineRoute({
    method: 'get', path: '/me/second-factor', summary: 'Since when there is a second factor, and how many recovery codes are left.', roles: 'account', answer: factorStateSchema,
    run: async ({ services, accountId }) => ({ body: await readFactor(services, accountId) }),
  }),
  defineRoute({
    method: 'post', path: '/me/second-factor', summary: 'Be offered a secret for an authenticator; nothing changes before it is confirmed.', roles: 'account',
    guardsPassword: true, body: beginFactorSchema, answer: factorOfferSchema,
    run: async ({ services, accountId, body }) => ({ body: await beginFactor(services, accountId, body) }),
  }),
  defineRoute({
    method: 'put', path: '/me/second-factor', summary: 'Take the offered secret on, proved by a code of it; recovery codes are shown this once.', roles: 'account',
    guardsPassword: true, body: confirmFactorSchema, answer: recoveryCodesSchema,
    run: async (call) => {
      const codes = await confirmFactor(call.services, whoOf(call), call.body.code)
      logSecurity(call.services, call.request, 'factor.changed')
      return { body: { codes } }
    },
  }),
  defineRoute({
    method: 'post', path: '/me/second-factor/remove', summary: 'Take one’s own second factor away.', roles: 'account',
    guardsPassword: true, body: proveFactorSchema, answer: z.null(),
    run: async (call) => {
      await removeFactor(call.services, whoOf(call), call.body)
      logSecurity(call.services, call.request, 'factor.changed')
      return { status: 204, body: null }
    },
  }),
  defineRoute({
    method: 'post', path: '/me/second-factor/codes', summary: 'New recovery codes for the ones before.', roles: 'account',
    guardsPassword: true, body: proveFactorSchema, answer: recoveryCodesSchema,
    run: async ({ services, accountId, body }) => ({ body: { codes: await renewCodes(services, accountId, body) } }),
  }),
]
