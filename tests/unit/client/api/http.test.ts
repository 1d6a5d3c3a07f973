import { afterEach, describe, expect, it, vi } from 'vitest'
import { z } from 'zod'
import { ApiError, NetworkError } from '../../../../src/api/errors.ts'
import { http, onSessionEnd } from '../../../../src/api/http.ts'

const thing = z.object({ name: z.string() })
const problem = (status: number, code = 'x') => ({ type: 'about:blank', title: code, status, code, detail: 'words', errors: [], requestId: 'r1' })

function answers(...list: { status: number; body?: unknown; headers?: Record<string, string> }[]) {
  const fetching = vi.fn<typeof fetch>()
  for (const { status, body, headers } of list) {
    fetching.mockResolvedValueOnce(new Response(body === undefined ? null : JSON.stringify(body), { status, headers: headers ?? {} }))
  }
  vi.stubGlobal('fetch', fetching)
  return fetching
}

afterEach(() => { vi.unstubAllGlobals(); onSessionEnd(() => Promise.resolve(false)) })

describe('http', () => {
  it('reads an answer with its schema and leaves empty query fields out', async () => {
    const fetching = answers({ status: 200, body: { name: 'A3', more: 1 } })
    expect(await http.get('/things', thing, { limit: 50, cursor: undefined })).toEqual({ name: 'A3' })
    expect(fetching.mock.calls[0]?.[0]).toBe('/api/things?limit=50')
  })

  it('marks unsafe requests as the register’s own, and reading ones not', async () => {
    const fetching = answers({ status: 201, body: { name: 'A3' } }, { status: 200, body: { name: 'A3' } })
    await http.post('/things', { name: 'A3' }, thing)
    await http.get('/things', thing)
    expect(fetching.mock.calls[0]?.[1]).toMatchObject({ method: 'POST', headers: { 'X-Requested-With': 'drenchleaf', 'Content-Type': 'application/json' }, body: '{"name":"A3"}' })
    expect(fetching.mock.calls[1]?.[1]?.headers).not.toHaveProperty('X-Requested-With')
  })

  it('asks for the words in the language of the page, whatever the browser’s own is', async () => {
    document.documentElement.lang = 'es'
    const fetching = answers({ status: 200, body: { name: 'A3' } })
    await http.get('/things', thing)
    expect(fetching.mock.calls[0]?.[1]).toMatchObject({ headers: { 'Accept-Language': 'es' } })
    document.documentElement.lang = ''
  })

  it('throws what the server refused, with how long to wait', async () => {
    answers({ status: 429, body: problem(429, 'too_many'), headers: { 'Retry-After': '840' } })
    const error = await http.get('/things', thing).catch((cause: unknown) => cause)
    expect(error).toBeInstanceOf(ApiError)
    expect(error).toMatchObject({ problem: { code: 'too_many' }, retryAfterS: 840 })
  })

  it.each([
    ['no connection', () => vi.stubGlobal('fetch', vi.fn().mockRejectedValue(new TypeError('failed')))],
    ['an answer that is not ours', () => answers({ status: 200, body: { other: true } })],
    ['a refusal that is not ours', () => answers({ status: 502, body: 'bad gateway' })],
  ])('takes %s for no answer', async (_what, arrange) => {
    arrange()
    await expect(http.get('/things', thing)).rejects.toBeInstanceOf(NetworkError)
  })

  it('asks for the password when the session has ended, then sends the same request again', async () => {
    const fetching = answers({ status: 401, body: problem(401) }, { status: 200, body: { name: 'A3' } })
    const ask = vi.fn(() => Promise.resolve(true))
    onSessionEnd(ask)
    expect(await http.post('/things', { name: 'A3' }, thing)).toEqual({ name: 'A3' })
    expect(ask).toHaveBeenCalledOnce()
    const [first, second] = fetching.mock.calls.map(([path, init]) => [path, init?.method, init?.body])
    expect(second).toEqual(first)
  })

  it('refuses when the person does not sign in again, and never asks for the session’s own address', async () => {
    const ask = vi.fn(() => Promise.resolve(false))
    onSessionEnd(ask)
    answers({ status: 401, body: problem(401) })
    await expect(http.get('/things', thing)).rejects.toBeInstanceOf(ApiError)
    answers({ status: 401, body: problem(401) })
    await expect(http.post('/session', {}, thing)).rejects.toBeInstanceOf(ApiError)
    expect(ask).toHaveBeenCalledOnce()
  })
})
