import { z } from 'zod'
import type { Route } from './defineRoute.ts'
import { schemaOf } from './openApiSchema.ts'

const REFUSALS = {
  400: 'It could not be read, or its link is used up.',
  401: 'Nobody is signed in, or e-mail and password do not match.',
  403: 'Not this role, or not from the register’s own pages.',
  404: 'Nothing is here for this account.',
  409: 'It is there already, or it changed since it was read.',
  413: 'Too large.',
  415: 'Not application/json, or not a file that is taken.',
  422: 'Something in it cannot be taken, or is unlikely and not acknowledged.',
  429: 'Too many attempts with a password.',
  503: 'The file store is full or out of reach. Try again later.',
  default: 'Refused, or failed here.',
} as const

/** What a route answers when it has done its work, by status. */
export function describeAnswers(route: Route): Record<string, object> {
  if (route.contentType !== undefined) {
    return { 200: { description: 'Done.', content: { [route.contentType]: { schema: { type: 'string', format: 'binary' } } } } }
  }
  if (route.answer instanceof z.ZodNull) return { 204: { description: 'Done.' } }
  const content = { 'application/json': { schema: schemaOf(route.answer, 'output') } }
  if (!isMaking(route)) return { 200: { description: 'Done.', content } }
  return { 200: { description: 'Made before by the same request.', content }, 201: { description: 'Made.', content } }
}

/** What it may refuse, by status; every one a problem. */
export function describeRefusals(route: Route): Record<string, object> {
  const isWriting = route.method !== 'get'
  const onFarm = Array.isArray(route.roles)
  const may: Record<keyof typeof REFUSALS, boolean> = {
    400: route.body !== undefined,
    401: route.roles !== 'everybody' || route.guardsPassword,
    403: isWriting || onFarm,
    404: route.params !== undefined,
    409: route.body !== undefined && route.roles !== 'everybody',
    413: route.body !== undefined,
    415: route.body !== undefined,
    422: true,
    429: route.guardsPassword,
    503: route.path.includes('/files'),
    default: true,
  }
  const content = { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } }
  return Object.fromEntries(Object.entries(REFUSALS).filter(([status]) => may[status as keyof typeof may]).map(([status, description]) => [status, { description, content }]))
}

/** Things are made under an id of the maker's, so that a repeat makes no second one. */
function isMaking({ method, path, body, upload }: Route): boolean {
  if (upload) return true
  if (method !== 'post' || !body || path.includes('/:id')) return false
  const { properties = {} } = schemaOf(body, 'input') as { properties?: object }
  return 'id' in properties
}
