import type { APIRequestContext, APIResponse } from '@playwright/test'
import { expect } from '@playwright/test'
import type { z } from 'zod'
import { sessionSchema, type Session } from '../../../shared/contract/session.ts'

/** Who can sign in on the demo farm and beside it. */
export type Who = 'owner' | 'manager' | 'applicator' | 'certifier' | 'neighbour'

/** The demo password of the server under test. */
export const PASSWORD = process.env['E2E_PASSWORD'] ?? ''
/** Every unsafe request says where it comes from. */
export const OURS = { 'X-Requested-With': 'drenchleaf' }

export const emailOf = (who: Who): string => `${who}@demo.test`

/** Signs a request context in; a page of the same browser context is signed in with it. */
export async function signInTo(request: APIRequestContext, who: Who, password = PASSWORD): Promise<Session> {
  const answer = await request.post('/api/session', { headers: OURS, data: { email: emailOf(who), password } })
  expect(answer.status(), `signing in as ${who}`).toBe(200)
  return sessionSchema.parse(await answer.json())
}

/** The API as one person on one farm. Paths start after the farm's id. */
export interface FarmApi {
  farmId: string
  get: <Schema extends z.ZodType>(path: string, schema: Schema) => Promise<z.output<Schema>>
  post: <Schema extends z.ZodType>(path: string, body: unknown, schema: Schema) => Promise<z.output<Schema>>
  patch: <Schema extends z.ZodType>(path: string, body: unknown, schema: Schema) => Promise<z.output<Schema>>
}

/** Signs in and opens the first farm of that person. */
export async function openFarm(request: APIRequestContext, who: Who): Promise<FarmApi> {
  const { memberships } = await signInTo(request, who)
  return farmApi(request, memberships[0]?.farmId ?? '')
}

/** The API as whoever is signed in, on one farm. */
export function farmApi(request: APIRequestContext, farmId: string): FarmApi {
  return apiOf(request, farmId)
}

/** The API of a farm as whoever is signed in with this request context. */
export function apiOf(request: APIRequestContext, farmId: string): FarmApi {
  const path = (rest: string): string => `/api/farms/${farmId}${rest}`
  return {
    farmId,
    get: async (rest, schema) => schema.parse(await bodyOf(await request.get(path(rest)), rest)),
    patch: async (rest, body, schema) => schema.parse(await bodyOf(await request.patch(path(rest), { headers: OURS, data: body }), rest)),
    post: async (rest, body, schema) => schema.parse(await bodyOf(await request.post(path(rest), { headers: OURS, data: body }), rest)),
  }
}

async function bodyOf(answer: APIResponse, path: string): Promise<unknown> {
  expect(answer.ok(), `${path}: ${answer.status()} ${await answer.text()}`).toBe(true)
  return answer.json()
}
