import { describe, expect, it } from 'vitest'
import type { Hold } from '../../../shared/contract/hold.ts'
import { holdSpent, holdsInForce } from '../../../shared/today/holdsInForce.ts'

const NOW = new Date('2026-06-16T12:00:00Z')
const BLOCKS = [{ id: 'b', code: 'V10' }, { id: 'a', code: 'V2' }, { id: 'c', code: 'S1' }]
const hold = (blockId: string, record: string, more: Partial<Hold>): Hold =>
  ({ blockId, recordId: record, number: `2026-${record}`, on: '2026-06-16', from: '2026-06-16T06:00:00Z', reEntryUntil: null, pickFrom: null, heldTo: '2026-06-20', ...more })
const inForce = (...holds: Hold[]) => holdsInForce(holds, NOW, '2026-06-16', BLOCKS)

describe('what holds blocks now', () => {
  it('keeps out before it keeps from picking, what ends first before what ends later', () => {
    const found = inForce(
      hold('a', '1', { reEntryUntil: '2026-06-16T18:00:00Z', pickFrom: '2026-06-20' }), hold('c', '2', { pickFrom: '2026-06-18' }),
      // Half past four in the afternoon of a zone two hours ahead.
      hold('b', '3', { reEntryUntil: '2026-06-16T16:30:00+02:00' }),
    )
    expect(found.map(({ kind, blocks, until }) => [kind, ...blocks.map(({ code }) => code), until])).toEqual([
      ['entry', 'V10', '2026-06-16T16:30:00+02:00'], ['entry', 'V2', '2026-06-16T18:00:00Z'], ['picking', 'S1', '2026-06-18'], ['picking', 'V2', '2026-06-20'],
    ])
  })

  it('names blocks together that the same records hold as long, in the order of the farm, and the others apart', () => {
    const alike = { pickFrom: '2026-06-20' }
    const found = inForce(hold('b', '1', alike), hold('a', '1', { ...alike, from: '2026-06-16T05:00:00Z' }), hold('c', '2', alike))
    expect(found.map(({ blocks, from }) => [blocks.map(({ code }) => code).join(' '), from])).toEqual([['S1', '2026-06-16T06:00:00Z'], ['V2 V10', '2026-06-16T05:00:00Z']])
  })

  it('takes of several holds on a block the last to end, with every record that says so', () => {
    const found = inForce(hold('a', '1', { pickFrom: '2026-06-18' }), hold('a', '2', { pickFrom: '2026-06-20' }), hold('a', '3', { pickFrom: '2026-06-20' }))
    expect(found.map(({ until, records }) => [until, ...records.map(({ number }) => number)])).toEqual([['2026-06-20', '2026-2', '2026-3']])
  })

  it('holds nothing that is over, and no block that has ended', () => {
    expect(inForce(hold('a', '1', { reEntryUntil: '2026-06-16T12:00:00Z', pickFrom: '2026-06-16' }), hold('gone', '2', { pickFrom: '2026-06-20' }))).toEqual([])
  })
})

describe('how much of a hold is over', () => {
  it.each([
    ['half', '2026-06-16T06:00:00Z', '2026-06-16T18:00:00Z', 0.5],
    ['nothing, for work that is still to end by its own clock', '2026-06-16T13:00:00Z', '2026-06-16T18:00:00Z', 0],
    ['all, once it has ended', '2026-06-16T06:00:00Z', '2026-06-16T11:00:00Z', 1],
    ['all, where it lasts no time', '2026-06-16T13:00:00Z', '2026-06-16T13:00:00Z', 1],
  ])('is %s', (_name, from, until, spent) => {
    expect(holdSpent(from, until, NOW)).toBe(spent)
  })
})
