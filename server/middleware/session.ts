import connectPgSimple from 'connect-pg-simple'
import session from 'express-session'
import type { Request, RequestHandler, Response } from 'express'
import passport from 'passport'
import { Strategy as LocalStrategy } from 'passport-local'
import { isOpenAccount, signIn } from '../services/signIn.ts'
import type { Services } from '../services/services.ts'

const DAY_MS = 86_400_000
/** A session ends after this long, whatever happens; a phone in the rows is not asked every morning. */
const ABSOLUTE_MS = 30 * DAY_MS

/** Judges a sign-in and opens its session. @returns the account's id, or null where e-mail and password do not match. */
export type Authenticate = (request: Request, response: Response) => Promise<string | null>

/** The session store keeps connections of its own, beside the pool that serves. */
const SESSION_CONNECTIONS = 2

declare global {
  namespace Express {
    interface User {
      accountId: string
    }
  }
}

/** What a server keeps of its sessions. */
export interface Sessions {
  handlers: RequestHandler[]
  authenticate: Authenticate
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
      name: sessionName,
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
  return { handlers, authenticate: authenticateWith(authenticator), close: () => store.close() }
}

/** Lets passport judge the e-mail and password of a request, and renew the session. */
function authenticateWith(authenticator: InstanceType<typeof passport.Passport>): Authenticate {
  return (request, response) =>
    new Promise((resolve, reject) => {
      const judge = authenticator.authenticate('local', (error: unknown, user: Express.User | false) => {
        if (error) return reject(error as Error)
        if (!user) return resolve(null)
        request.logIn(user, (fault: unknown) => (fault ? reject(fault as Error) : resolve(user.accountId)))
      }) as RequestHandler
      void judge(request, response, reject)
    })
}
