import { describe, expect, it } from 'vitest'
import { sumRegisterRows } from '../../../../shared/register/sumRegisterRows.ts'
import { buildRow } from './buildRow.ts'

describe('sumRegisterRows', () => {
  it('adds signed rows exactly, where floats would drift', () => {
    const sums = sumRegisterRows([
      buildRow({ areaHa: '0.1', totalL: '0.1' }),
      buildRow({ areaHa: '0.2', totalL: '0.2', totalKg: '12.5' }),
    ])
    expect(sums).toMatchObject({ signed: 2, areaHa: '0.3', totalL: '0.3', totalKg: '12.5' })
  })

  it('counts withdrawn and unsigned rows in no total', () => {
    const sums = sumRegisterRows([
      buildRow({ areaHa: '1', totalL: '400', totalKg: '0' }),
      buildRow({ state: 'withdrawn', areaHa: '5', totalL: '9000', lateHours: 40 }),
      buildRow({ state: 'started', areaHa: '7', totalL: '7000' }),
    ])
    expect(sums).toEqual({ signed: 1, withdrawn: 1, unsigned: 1, areaHa: '1', totalL: '400', totalKg: '0', late: 0 })
  })

  it('counts late entries and takes a row without litres as nothing to add', () => {
    const sums = sumRegisterRows([buildRow({ lateHours: 31, totalL: null }), buildRow({ totalL: '12.5' })])
    expect(sums).toMatchObject({ late: 1, totalL: '12.5' })
  })

  it('is zero for no rows', () => {
    expect(sumRegisterRows([])).toEqual({ signed: 0, withdrawn: 0, unsigned: 0, areaHa: '0', totalL: '0', totalKg: '0', late: 0 })
  })
})
