import { describe, expect, it } from 'vitest'
import { lotStanding } from '../../../../shared/balance/lotStanding.ts'
import { buildLot } from './buildInputs.ts'

const today = '2026-06-16'

describe('lotStanding', () => {
  it.each([
    { expiresOn: '2026-06-15', useBy: 'past', days: -1 },
    { expiresOn: '2026-06-16', useBy: 'soon', days: 0 },
    { expiresOn: '2026-06-30', useBy: 'soon', days: 14 },
    { expiresOn: '2026-07-01', useBy: 'later', days: 15 },
    { expiresOn: null, useBy: 'none', days: null },
  ])('last day $expiresOn is $useBy', ({ expiresOn, useBy, days }) => {
    expect(lotStanding(buildLot({ expiresOn }), today)).toMatchObject({ useBy, days })
  })

  it('counts civil days over a leap day and a clock change', () => {
    expect(lotStanding(buildLot({ expiresOn: '2028-03-01' }), '2028-02-28').days).toBe(2)
    expect(lotStanding(buildLot({ expiresOn: '2026-03-09' }), '2026-03-07').days).toBe(2)
  })

  it.each([
    { left: '0', stock: 'empty', share: 0 },
    { left: '6', stock: 'low', share: 0.1 },
    { left: '6.1', stock: 'some', share: 6.1 / 60 },
    { left: '75', stock: 'some', share: 1 },
  ])('$left L of 60 is $stock', ({ left, stock, share }) => {
    const standing = lotStanding(buildLot({ left: { value: left, unit: 'L' } }), today)
    expect(standing.stock).toBe(stock)
    expect(standing.leftShare).toBeCloseTo(share, 12)
  })

  it('compares what is left in another unit: 500 mL of 5 L are low', () => {
    const standing = lotStanding(buildLot({ quantity: { value: '5', unit: 'L' }, left: { value: '500', unit: 'mL' } }), today)
    expect(standing).toMatchObject({ stock: 'low', leftShare: 0.1 })
  })
})
