import { z } from 'zod'
import { problemSchema } from '../../shared/contract/problem.ts'
import type { Route } from './defineRoute.ts'

interface Operation {
  summary: string
  operationId: string
  'x-roles': string | readonly string[]
  parameters: object[]
  requestBody?: object
  responses: Record<string, object>
}
export interface OpenApi {
  openapi: '3.1.0'
  info: object
  servers: object[]
  paths: Record<string, Record<string, Operation>>
  components: object
}

/** The API as OpenAPI 3.1, from the routes themselves. */
export function describeApi(routes: Route[], version: string): OpenApi {
  const paths: OpenApi['paths'] = {}
  for (const route of routes) {
    const path = route.path.replace(/:(\w+)/g, '{$1}')
    paths[path] = { ...paths[path], [route.method]: describeRoute(route) }
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Drenchleaf',
      version,
      description: 'Every unsafe request carries the header X-Requested-With: drenchleaf. Problems are RFC 9457.',
    },
    servers: [{ url: '/api' }],
    paths,
    components: { schemas: { Problem: schemaOf(problemSchema, 'output') } },
  }
}

function describeRoute(route: Route): Operation {
  return {
    summary: route.summary,
    operationId: `${route.method}${route.path.replace(/[/:]+(\w)/g, (_match, letter: string) => letter.toUpperCase())}`,
    'x-roles': route.roles,
    parameters: [...describeParameters(route.params, 'path'), ...describeParameters(route.query, 'query')],
    ...(route.body && { requestBody: { required: true, content: { 'application/json': { schema: schemaOf(route.body, 'input') } } } }),
    responses: {
      '2XX': { description: 'Done.', content: { [route.contentType ?? 'application/json']: { schema: schemaOf(route.answer, 'output') } } },
      default: { description: 'Refused.', content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } } },
    },
  }
}

function describeParameters(schema: z.ZodType | undefined, place: 'path' | 'query'): object[] {
  if (!schema) return []
  const { properties = {}, required = [] } = schemaOf(schema, 'input') as { properties?: Record<string, object>; required?: string[] }
  return Object.entries(properties).map(([name, shape]) => ({ name, in: place, required: place === 'path' || required.includes(name), schema: shape }))
}

function schemaOf(schema: z.ZodType, io: 'input' | 'output'): object {
  const { $schema: _dialect, ...shape } = z.toJSONSchema(schema, { io, unrepresentable: 'any' })
  return shape
}
