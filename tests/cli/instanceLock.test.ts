import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { takeInstanceLock } from '../../server/cli/lib/instanceLock.mjs'

const take = async (name: string, describeHolder?: Parameters<typeof takeInstanceLock>[1]): Promise<{ release: () => void }> => {
  const place = await takeInstanceLock(name, describeHolder)
  if (!('lock' in place)) throw new Error('taken')
  return place.lock
}

describe('takeInstanceLock', () => {
  it('is held once, and says by whom', async () => {
    const name = randomUUID()
    const lock = await take(name, () => ({ phase: 'running', url: 'http://127.0.0.1:4310' }))
    expect(await takeInstanceLock(name)).toEqual({ holder: { pid: process.pid, phase: 'running', url: 'http://127.0.0.1:4310' } })
    lock.release()
    ;(await take(name)).release()
  })

  it('waits for a holder that is stopping', async () => {
    const name = randomUUID()
    let asked = 0
    const lock = await take(name, () => {
      asked += 1
      if (asked === 3) lock.release()
      return { phase: 'stopping' }
    })
    const next = await take(name)
    expect(asked).toBe(3)
    next.release()
  })

  it('keeps names apart', async () => {
    const locks = await Promise.all([take(randomUUID()), take(randomUUID())])
    locks.forEach((lock) => lock.release())
    expect(locks).toHaveLength(2)
  })
})
