import type { z } from 'zod'
import { problemSchema } from '../../shared/contract/problem.ts'
import { ApiError, NetworkError } from './errors.ts'
import { sendForm } from './sendForm.ts'

/** An answer that takes longer is no answer: in the field a half signal is worse than none. */
const PATIENCE_MS = 30_000

type Query = Record<string, string | number | null | undefined>
type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'

/** Asks the person to sign in again; answers whether they did. */
type SignInAgain = () => Promise<boolean>
let signInAgain: SignInAgain | null = null

/** Sets what to do when the session has ended in the middle of work. */
export function onSessionEnd(ask: SignInAgain): void {
  signInAgain = ask
}

/**
 * Requests to the server's API. Paths start after `/api`; answers are read with their schema.
 * @throws {ApiError} when the server refused, {NetworkError} when no answer of ours came.
 */
export const http = {
  get: <Schema extends z.ZodType>(path: string, schema: Schema, query: Query = {}) =>
    request('GET', `${path}${queryText(query)}`, undefined, schema),
  post: <Schema extends z.ZodType>(path: string, body: unknown, schema: Schema) => request('POST', path, body, schema),
  put: <Schema extends z.ZodType>(path: string, body: unknown, schema: Schema) => request('PUT', path, body, schema),
  patch: <Schema extends z.ZodType>(path: string, body: unknown, schema: Schema) => request('PATCH', path, body, schema),
  /** Sends a form with a file in it; `onProgress` hears which share of it has gone. */
  upload: <Schema extends z.ZodType>(path: string, form: FormData, schema: Schema, onProgress: (share: number) => void) =>
    answered(path, schema, () => sendForm(path, form, onProgress)),
  del: <Schema extends z.ZodType>(path: string, schema: Schema) => request('DELETE', path, undefined, schema),
}

function request<Schema extends z.ZodType>(method: Method, path: string, body: unknown, schema: Schema): Promise<z.output<Schema>> {
  return answered(path, schema, () => send(method, path, body))
}

/** The answer of what is sent; sent once more where the session had ended and the person signed in again. */
async function answered<Schema extends z.ZodType>(path: string, schema: Schema, sendIt: () => Promise<Response>): Promise<z.output<Schema>> {
  let response = await sendIt()
  const sessionEnded = response.status === 401 && !path.startsWith('/session') && !path.startsWith('/shared-phone')
  if (sessionEnded && signInAgain !== null && (await signInAgain())) response = await sendIt()
  if (!response.ok) throw await refusalOf(response)
  const answer: unknown = response.status === 204 ? undefined : await jsonOf(response)
  const read = schema.safeParse(answer)
  if (!read.success) throw new NetworkError(read.error)
  return read.data
}

async function send(method: Method, path: string, body: unknown): Promise<Response> {
  // The page's language, which a person may have chosen against the browser's.
  const headers: Record<string, string> = { 'Accept': 'application/json', 'Accept-Language': document.documentElement.lang }
  if (method !== 'GET') headers['X-Requested-With'] = 'drenchleaf'
  if (body !== undefined) headers['Content-Type'] = 'application/json'
  const init: RequestInit = { method, headers, credentials: 'same-origin', signal: AbortSignal.timeout(PATIENCE_MS) }
  if (body !== undefined) init.body = JSON.stringify(body)
  try {
    return await fetch(`/api${path}`, init)
  } catch (cause) {
    throw new NetworkError(cause)
  }
}

async function refusalOf(response: Response): Promise<ApiError | NetworkError> {
  const read = problemSchema.safeParse(await jsonOf(response).catch(() => null))
  if (!read.success) return new NetworkError(response.status)
  return new ApiError(read.data, retryAfterOf(response))
}

/** Seconds of a Retry-After header; a date in it is not used by this server. */
function retryAfterOf(response: Response): number | null {
  const seconds = Number(response.headers.get('Retry-After') ?? Number.NaN)
  return Number.isFinite(seconds) && seconds >= 0 ? seconds : null
}

async function jsonOf(response: Response): Promise<unknown> {
  try {
    return await response.json()
  } catch (cause) {
    throw new NetworkError(cause)
  }
}

function queryText(query: Query): string {
  const pairs = Object.entries(query).filter(([, value]) => value !== null && value !== undefined)
  return pairs.length === 0 ? '' : `?${new URLSearchParams(pairs.map(([key, value]) => [key, String(value)]))}`
}
