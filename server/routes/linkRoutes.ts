import { z } from 'zod'
import { emailSchema } from '../../shared/contract/email.ts'
import { acceptSignedInSchema, acceptWelcomeSchema, linkParamsSchema, spendResetSchema, welcomeSchema } from '../../shared/contract/welcome.ts'
import { logSecurity } from '../middleware/logSecurity.ts'
import { originOf } from '../middleware/originOf.ts'
import { rememberDevice } from '../middleware/rememberDevice.ts'
import { askForReset, readReset, resetPassword } from '../services/resetPassword.ts'
import { acceptSignedIn, acceptWelcome, readWelcome } from '../services/welcome.ts'
import { defineRoute } from './defineRoute.ts'

/** What one-time links open: a first password, a farm, a new password. */
export const linkRoutes = [
  defineRoute({
    method: 'get', path: '/welcome/:token', summary: 'Whom a one-time link is for.', roles: 'everybody',
    params: linkParamsSchema, answer: welcomeSchema,
    run: async ({ services, params }) => ({ body: await readWelcome(services, params.token) }),
  }),
  defineRoute({
    method: 'post', path: '/welcome', summary: 'Spend a one-time link: take a name and a password.', roles: 'everybody',
    guardsPassword: true, body: acceptWelcomeSchema, answer: z.null(),
    run: async ({ services, body, request, response }) => {
      const { accountId, email } = await acceptWelcome(services, body, originOf(request))
      logSecurity(services, request, 'password.changed', { accountId })
      rememberDevice(services, response, email)
      return { status: 204, body: null }
    },
  }),
  defineRoute({
    method: 'post', path: '/welcome/accept', summary: 'Take an invitation with the account that is signed in.', roles: 'account',
    guardsPassword: true, body: acceptSignedInSchema, answer: z.object({ farmId: z.string() }),
    run: async ({ services, accountId, body, request }) => ({ body: await acceptSignedIn(services, accountId, body.token, originOf(request)) }),
  }),
  defineRoute({
    method: 'post', path: '/reset', summary: 'Ask for a new password by letter; the answer is the same for every e-mail.', roles: 'everybody',
    body: z.strictObject({ email: emailSchema }), answer: z.null(),
    run: async ({ services, body, language, request }) => {
      await askForReset(services, { email: body.email, language, address: request.ip ?? '' })
      return { status: 204, body: null }
    },
  }),
  defineRoute({
    method: 'get', path: '/reset/:token', summary: 'Whose password a one-time link renews.', roles: 'everybody',
    params: linkParamsSchema, answer: z.object({ email: z.string() }),
    run: async ({ services, params }) => ({ body: await readReset(services, params.token) }),
  }),
  defineRoute({
    method: 'post', path: '/reset/password', summary: 'Spend a one-time link: take a new password; its account’s sessions end.', roles: 'everybody',
    guardsPassword: true, body: spendResetSchema, answer: z.null(),
    run: async ({ services, body, request }) => {
      const accountId = await resetPassword(services, body)
      logSecurity(services, request, 'password.changed', { accountId })
      return { status: 204, body: null }
    },
  }),
]
