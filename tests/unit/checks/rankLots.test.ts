import { describe, expect, it } from 'vitest'
import { rankLots } from '../../../shared/checks/rankLots.ts'
import type { Lot } from '../../../shared/contract/input.ts'

const lot = (over: Partial<Lot>): Lot => ({
  id: over.code ?? 'l', materialId: 'm1', code: 'L', origin: 'made', source: null, receivedOn: '2026-05-01', quantity: { value: '100', unit: 'L' }, expiresOn: null,
  materialName: 'Nettle ferment', left: { value: '50', unit: 'L' }, revision: 1, createdAt: '2026-05-01T00:00:00Z', ...over,
})
const ranked = (lots: Lot[], need: { value: string; unit: 'L' | 'kg' } | null = { value: '20', unit: 'L' }) =>
  rankLots(lots, { need, usedOn: '2026-06-16' }).map(({ lot: { code }, fitness }) => `${code} ${fitness}`)

describe('lots as a person would take them', () => {
  it('puts what runs out of time first, then what came first', () => {
    expect(ranked([
      lot({ code: 'no-date-new', receivedOn: '2026-06-01' }), lot({ code: 'late', expiresOn: '2026-08-01' }),
      lot({ code: 'soon', expiresOn: '2026-06-20' }), lot({ code: 'no-date-old' }),
    ])).toEqual(['soon fit', 'late fit', 'no-date-old fit', 'no-date-new fit'])
  })

  it('keeps what does not fit, with its reason, after what does', () => {
    expect(ranked([
      lot({ code: 'empty', left: { value: '0', unit: 'L' } }), lot({ code: 'past', expiresOn: '2026-06-15' }),
      lot({ code: 'short', left: { value: '19.9', unit: 'L' } }), lot({ code: 'weighed', quantity: { value: '5', unit: 'kg' }, left: { value: '5', unit: 'kg' } }),
      lot({ code: 'fit', expiresOn: '2026-06-16' }),
    ])).toEqual(['fit fit', 'weighed otherMeasure', 'short short', 'past past', 'empty empty'])
  })

  it('asks for nothing while the mix does not say what it takes', () => {
    expect(ranked([lot({ code: 'short', left: { value: '1', unit: 'L' } })], null)).toEqual(['short fit'])
  })

  it('says what is left of what came in, in whatever unit', () => {
    const [one] = rankLots([lot({ quantity: { value: '1', unit: 'L' }, left: { value: '250', unit: 'mL' } })], { need: null, usedOn: '2026-06-16' })
    expect(one?.leftShare).toBe(0.25)
  })

  it('never draws more than a whole bar, after a count that found more', () => {
    const [one] = rankLots([lot({ left: { value: '120', unit: 'L' } })], { need: null, usedOn: '2026-06-16' })
    expect(one?.leftShare).toBe(1)
  })
})
