import { Decimal } from 'decimal.js'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { recordSheet } from '../../../shared/mix/recordSheet.ts'
import type { RecordSheet, SheetBasis, SheetInput } from '../../../shared/mix/sheetTypes.ts'
import { convertQuantity } from '../../../shared/units/convertQuantity.ts'

const RUNS = { seed: 20_260_616, numRuns: 400 }
const decimal = (min: number, max: number) => fc.integer({ min, max }).map((count) => new Decimal(count).div(1_000).toFixed())
const basis: fc.Arbitrary<SheetBasis> = fc.oneof(
  fc.record({ kind: fc.constant('ratio' as const), parts: decimal(7_000, 2_000_000), reading: fc.constantFrom('to' as const, 'in' as const) }),
  fc.record({ kind: fc.constant('perEach' as const), value: decimal(1, 20), unit: fc.constantFrom('mL', 'flozUS', 'g', 'oz'), each: fc.constantFrom('plant' as const, 'rowM' as const) }),
  fc.record({ kind: fc.constant('total' as const), value: decimal(1, 2_000), unit: fc.constantFrom('L', 'kg', 'galUS') }),
  fc.record({ kind: fc.constant('perArea' as const), value: decimal(1, 5_000), unit: fc.constantFrom('L/ha', 'mL/ha', 'flozUS/acre', 'ptUS/acre', 'kg/ha', 'lb/acre') }),
  fc.record({ kind: fc.constant('perTank' as const), value: decimal(1, 2_000), unit: fc.constantFrom('L', 'mL', 'flozUS', 'tspUS', 'kg', 'oz') }),
)
type SizedByVolume = { sizedFrom: 'water' | 'sprayRate'; value: string; unit: string }
const water: fc.Arbitrary<SizedByVolume> = fc.oneof(
  fc.record({ sizedFrom: fc.constant('water' as const), value: decimal(10_000, 5_000_000), unit: fc.constantFrom('L', 'galUS', 'galImp') }),
  fc.record({ sizedFrom: fc.constant('sprayRate' as const), value: decimal(200_000, 1_000_000), unit: fc.constantFrom('L/ha', 'galUS/acre') }),
)
const counts = fc.record({ plant: fc.integer({ min: 1, max: 400 }).map(String), rowM: decimal(1_000, 300_000) })
const sheetInput: fc.Arbitrary<SheetInput & { water: SizedByVolume }> = fc.record({
  lines: fc.array(fc.integer({ min: 100_000, max: 900_000_000 }).chain((count) => counts.map((counted) => ({ areaM2: count / 1_000, counts: counted }))), { minLength: 1, maxLength: 8 }),
  water,
  tankL: decimal(100_000, 3_000_000),
  components: fc.array(basis.map((one) => ({ basis: one })), { maxLength: 6 }),
})

const sum = (values: readonly (string | null)[]): Decimal => values.reduce((total, value) => total.plus(value ?? 0), new Decimal(0))
const off = (value: Decimal.Value, expected: Decimal.Value): number => new Decimal(value).div(expected).minus(1).abs().toNumber()

function known(input: SheetInput): RecordSheet & { totalL: number; waterL: number; loads: NonNullable<RecordSheet['loads']> } {
  const sheet = recordSheet(input)
  const { totalL, waterL, loads } = sheet
  fc.pre(!sheet.findings.some(({ code }) => code === 'sheet.too_strong'))
  if (totalL === null || waterL === null || loads === null) throw new Error(`not known: ${JSON.stringify(sheet.findings)}`)
  return { ...sheet, totalL, waterL, loads }
}

