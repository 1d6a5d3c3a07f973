import connectPgSimple from 'connect-pg-simple'
import session from 'express-session'
import type { RequestHandler } from 'express'
import passport from 'passport'
import { Strategy as LocalStrategy } from 'passport-local'
import { signIn } from '../services/signIn.ts'
import type { Services } from '../services/services.ts'

const DAY_MS = 86_400_000
/** A session ends after this long, whatever happens; a phone in the rows is not asked every morning. */
const ABSOLUTE_MS = 30 * DAY_MS

declare global {
  // eslint has no say in how Express lets a session's user be named.
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
    conString: services.config.databaseUrl,
    tableName: 'sessions',
    createTableIfMissing: false,
    disableTouch: true,
    pruneSessionInterval: 900,
    errorLog: (...words: unknown[]) => services.logger.warn({ words }, 'sessions'),
  })
  const secure = services.config.publicUrl?.startsWith('https:') ?? false
  passport.use(
    new LocalStrategy({ usernameField: 'email' }, (email, password, done) => {
      signIn(services, { email, password }).then(
        (account) => done(null, account ? { accountId: account.id } : false),
        (error: unknown) => done(error),
      )
    }),
  )
  passport.serializeUser((user, done) => done(null, user.accountId))
  passport.deserializeUser((accountId: string, done) => done(null, { accountId }))
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
    passport.initialize(),
    passport.session(),
  ]
  return { handlers, close: () => store.close() }
}
