import connectPgSimple from 'connect-pg-simple'
import session from 'express-session'
import type { Request, RequestHandler, Response } from 'express'
import passport from 'passport'
import { Strategy as LocalStrategy } from 'passport-local'
import { AppError } from '../errors.ts'
import { assertSecondStep } from '../services/factor/assertSecondStep.ts'
import { findKnownDevice } from '../services/knownDevice.ts'
import { readOpenSession, type OpenSession } from '../services/sessions/readOpenSession.ts'
import { recordSession, type SessionKind } from '../services/sessions/recordSession.ts'
import { longestSpan } from '../services/sessions/sessionLimits.ts'
import { watchSignIns, type SeenSignIn } from '../services/sessions/watchSignIns.ts'
import type { Services } from '../services/services.ts'
import { signIn } from '../services/signIn.ts'
import { emailOf } from './limitPasswords.ts'

/** Judges a sign-in and opens its session. @returns the account's id, or null where e-mail and password do not match. */
export type Authenticate = (request: Request, response: Response) => Promise<string | null>

/** Opens a session for an account that was judged elsewhere: by PIN on a shared phone. */
export type OpenFor = (request: Request, accountId: string, kind: SessionKind) => Promise<void>

/** The session store keeps connections of its own, beside the pool that serves. */
const SESSION_CONNECTIONS = 2

declare global {
  namespace Express {
    interface User {
      accountId: string
      /** Null until the session that is being opened is written. */
      open: OpenSession | null
    }
  }
}

/** What a server keeps of its sessions. */
export interface Sessions {
  handlers: RequestHandler[]
  authenticate: Authenticate
  openFor: OpenFor
  close(): void
}

/**
 * Sessions in PostgreSQL and passport over them, each server its own. Passport renews the session id on sign-in; what an account may
 * do is read per request, never kept in the session.
 */
export function useSessions(services: Services): Sessions {
  const Store = connectPgSimple(session)
  const store = new Store({
    conObject: { connectionString: services.config.databaseUrl, max: SESSION_CONNECTIONS },
    tableName: 'sessions',
    createTableIfMissing: false,
    disableTouch: true,
    pruneSessionInterval: 900,
    errorLog: (...words: unknown[]) => services.logger.warn({ words }, 'sessions'),
  })
  const { secure, sessionName } = services.config.cookies
  const authenticator = new passport.Passport()
  authenticator.use(
    new LocalStrategy({ usernameField: 'email' }, (email, password, done) => {
      signIn(services, { email, password }).then(
        (account) => done(null, account ? { accountId: account.id, open: null } : false),
        (error: unknown) => done(error),
      )
    }),
  )
  authenticator.serializeUser((user, done) => done(null, user.accountId))
  authenticator.deserializeUser((request: Request, accountId: string, done: (fault: unknown, user?: Express.User | false) => void) => {
    readOpenSession(services, { sid: request.sessionID, accountId }).then((open) => done(null, open ? { accountId, open } : false), (fault: unknown) => done(fault))
  })
  const handlers = [
    session({
      name: sessionName,
      secret: services.config.sessionSecret,
      store,
      resave: false,
      saveUninitialized: false,
      proxy: secure,
      cookie: { httpOnly: true, sameSite: 'lax', secure, maxAge: longestSpan(false), path: '/' },
    }),
    authenticator.initialize(),
    authenticator.session(),
  ]
  const openFor: OpenFor = (request, accountId, kind) => openSession(services, request, accountId, kind)
  return { handlers, openFor, authenticate: authenticateWith(services, authenticator), close: () => store.close() }
}

/** Lets passport judge the e-mail and password of a request; then the second factor is asked, where there is one, and the session opens under a new id. */
function authenticateWith(services: Services, authenticator: InstanceType<typeof passport.Passport>): Authenticate {
  const watch = watchSignIns(services)
  return async (request, response) => {
    const seen = seenIn(services, request)
    const user = await new Promise<Express.User | false>((resolve, reject) => {
      const judge = authenticator.authenticate('local', (error: unknown, found: Express.User | false) => (error ? reject(error as Error) : resolve(found))) as RequestHandler
      void judge(request, response, reject)
    })
    if (!user) {
      await watch.refused(seen)
      return null
    }
    try {
      await assertSecondStep(services, user.accountId, codeOf(request))
    } catch (refusal) {
      if (refusal instanceof AppError && refusal.code === 'session.code_wrong') await watch.codeRefused(user.accountId, seen)
      throw refusal
    }
    await openSession(services, request, user.accountId, null)
    await watch.opened(user.accountId, seen)
    return user.accountId
  }
}

async function openSession(services: Services, request: Request, accountId: string, kind: SessionKind): Promise<void> {
  await new Promise<void>((resolve, reject) => {
    request.logIn({ accountId, open: null }, (fault: unknown) => (fault ? reject(fault as Error) : resolve()))
  })
  request.session.cookie.maxAge = longestSpan(kind !== null)
  await new Promise<void>((resolve, reject) => request.session.save((fault: unknown) => (fault ? reject(fault as Error) : resolve())))
  await recordSession(services, { sid: request.sessionID, accountId, agent: request.get('User-Agent') ?? null, kind })
}

function seenIn({ config }: Services, request: Request): SeenSignIn {
  const email = emailOf(request)
  return { email, isKnown: findKnownDevice(config, request.get('Cookie'), email) !== null, agent: request.get('User-Agent'), address: request.ip }
}

function codeOf({ body }: Request): string | undefined {
  return typeof body === 'object' && body !== null && 'code' in body && typeof body.code === 'string' ? body.code : undefined
}