describe('identities of the sheet', () => {
  it('water and liquid components are the total', () => {
    fc.assert(fc.property(sheetInput, (input) => {
      const sheet = known(input)
      expect(off(sum(sheet.components.map(({ inL }) => inL)).plus(sheet.waterL), sheet.totalL)).toBeLessThan(1e-13)
    }), RUNS)
  })

  it('shares of the lines add up to the total, to the last digit', () => {
    fc.assert(fc.property(sheetInput, (input) => {
      const sheet = known(input)
      expect(sum(sheet.lines.map(({ shareL }) => shareL)).eq(sheet.totalL)).toBe(true)
      for (const { shareL } of sheet.lines) expect(Number(shareL)).toBeGreaterThanOrEqual(0)
    }), RUNS)
  })

  it('full loads and the last one are the total, to the last digit', () => {
    fc.assert(fc.property(sheetInput, (input) => {
      const { loads, totalL } = known(input)
      const poured = new Decimal(loads.tankL).times(loads.full).plus(loads.lastL)
      expect(poured.minus(totalL).abs().toNumber()).toBeLessThanOrEqual(loads.lastL === 0 ? 1e-9 : 0)
      expect(loads.lastL).toBeLessThan(loads.tankL)
      expect(loads.count).toBe(loads.full + (loads.lastL > 0 ? 1 : 0))
    }), RUNS)
  })

  it('what goes into the loads is each amount', () => {
    fc.assert(fc.property(sheetInput, (input) => {
      const { components, loads, water: perLoad, waterL } = known(input)
      const poured = (full: string | null, last: string | null): Decimal => new Decimal(full ?? 0).times(loads.full).plus(last ?? 0)
      for (const { amount, perFullLoad, perLastLoad } of components) {
        expect(off(poured(perFullLoad, perLastLoad), amount?.value ?? 0)).toBeLessThan(1e-11)
      }
      expect(off(poured(perLoad.perFullLoad, perLoad.perLastLoad), waterL)).toBeLessThan(1e-11)
    }), RUNS)
  })

  it('rate over area is the total', () => {
    fc.assert(fc.property(sheetInput, (input) => {
      const sheet = known(input)
      expect(off(new Decimal(sheet.sprayLPerHa ?? 0).times(sheet.areaHa), sheet.totalL)).toBeLessThan(1e-13)
    }), RUNS)
  })

  it('does not change with the unit the water is typed in', () => {
    fc.assert(fc.property(sheetInput, (input) => {
      const to = input.water.sizedFrom === 'water' ? 'flozImp' : 'mL/ha'
      const typed = input.water as { value: string; unit: 'L' }
      const other = recordSheet({ ...input, water: { sizedFrom: input.water.sizedFrom, value: convertQuantity(typed, to as 'L'), unit: to } })
      expect(off(other.totalL ?? 0, known(input).totalL)).toBeLessThan(1e-13)
    }), RUNS)
  })

  it('a mix sized from one jar takes just that jar', () => {
    fc.assert(fc.property(sheetInput, fc.constantFrom('ratio' as const, 'perTank' as const), (input, kind) => {
      const component = input.components.findIndex(({ basis }) => basis.kind === kind && !['kg', 'oz'].includes('unit' in basis ? basis.unit : 'L'))
      fc.pre(component >= 0)
      const sheet = known(input)
      const jar = sheet.components[component]?.inL ?? '0'
      const other = recordSheet({ ...input, water: { sizedFrom: 'jar', component, value: jar, unit: 'L' } })
      fc.pre(/^\d+(\.\d{1,20})?$/.test(jar))
      expect(off(other.components[component]?.inL ?? 0, jar)).toBeLessThan(1e-13)
      expect(off(other.totalL ?? 0, sheet.totalL)).toBeLessThan(1e-12)
    }), RUNS)
  })

  it('what is weighed adds up, and so do its shares', () => {
    fc.assert(fc.property(sheetInput, (input) => {
      const sheet = known(input)
      const weighed = sheet.components.filter(({ inKg }) => inKg !== null)
      fc.pre(weighed.length > 0)
      expect(off(sum(weighed.map(({ inKg }) => inKg)), sheet.totalKg ?? 0)).toBeLessThan(1e-13)
      expect(sum(sheet.lines.map(({ shareKg }) => shareKg)).toNumber()).toBe(sheet.totalKg)
    }), RUNS)
  })

  it('a spray sized from water is the same sized from the rate it came to', () => {
    fc.assert(fc.property(sheetInput, (input) => {
      const sheet = known(input)
      const value = new Decimal(sheet.sprayLPerHa ?? 0).toFixed()
      const other = recordSheet({ ...input, water: { sizedFrom: 'sprayRate', value, unit: 'L/ha' } })
      expect(off(other.totalL ?? 0, sheet.totalL)).toBeLessThan(1e-13)
      // Where little water is left of much product, its error is the total's.
      expect(Math.abs((other.waterL ?? 0) - sheet.waterL)).toBeLessThan(sheet.totalL * 1e-12)
    }), RUNS)
  })

  it('never throws on a draft, whatever is typed', () => {
    const typed = fc.oneof(fc.string(), fc.constantFrom('', '0', '1', '1e9', '-1', '99999999999999999999', '0.0000001'))
    const anyBasis = fc.oneof(
      fc.record({ kind: fc.constant('ratio' as const), parts: typed }),
      fc.record({ kind: fc.constantFrom('perArea' as const, 'perTank' as const), value: typed, unit: typed }),
    )
    fc.assert(fc.property(fc.array(fc.double()), typed, typed, fc.array(anyBasis), (areas, value, unit, bases) => {
      const input = { lines: areas.map((areaM2) => ({ areaM2 })), water: { sizedFrom: 'water' as const, value, unit }, tankL: value, components: bases.map((one) => ({ basis: one })) }
      expect(recordSheet(input).components).toHaveLength(bases.length)
    }), RUNS)
  })
})
