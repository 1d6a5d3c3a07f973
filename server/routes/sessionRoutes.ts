import { z } from 'zod'
import { sessionSchema, signInSchema } from '../../shared/contract/session.ts'
import { AppError } from '../errors.ts'
import { logSecurity } from '../middleware/logSecurity.ts'
import { describeSession } from '../services/describeSession.ts'
import { deviceCookieName, markDevice } from '../services/knownDevice.ts'
import { defineRoute } from './defineRoute.ts'

const YEAR_MS = 365 * 86_400_000

const postSession = defineRoute({
  method: 'post',
  path: '/session',
  summary: 'Sign in with e-mail and password; the session id is new afterwards.',
  roles: 'everybody',
  guardsPassword: true,
  body: signInSchema,
  answer: sessionSchema,
  run: async (call) => {
    const accountId = await call.authenticate()
    if (accountId === null) throw new AppError('unauthenticated', 'session.wrong', { countsAsGuess: true })
    const { config } = call.services
    logSecurity(call.services, call.request, 'sign-in.ok', { accountId })
    call.response.cookie(deviceCookieName(config, call.body.email), markDevice(config.sessionSecret, call.body.email), {
      httpOnly: true,
      sameSite: 'lax',
      secure: config.cookies.secure,
      maxAge: YEAR_MS,
      path: '/api/session',
    })
    return { body: await describeSession(call.services, accountId) }
  },
})

const getSession = defineRoute({
  method: 'get',
  path: '/session',
  summary: 'Who is signed in, and the farms open to them.',
  roles: 'account',
  answer: sessionSchema,
  run: async ({ services, accountId }) => ({ body: await describeSession(services, accountId) }),
})

const deleteSession = defineRoute({
  method: 'delete',
  path: '/session',
  summary: 'Sign out.',
  roles: 'account',
  answer: z.null(),
  run: async ({ request, response, services }) => {
    await new Promise<void>((resolve, reject) => request.session.destroy((error) => (error ? reject(error as Error) : resolve())))
    response.clearCookie(services.config.cookies.sessionName, { path: '/', secure: services.config.cookies.secure })
    return { status: 204, body: null }
  },
})

export const sessionRoutes = [postSession, getSession, deleteSession]
