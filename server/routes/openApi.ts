import type { z } from 'zod'
import { problemSchema } from '../../shared/contract/problem.ts'
import type { Route } from './defineRoute.ts'
import { describeAnswers, describeRefusals } from './openApiResponses.ts'
import { schemaOf } from './openApiSchema.ts'

interface Operation {
  summary: string
  operationId: string
  'x-roles': string | readonly string[]
  /** Empty where nobody need be signed in. */
  security: Record<string, string[]>[]
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

/** A page of another site cannot set it. */
const OWN_PAGES = { name: 'X-Requested-With', in: 'header', required: true, schema: { type: 'string', enum: ['drenchleaf'] } }

/** The API as OpenAPI 3.1, from the routes themselves. */
export function describeApi(routes: Route[], { version, sessionCookie }: { version: string; sessionCookie: string }): OpenApi {
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
    components: {
      schemas: { Problem: schemaOf(problemSchema, 'output') },
      parameters: { OwnPages: OWN_PAGES },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: sessionCookie } },
    },
  }
}

function describeRoute(route: Route): Operation {
  return {
    summary: route.summary,
    operationId: `${route.method}${route.path.replace(/[/:]+(\w)/g, (_match, letter: string) => letter.toUpperCase())}`,
    'x-roles': route.roles,
    security: route.roles === 'everybody' ? [] : [{ session: [] }],
    parameters: [
      ...describeParameters(route.params, 'path'),
      ...describeParameters(route.query, 'query'),
      ...(route.method === 'get' ? [] : [{ $ref: '#/components/parameters/OwnPages' }]),
    ],
    ...(route.body && { requestBody: { required: true, content: describeBody(route, schemaOf(route.body, 'input')) } }),
    responses: { ...describeAnswers(route), ...describeRefusals(route) },
  }
}

function describeBody({ upload }: Route, schema: { properties?: object; required?: string[] }): object {
  if (!upload) return { 'application/json': { schema } }
  const file = { type: 'string', contentMediaType: 'application/octet-stream' }
  const withFile = { ...schema, properties: { ...schema.properties, file }, required: [...(schema.required ?? []), 'file'] }
  return { 'multipart/form-data': { schema: withFile } }
}

function describeParameters(schema: z.ZodType | undefined, place: 'path' | 'query'): object[] {
  if (!schema) return []
  const { properties = {}, required = [] } = schemaOf(schema, 'input') as { properties?: Record<string, object>; required?: string[] }
  return Object.entries(properties).map(([name, shape]) => ({ name, in: place, required: place === 'path' || required.includes(name), schema: shape }))
}
