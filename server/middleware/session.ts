import connectPgSimple from 'connect-pg-simple'
import session from 'express-session'
import type { RequestHandler } from 'express'
import passport from 'passport'
import { Strategy as LocalStrategy } from 'passport-local'
import { isOpenAccount, signIn } from '../services/signIn.ts'
import type { Services } from '../services/services.ts'

const DAY_MS = 86_400_000
/** A session ends after this long, whatever happens; a phone in the rows is not asked every morning. */
const ABSOLUTE_MS = 30 * DAY_MS

const makeAuthenticator = () => new passport.Passport()
type Authenticator = ReturnType<typeof makeAuthenticator>

/** Each server's own passport, so that two in one process never answer for each other. */
const AUTHENTICATORS = new WeakMap<Services, Authenticator>()

/** The passport that judges sign-ins of these services. @throws {Error} before `useSessions`. */
export function authenticatorOf(services: Services): Authenticator {
  const authenticator = AUTHENTICATORS.get(services)
  if (!authenticator) throw new Error('Sessions are not set up')
  return authenticator
}

/** The session store keeps connections of its own, beside the pool that serves. */
const SESSION_CONNECTIONS = 2

declare global {
  namespace Express {
    interface User {
      accountId: string
    }
  }
}

/**
 * Sessions in PostgreSQL and passport over them. Passport renews the session id on sign-in; what an account may
 * do is read per request, never kept in the session.
 */
export function useSessions(services: Services): { handlers: RequestHandler[]; close(): void } {
  const Store = connectPgSimple(session)
  const store = new Store({
    conObject: { connectionString: services.config.databaseUrl, max: SESSION_CONNECTIONS },
    tableName: 'sessions',
    createTableIfMissing: false,
    disableTouch: true,
    pruneSessionInterval: 900,
    errorLog: (...words: unknown[]) => services.logger.warn({ words }, 'sessions'),
  })
  const secure = services.config.publicUrl?.startsWith('https:') ?? false
  const authenticator = makeAuthenticator()
  AUTHENTICATORS.set(services, authenticator)
  authenticator.use(
    new LocalStrategy({ usernameField: 'email' }, (email, password, done) => {
      signIn(services, { email, password }).then(
        (account) => done(null, account ? { accountId: account.id } : false),
        (error: unknown) => done(error),
      )
    }),
  )
  authenticator.serializeUser((user, done) => done(null, user.accountId))
  authenticator.deserializeUser((accountId: string, done) => {
    isOpenAccount(services, accountId).then((isOpen) => done(null, isOpen ? { accountId } : false), done)
  })
  const handlers = [
    session({
      name: 'drenchleaf.sid',
      secret: services.config.sessionSecret,
      store,
      resave: false,
      saveUninitialized: false,
      proxy: secure,
      cookie: { httpOnly: true, sameSite: 'lax', secure, maxAge: ABSOLUTE_MS, path: '/' },
    }),
    authenticator.initialize(),
    authenticator.session(),
  ]
  return { handlers, close: () => store.close() }
}
