import { describe, expect, it } from 'vitest'
import { together } from '../../../server/database/together.ts'

/** A promise, and the two ways to end it. */
const opened = () => {
  let [resolve, reject] = [(_value: number): void => undefined, (_fault: Error): void => undefined]
  const promise = new Promise<number>((done, fail) => { [resolve, reject] = [done, fail] })
  return { promise, resolve, reject }
}

describe('statements sent together', () => {
  it('answers each in its place', async () => {
    const [first, second] = [opened(), opened()]
    const all = together([first.promise, second.promise, 'there already'])
    second.resolve(2)
    first.resolve(1)
    expect(await all).toEqual([1, 2, 'there already'])
  })

  it('throws what failed first, and not before the last has ended', async () => {
    const [first, second, third] = [opened(), opened(), opened()]
    const heard: string[] = []
    const all = together([first.promise, second.promise, third.promise]).catch((fault: unknown) => { heard.push(String(fault)) })
    second.reject(new Error('no longer your farm'))
    first.reject(new Error('the transaction is over'))
    await Promise.resolve()
    await new Promise(setImmediate)
    expect(heard).toEqual([])
    third.resolve(3)
    await all
    expect(heard).toEqual(['Error: no longer your farm'])
  })
})
