import { z } from 'zod'
import { sessionSchema, signInSchema } from '../../shared/contract/session.ts'
import { AppError } from '../errors.ts'
import { logSecurity } from '../middleware/logSecurity.ts'
import { rememberDevice } from '../middleware/rememberDevice.ts'
import { describeSession } from '../services/describeSession.ts'
import { defineRoute } from './defineRoute.ts'

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
    logSecurity(call.services, call.request, 'sign-in.ok', { accountId })
    rememberDevice(call.services, call.response, call.body.email)
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
