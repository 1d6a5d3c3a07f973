import { describe, expect, it } from 'vitest'
import { ApiError, NetworkError } from '../../../../src/api/errors.ts'
import { fieldErrors } from '../../../../src/composables/form/fieldErrors.ts'
import { problemWords } from '../../../../src/composables/app/problemWords.ts'
import { useTask } from '../../../../src/composables/form/useTask.ts'

const refusal = (status: number, retryAfterS: number | null = null) =>
  new ApiError({ type: 'about:blank', title: 'x', status, code: 'x', detail: 'Use another code.', errors: [{ path: 'code', code: 'code.taken', message: 'K1 is already used.' }], requestId: 'r' }, retryAfterS)

describe('problemWords', () => {
  it('says when to try again after too many tries', () => {
    expect(problemWords('en', refusal(429, 840))).toBe('Too many tries. Try again in 14 minutes.')
    expect(problemWords('en', refusal(429, 20))).toBe('Too many tries. Try again in a minute.')
    expect(problemWords('es', refusal(429))).toBe('Demasiados intentos. Espere un poco e inténtelo de nuevo.')
  })
  it('says that what was typed is kept when no answer came', () => {
    expect(problemWords('en', new NetworkError())).toBe('No answer from the server. What you typed is still here.')
  })
  it('gives the server’s own words for a refusal and none of a program’s for the rest', () => {
    expect(problemWords('en', refusal(422))).toBe('Use another code.')
    expect(problemWords('en', new TypeError('x is undefined'))).not.toContain('undefined')
  })
})

describe('fieldErrors', () => {
  it('stands at its field', () => { expect(fieldErrors(refusal(422))).toEqual({ code: 'K1 is already used.' }) })
  it('is empty for what is no refusal', () => { expect(fieldErrors(new NetworkError())).toEqual({}) })
})

describe('useTask', () => {
  it('lets an overtaken run write nothing', async () => {
    const waiting: ((answer: string) => void)[] = []
    const task = useTask(() => new Promise<string>((resolve) => { waiting.push(resolve) }))
    const [first, second] = [task.run(), task.run()]
    waiting[1]?.('second')
    await second
    waiting[0]?.('first')
    await first
    expect(task.result.value).toBe('second')
    expect(task.running.value).toBe(false)
  })

  it('forgets a lack of signal once the signal is back, and nothing else', async () => {
    const failing = [new NetworkError(), refusal(422)].map((error) => useTask(() => Promise.reject(error)))
    for (const task of failing) await task.run()
    window.dispatchEvent(new Event('online'))
    expect(failing.map(({ error }) => error.value === null)).toEqual([true, false])
  })

  it('keeps its error and never throws', async () => {
    const task = useTask(() => Promise.reject(new NetworkError()))
    expect(await task.run()).toBeUndefined()
    expect(task.error.value).toBeInstanceOf(NetworkError)
  })
})
