import { z } from 'zod'
import { sessionSchema, signInSchema } from '../../shared/contract/session.ts'
import { AppError } from '../errors.ts'
import { authenticatorOf } from '../middleware/session.ts'
import { describeSession } from '../services/describeSession.ts'
import { deviceCookieName, markDevice } from '../services/knownDevice.ts'
import { defineRoute, type RouteCall } from './defineRoute.ts'

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
    const accountId = await authenticate(call)
    const { config } = call.services
    call.response.cookie(deviceCookieName(config.sessionSecret, call.body.email), markDevice(config.sessionSecret, call.body.email), {
      httpOnly: true,
      sameSite: 'lax',
      secure: config.publicUrl?.startsWith('https:') ?? false,
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
  run: async ({ request, response }) => {
    await new Promise<void>((resolve, reject) => request.session.destroy((error) => (error ? reject(error as Error) : resolve())))
    response.clearCookie('drenchleaf.sid', { path: '/' })
    return { status: 204, body: null }
  },
})

export const sessionRoutes = [postSession, getSession, deleteSession]

/** Lets passport judge the e-mail and password, and renew the session. */
function authenticate({ request, response, services }: Pick<RouteCall<unknown, unknown, unknown, unknown>, 'request' | 'response' | 'services'>): Promise<string> {
  return new Promise((resolve, reject) => {
    const judge = authenticatorOf(services).authenticate('local', (error: unknown, user: Express.User | false) => {
      if (error) return reject(error as Error)
      if (!user) return reject(new AppError('unauthenticated', 'session.wrong', { countsAsGuess: true }))
      request.logIn(user, (fault: unknown) => (fault ? reject(fault as Error) : resolve(user.accountId)))
    }) as (request: unknown, response: unknown, next: (error: unknown) => void) => void
    judge(request, response, reject)
  })
}
