import { describe, expect, it } from 'vitest'
import { createLifecycle } from '../../server/cli/lib/lifecycle.mjs'

describe('createLifecycle', () => {
  it('stops what was started, last one first, and each once', async () => {
    const lifecycle = createLifecycle()
    const stopped: string[] = []
    lifecycle.add(() => void stopped.push('database'))
    lifecycle.add(async () => void stopped.push(await Promise.resolve('server')))
    await Promise.all([lifecycle.stop(), lifecycle.stop()])
    expect(stopped).toEqual(['server', 'database'])
  })

  it('forgets what ended by itself', async () => {
    const lifecycle = createLifecycle()
    const stopped: string[] = []
    const forget = lifecycle.add(() => void stopped.push('command'))
    forget()
    await lifecycle.stop()
    expect(stopped).toEqual([])
  })

  it('lets nothing start any more once it stops', async () => {
    const lifecycle = createLifecycle()
    expect(() => lifecycle.assertGoing()).not.toThrow()
    await lifecycle.stop()
    expect(lifecycle.stopping).toBe(true)
    expect(() => lifecycle.assertGoing()).toThrow()
  })
})
