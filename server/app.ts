import { randomUUID } from 'node:crypto'
import compression from 'compression'
import express, { type Express, type RequestHandler } from 'express'
import { pinoHttp } from 'pino-http'
import '../shared/messages/everyLanguage.ts'
import { AppError, notFound } from './errors.ts'
import { handleErrors } from './middleware/handleErrors.ts'
import { limitPasswords } from './middleware/limitPasswords.ts'
import { readJson } from './middleware/readJson.ts'
import { refuseForeign } from './middleware/refuseForeign.ts'
import { serveClient } from './middleware/serveClient.ts'
import { useSessions, type Sessions } from './middleware/session.ts'
import { setHeaders } from './middleware/setHeaders.ts'
import { API_PAGE_STYLE, renderApiPage } from './routes/apiPage.ts'
import { mountRoutes } from './routes/mountRoutes.ts'
import { describeApi } from './routes/openApi.ts'
import { ROUTES } from './routes/routes.ts'
import { devMail } from './routes/devMail.ts'
import type { Services } from './services/services.ts'

const BODY_LIMIT = '1mb'
const VERSION = '0.1.0'

/** The whole server without listening. @param clientFolder the built client, or null to serve the API alone. */
export function createApp(services: Services, clientFolder: string | null): { app: Express; close(): void } {
  const app = express()
  const sessions = useSessions(services)
  app.disable('x-powered-by')
  app.set('etag', false)
  // With a public address a proxy on this machine stands in front, and says who asks.
  if (services.config.publicUrl !== null) app.set('trust proxy', 'loopback')
  app.use(pinoHttp({ logger: services.logger, genReqId: () => randomUUID(), autoLogging: false }))
  app.use(setHeaders(services.config.cookies.secure))
  app.use(compression())
  app.use('/api', createApi(services, sessions))
  app.use('/dev/mail', devMail(services.keptMail))
  if (clientFolder !== null) app.use(serveClient(clientFolder))
  app.use(refuseElsewhere)
  app.use(handleErrors(services))
  return { app, close: sessions.close }
}

/** Outside the API there are pages to read and nothing else. */
const refuseElsewhere: RequestHandler = (request, response) => {
  if (request.method === 'GET' || request.method === 'HEAD') throw notFound()
  response.set('Allow', 'GET, HEAD')
  throw new AppError('wrong-method', 'wrong_method')
}

function createApi(services: Services, sessions: Sessions): express.Router {
  const api = express.Router()
  const description = describeApi(ROUTES, { version: VERSION, sessionCookie: services.config.cookies.sessionName })
  const page = renderApiPage(description)
  api.use((_request, response, next) => {
    response.set('Cache-Control', 'no-store')
    next()
  })
  api.get('/openapi.json', (_request, response) => void response.json(description))
  api.get('/docs', (_request, response) => void response.type('html').send(page))
  api.get('/docs.css', (_request, response) => void response.type('css').send(API_PAGE_STYLE))
  api.use(refuseForeign)
  api.use(...readJson(BODY_LIMIT))
  api.use(...sessions.handlers)
  api.use(mountRoutes(ROUTES, { services, limitPasswords: limitPasswords(services), authenticate: sessions.authenticate, openFor: sessions.openFor }))
  api.use(() => {
    throw new AppError('not-found', 'not_found')
  })
  return api
}
