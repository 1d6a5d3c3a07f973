import { Decimal } from 'decimal.js'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { csvLines } from '../../../server/services/register/csvLines.ts'
import { recordContentSchema, type RecordContentInput } from '../../../shared/contract/recordContent.ts'
import { presentComputed } from '../../../shared/records/presentComputed.ts'
import { registerRow } from '../../../shared/records/registerRow.ts'
import { sheetOf } from '../../../shared/records/sheetOf.ts'
import { roundParts } from '../../../shared/units/roundParts.ts'

const idOf = (place: number): string => `01890000-0000-7000-8000-${String(place).padStart(12, '0')}`
const add = (cells: readonly string[]): string => cells.reduce((sum, cell) => sum.plus(cell), new Decimal(0)).toFixed()

/** The CSV of a record over blocks of these square metres, with the figures that the register has of it. */
function csvOf(areas: readonly number[], over: Pick<RecordContentInput, 'method' | 'water' | 'components'>) {
  const blocks = areas.map((areaM2, place) => ({ id: idOf(place), code: `C${place}`, areaM2: String(areaM2), geometry: { type: 'Polygon' as const, coordinates: [] } }))
  const content = recordContentSchema.parse({ ...over, lines: blocks.map(({ id }) => ({ blockId: id })) })
  const sheet = sheetOf(content, { blocks, sprayer: null })
  const computed = presentComputed({ content, sheet, materials: [], zone: 'UTC' })
  const row = registerRow({ content, sheet, checks: [], blocks, materials: [], lots: [], doneBy: 'Ada Marsh', signed: null })
  return { row, lines: csvLines({ state: 'signed', content, computed, register_row: row, digest: null } as unknown as Parameters<typeof csvLines>[0], { language: 'en', zone: 'UTC' }) }
}
const rounded = (value: string | null): string => (value === null ? '0' : new Decimal(value).toDecimalPlaces(4, Decimal.ROUND_HALF_UP).toFixed())

describe('the lines of a record as CSV', () => {
  const areas = fc.array(fc.integer({ min: 1, max: 90_000_000 }).map((hundredths) => hundredths / 100), { minLength: 1, maxLength: 12 })
  const figure = fc.integer({ min: 1, max: 9_999_999 }).map((thousandths) => String(thousandths / 1000))

  it('have areas and shares of the mix that add up to those of the record', () => {
    fc.assert(fc.property(areas, figure, (each, water) => {
      const { row, lines } = csvOf(each, { method: 'foliar', water: { sizedFrom: 'water', value: water, unit: 'L' }, components: [{ materialId: idOf(90), basis: { kind: 'ratio', parts: '7' } }] })
      expect([add(lines.map(({ areaHa }) => areaHa)), add(lines.map(({ mixL }) => mixL))]).toEqual([rounded(row.areaHa), rounded(row.totalL)])
      expect(lines.every(({ massKg }) => massKg === '')).toBe(true)
    }), { numRuns: 150 })
  })

  it('have shares by mass that add up to what was spread', () => {
    fc.assert(fc.property(areas, figure, (each, value) => {
      const { row, lines } = csvOf(each, { method: 'solid', water: null, components: [{ materialId: idOf(90), basis: { kind: 'total', value, unit: 'kg' } }] })
      expect(add(lines.map(({ massKg }) => massKg))).toBe(rounded(row.totalKg))
    }), { numRuns: 60 })
  })

  it('share by area', () => {
    const { lines } = csvOf([10_000, 30_000], { method: 'foliar', water: { sizedFrom: 'water', value: '760', unit: 'L' }, components: [{ materialId: idOf(90), basis: { kind: 'ratio', parts: '19' } }] })
    expect(lines.map(({ block, areaHa, mixL, litresPerHa }) => [block, areaHa, mixL, litresPerHa])).toEqual([['C0', '1', '200', '200'], ['C1', '3', '600', '200']])
  })
})

it('parts are rounded so that they come to their rounded sum, each off by at most one in the last place', () => {
  expect(roundParts(['0.333', '0.333', '0.334'], 1)).toEqual(['0.3', '0.4', '0.3'])
  fc.assert(fc.property(fc.array(fc.integer({ min: 0, max: 1e9 }).map((n) => new Decimal(n).div(1e6).toFixed()), { minLength: 1, maxLength: 40 }), (parts) => {
    const written = roundParts(parts, 2)
    expect(add(written)).toBe(new Decimal(add(parts)).toDecimalPlaces(2, Decimal.ROUND_HALF_UP).toFixed())
    for (const [place, part] of parts.entries()) expect(new Decimal(written[place] ?? 'NaN').minus(part).abs().lte('0.01')).toBe(true)
  }))
})
