import { describe, expect, it } from 'vitest'
import { sortLots, sortMaterials } from '../../../../shared/balance/sortInputs.ts'
import { buildLot, buildMaterial } from './buildInputs.ts'

describe('sortLots', () => {
  it('puts past first, then soon, nearly empty, later, undated, and empty last', () => {
    const lots = [
      buildLot({ code: 'undated', expiresOn: null }),
      buildLot({ code: 'empty', expiresOn: '2026-01-01', left: { value: '0', unit: 'L' } }),
      buildLot({ code: 'later', expiresOn: '2027-01-01' }),
      buildLot({ code: 'low', expiresOn: '2027-01-01', left: { value: '1', unit: 'L' } }),
      buildLot({ code: 'soon', expiresOn: '2026-06-20' }),
      buildLot({ code: 'past', expiresOn: '2026-06-10' }),
    ]
    expect(sortLots(lots, '2026-06-16').map(({ code }) => code)).toEqual(['past', 'soon', 'low', 'later', 'undated', 'empty'])
  })

  it('orders equals by last day, then by code as people count', () => {
    const lots = [buildLot({ code: 'Batch 10' }), buildLot({ code: 'Batch 9' }), buildLot({ code: 'Batch 11', expiresOn: '2026-06-20' })]
    expect(sortLots(lots, '2026-06-16').map(({ code }) => code)).toEqual(['Batch 11', 'Batch 9', 'Batch 10'])
  })
})

describe('sortMaterials', () => {
  it('puts prohibited first, then what is not known or rests on nothing, restricted, allowed', () => {
    const materials = [
      buildMaterial({ name: 'b allowed' }),
      buildMaterial({ name: 'a allowed' }),
      buildMaterial({ name: 'restricted', organicStatus: 'restricted' }),
      buildMaterial({ name: 'bare', statusBasis: null }),
      buildMaterial({ name: 'unknown', organicStatus: 'unknown' }),
      buildMaterial({ name: 'prohibited', organicStatus: 'prohibited' }),
    ]
    expect(sortMaterials(materials).map(({ name }) => name)).toEqual(['prohibited', 'bare', 'unknown', 'restricted', 'a allowed', 'b allowed'])
  })
})
