import { describe, expect, it } from 'vitest'
import { holdsNow } from '../../../shared/season/holdsNow.ts'
import { lastHeldDay } from '../../../shared/season/lastHeldDay.ts'

describe('the last day of a hold', () => {
  it.each([
    ['neither', { reEntryUntil: null, pickFrom: null }, null],
    ['the day before picking', { reEntryUntil: null, pickFrom: '2026-03-01' }, '2026-02-28'],
    // 04:10 UTC is ten past eleven of the evening before in a zone five hours behind.
    ['the day on the farm on which one may go in again', { reEntryUntil: '2026-06-17T04:10:00Z', pickFrom: null }, '2026-06-16'],
    ['the later of both', { reEntryUntil: '2026-06-20T12:00:00Z', pickFrom: '2026-06-17' }, '2026-06-20'],
  ])('is %s', (_name, holds, day) => {
    expect(lastHeldDay(holds, 'America/Cancun')).toBe(day)
  })
})

describe('what is held now', () => {
  const now = new Date('2026-06-16T12:00:00Z')
  const hold = (blockId: string, reEntryUntil: string | null, pickFrom: string | null) => ({ blockId, reEntryUntil, pickFrom })

  it('is the latest of each kind by block, whatever the offsets it is written in', () => {
    const held = holdsNow([
      hold('a', '2026-06-16T15:00:00+02:00', null), hold('a', '2026-06-16T12:30:00Z', '2026-06-20'), hold('a', null, '2026-06-18'), hold('b', '2026-06-16T12:00:00Z', null),
    ], now, '2026-06-16')
    expect([...held]).toEqual([['a', { reEntryUntil: '2026-06-16T15:00:00+02:00', pickFrom: '2026-06-20' }]])
  })
  it('ends with its instant, and on the first day for picking', () => {
    expect(holdsNow([hold('a', '2026-06-16T12:00:00Z', '2026-06-16')], now, '2026-06-16').size).toBe(0)
    expect(holdsNow([hold('a', '2026-06-16T12:00:01Z', null), hold('b', null, '2026-06-17')], now, '2026-06-16').size).toBe(2)
  })
})
