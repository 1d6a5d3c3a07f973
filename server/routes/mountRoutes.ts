import { Router, type Request, type RequestHandler, type Response } from 'express'
import type { z } from 'zod'
import { AppError, forbidden, notFound } from '../errors.ts'
import type { FarmActor } from '../database/actor.ts'
import { originOf } from '../middleware/originOf.ts'
import type { Authenticate, OpenFor } from '../middleware/session.ts'
import { readLanguage } from '../middleware/readLanguage.ts'
import { readUpload } from '../middleware/readUpload.ts'
import type { UploadedFile } from '../services/files/judgeFile.ts'
import type { Services } from '../services/services.ts'
import type { Route } from './defineRoute.ts'

/** What the routes stand on. */
interface House {
  services: Services
  limitPasswords: RequestHandler
  authenticate: Authenticate
  openFor: OpenFor
}

/**
 * The router of all routes. The order of refusals is the same everywhere: no session 401, not your world 404,
 * not your job 403, then what was sent 422. A method that a path does not have is 405.
 */
export function mountRoutes(routes: Route[], house: House): Router {
  const router = Router({ caseSensitive: true })
  for (const route of routes) {
    const guards = route.guardsPassword ? [house.limitPasswords] : []
    router[route.method](route.path, ...guards, (request: Request, response: Response) => serve(route, house, request, response))
  }
  for (const path of new Set(routes.map((route) => route.path))) {
    router.all(path, (_request: Request, response: Response) => {
      const methods = routes.filter((route) => route.path === path).map((route) => route.method.toUpperCase())
      response.set('Allow', methods.join(', '))
      throw new AppError('wrong-method', 'wrong_method')
    })
  }
  return router
}

async function serve(route: Route, { services, authenticate, openFor }: House, request: Request, response: Response): Promise<void> {
  if (!route.upload && request.is('multipart/form-data')) throw new AppError('wrong-type', 'wrong_type')
  const accountId = request.user?.accountId ?? ''
  if (route.roles !== 'everybody' && accountId === '') throw new AppError('unauthenticated', 'unauthenticated')
  const params = parsePath(route.params, request.params)
  const actor = Array.isArray(route.roles) ? await authorise(route, services, request, params) : null
  const query = route.query ? route.query.parse(request.query) : refuseQuery(request.query)
  const { fields, file } = await readBody(route, request, response)
  const answer = await route.run({
    params,
    query,
    body: route.body ? route.body.parse(fields) : {},
    file,
    actor,
    accountId,
    language: readLanguage(request),
    services,
    authenticate: () => authenticate(request, response),
    openFor: (account, kind) => openFor(request, account, kind),
    request,
    response,
  })
  if (answer === 'sent') return
  if (services.checkAnswers) route.answer.parse(answer.body)
  response.status(answer.status ?? 200)
  if (answer.body === null) response.end()
  else response.json(answer.body)
}

/** What was sent: read already where it is JSON, and only now where it is a file. */
async function readBody(route: Route, request: Request, response: Response): Promise<{ fields: unknown; file: UploadedFile | null }> {
  return route.upload ? readUpload(request, response) : { fields: request.body ?? {}, file: null }
}

/** A path that names nothing readable names nothing that is there. */
function parsePath(schema: z.ZodType | undefined, params: unknown): unknown {
  if (!schema) return {}
  const result = schema.safeParse(params)
  if (!result.success) throw notFound()
  return result.data
}

function refuseQuery(query: object): Record<string, never> {
  const errors = Object.keys(query).map((name) => ({ path: name.slice(0, 80), code: 'unknown_field' }))
  if (errors.length > 0) throw new AppError('invalid-input', 'invalid', { errors })
  return {}
}

async function authorise(route: Route, services: Services, request: Request, params: unknown): Promise<FarmActor> {
  const { farmId } = params as { farmId: string }
  const access = await services.database.listAccess(request.user?.accountId ?? '', services.clock.now())
  const actor = access.find((candidate) => candidate.farmId === farmId.toLowerCase())
  if (!actor) throw notFound()
  if (!route.roles.includes(actor.role)) throw forbidden()
  if (actor.asksFactor && request.user?.open?.hasFactor !== true) throw forbidden('session.factor_needed')
  return { ...actor, origin: originOf(request) }
}
