import { describe, expect, it } from 'vitest'
import { recordSheet } from '../../../shared/mix/recordSheet.ts'
import type { SheetBasis, SheetInput } from '../../../shared/mix/sheetTypes.ts'

const buildInput = (overrides: Partial<SheetInput> = {}): SheetInput => ({
  lines: [{ areaM2: 20_000 }],
  water: { sizedFrom: 'water', value: '600', unit: 'L' },
  tankL: '200',
  components: [],
  ...overrides,
})
const component = (basis: SheetBasis) => ({ basis })
const codes = (input: SheetInput): string[] => recordSheet(input).findings.map(({ code }) => code)

describe('recordSheet from water', () => {
  it('adds a ratio to its water: 1 part to 30 parts of 600 L is 20 L', () => {
    const sheet = recordSheet(buildInput({ components: [component({ kind: 'ratio', parts: '30' })] }))
    expect(sheet).toMatchObject({ areaHa: 2, waterL: 600, totalL: 620, sprayLPerHa: 310, findings: [] })
    expect(sheet.loads).toEqual({ full: 3, count: 4, tankL: 200, lastL: 20, lastAreaHa: 0.0645161290322581, fullMinutes: null, lastMinutes: null })
    expect(sheet.components[0]).toEqual({
      amount: { value: '20', unit: 'L' }, inL: '20', inKg: null, perHa: '10',
      perFullLoad: '6.45161290322581', perLastLoad: '0.645161290322581',
      measure: { id: 'sheet.measure.ratio', params: { parts: 30, waterL: 600 } },
    })
    expect(sheet.water).toEqual({ perHa: '300', perFullLoad: '193.548387096774', perLastLoad: '19.3548387096774' })
  })

  it('adds a rate over the area, in the unit of its amount', () => {
    const { components, totalL } = recordSheet(buildInput({
      lines: [{ areaM2: 4046.8564224 * 2 }],
      components: [component({ kind: 'perArea', value: '30', unit: 'flozUS/acre' }), component({ kind: 'perArea', value: '5', unit: 'kg/ha' })],
    }))
    expect(components[0]?.amount).toEqual({ value: '60', unit: 'flozUS' })
    expect(components[0]?.inL).toBe('1.77441177375')
    expect(components[1]?.inKg).toBe('4.0468564224')
    expect(totalL).toBe(601.77441177375)
  })

  it('solves for what a full tank holds: 5 L in each 200 L', () => {
    const sheet = recordSheet(buildInput({ components: [component({ kind: 'perTank', value: '5', unit: 'L' })] }))
    expect(sheet.totalL).toBe(615.384615384615)
    expect(sheet.components[0]).toMatchObject({ amount: { value: '15.3846153846154', unit: 'L' }, perFullLoad: '5', perLastLoad: '0.384615384615375' })
  })

  it('adds no volume for a mass', () => {
    const sheet = recordSheet(buildInput({ components: [component({ kind: 'perTank', value: '2', unit: 'lb' })] }))
    expect(sheet.totalL).toBe(600)
    expect(sheet.components[0]).toMatchObject({ amount: { value: '6', unit: 'lb' }, inL: null, perFullLoad: '2', perLastLoad: null })
    expect(sheet.loads).toMatchObject({ full: 3, count: 3, lastL: 0, lastAreaHa: 0 })
  })

  it('has no full load where the tank is larger than the total', () => {
    const sheet = recordSheet(buildInput({ tankL: '1000', components: [component({ kind: 'ratio', parts: '30' })] }))
    expect(sheet.loads).toMatchObject({ full: 0, count: 1, lastL: 620, lastAreaHa: 2 })
    expect(sheet.components[0]).toMatchObject({ perFullLoad: null, perLastLoad: '20' })
  })
})

describe('recordSheet from a spray rate', () => {
  it('takes the water from what is left: "Agrochemical and Pesticide Safety", Example 4: 3.5 ac, 15 gal/ac, 3 lb/ac', () => {
    const sheet = recordSheet(buildInput({
      lines: [{ areaM2: 4046.8564224 * 3.5 }],
      water: { sizedFrom: 'sprayRate', value: '15', unit: 'galUS/acre' },
      components: [component({ kind: 'perArea', value: '3', unit: 'lb/acre' })],
    }))
    expect((sheet.totalL ?? 0) / 3.785411784).toBeCloseTo(52.5, 12)
    expect(sheet.components[0]?.amount?.unit).toBe('lb')
    expect(Number(sheet.components[0]?.amount?.value)).toBeCloseTo(10.5, 12)
  })

  it('sizes ratio, rate and tank together', () => {
    const sheet = recordSheet(buildInput({
      water: { sizedFrom: 'sprayRate', value: '310', unit: 'L/ha' },
      components: [component({ kind: 'ratio', parts: '30' }), component({ kind: 'perArea', value: '1', unit: 'L/ha' }), component({ kind: 'perTank', value: '2', unit: 'L' })],
    }))
    // T = 620, A = 2, pT = 6.2, so W = 611.8 × 30/31.
    expect(sheet).toMatchObject({ totalL: 620, waterL: 592.064516129032 })
    expect(sheet.components.map(({ inL }) => inL)).toEqual(['19.7354838709677', '2', '6.2'])
  })

  it('says that the components alone are more than the spray', () => {
    const tooStrong = buildInput({
      water: { sizedFrom: 'sprayRate', value: '10', unit: 'L/ha' },
      components: [component({ kind: 'perArea', value: '11', unit: 'L/ha' })],
    })
    expect(recordSheet(tooStrong)).toMatchObject({ totalL: 20, waterL: null, findings: [{ code: 'sheet.too_strong' }] })
    expect(codes(buildInput({ components: [component({ kind: 'perTank', value: '200', unit: 'L' })] }))).toEqual(['sheet.too_strong'])
  })
})

describe('recordSheet of a half-typed draft', () => {
  it('knows nothing of an empty one, and says what it needs', () => {
    expect(recordSheet({ lines: [], water: null, tankL: null, components: [] })).toEqual({
      areaM2: 0, areaHa: 0, counts: {}, waterL: null, totalL: null, totalKg: null, sprayLPerHa: null, kgPerHa: null, sprayPerEach: null, loads: null, components: [],
      water: { perHa: null, perFullLoad: null, perLastLoad: null }, appliedL: null, appliedKg: null, lines: [],
      findings: [{ code: 'sheet.no_area', params: {} }, { code: 'sheet.no_water', params: {}, path: 'water' }],
    })
  })

  it('keeps what can be known: without an area the water and a ratio are', () => {
    const sheet = recordSheet(buildInput({ lines: [], components: [component({ kind: 'ratio', parts: '30' })] }))
    expect(sheet).toMatchObject({ waterL: 600, totalL: 620, sprayLPerHa: null, loads: null })
    expect(sheet.components[0]?.amount).toEqual({ value: '20', unit: 'L' })
  })

  it('gives no total that leaves a line without its area', () => {
    const sheet = recordSheet(buildInput({
      lines: [{ areaM2: 20_000 }, { areaM2: Number.NaN }], water: { sizedFrom: 'sprayRate', value: '310', unit: 'L/ha' },
    }))
    expect(sheet).toMatchObject({ areaM2: 20_000, totalL: null, findings: [{ code: 'sheet.no_area', path: 'lines.1' }] })
  })

  it.each([
    { what: 'a tank for what goes in each', overrides: { tankL: null, components: [component({ kind: 'perTank', value: '5', unit: 'L' })] }, code: 'sheet.tank_needed' },
    { what: 'a figure half typed', overrides: { components: [component({ kind: 'ratio', parts: '' })] }, code: 'sheet.component_incomplete' },
    { what: 'a figure of nothing', overrides: { components: [component({ kind: 'perArea', value: '0', unit: 'L/ha' })] }, code: 'sheet.component_incomplete' },
    { what: 'water half typed', overrides: { water: { sizedFrom: 'water' as const, value: '1e', unit: 'L' } }, code: 'sheet.no_water' },
    { what: 'a rate in no unit of a rate', overrides: { components: [component({ kind: 'perArea', value: '5', unit: 'L' })] }, code: 'unit.not_allowed' },
    { what: 'an area in a tank', overrides: { components: [component({ kind: 'perTank', value: '5', unit: 'ha' })] }, code: 'unit.not_allowed' },
    { what: 'water by weight', overrides: { water: { sizedFrom: 'water' as const, value: '5', unit: 'kg' } }, code: 'unit.not_allowed' },
    { what: 'a unit that objects have', overrides: { components: [component({ kind: 'perTank', value: '5', unit: 'toString' })] }, code: 'unit.not_allowed' },
  ])('asks for $what', ({ overrides, code }) => {
    const sheet = recordSheet(buildInput(overrides))
    expect(sheet.findings.map((finding) => finding.code)).toEqual([code])
    expect(sheet.totalL).toBeNull()
  })

  it('still totals a spray whose unknown part is a mass', () => {
    const sheet = recordSheet(buildInput({ components: [component({ kind: 'perArea', value: '', unit: 'kg/ha' })] }))
    expect(sheet.totalL).toBe(600)
    expect(sheet.components[0]).toMatchObject({ amount: null, measure: { id: 'sheet.measure.unknown' } })
  })
})

describe('recordSheet by block line', () => {
  it('shares the total by area and reads what was written down', () => {
    const sheet = recordSheet(buildInput({ lines: [{ areaM2: 10_000, amount: { value: '50', unit: 'galUS' } }, { areaM2: 5_000 }, { areaM2: 15_000, amount: null }] }))
    expect(sheet.lines).toEqual([
      { areaHa: 1, shareL: '200', shareKg: null, amountL: '189.2705892', amountKg: null },
      { areaHa: 0.5, shareL: '100', shareKg: null, amountL: null, amountKg: null },
      { areaHa: 1.5, shareL: '300', shareKg: null, amountL: null, amountKg: null },
    ])
  })

  it('refuses an amount that is neither volume nor mass', () => {
    expect(recordSheet(buildInput({ lines: [{ areaM2: 1, amount: { value: '5', unit: 'm' } }] })).findings).toEqual([
      { code: 'unit.not_allowed', params: { unit: 'm' }, path: 'lines.0.amount' },
    ])
  })
})

describe('recordSheet by count', () => {
  const beds = (counts: { plant?: string; bed?: string }[]) => counts.map((one) => ({ areaM2: 100, counts: one }))

  it('sizes a drench of half a litre a plant and shares it by plants, not by area', () => {
    const sheet = recordSheet(buildInput({
      lines: beds([{ plant: '120' }, { plant: '80' }]), water: { sizedFrom: 'perEach', value: '0.5', unit: 'L', each: 'plant' }, components: [],
    }))
    expect(sheet).toMatchObject({ totalL: 100, waterL: 100, counts: { plant: '200' }, sprayPerEach: { each: 'plant', litres: 0.5 } })
    expect(sheet.lines.map(({ shareL }) => shareL)).toEqual(['60', '40'])
  })

  it('says which line lacks the count it is sized by', () => {
    const sheet = recordSheet(buildInput({ lines: beds([{ bed: '4' }, {}]), components: [component({ kind: 'perEach', value: '2', unit: 'L', each: 'bed' })] }))
    expect(sheet.findings).toEqual([{ code: 'sheet.count_needed', params: { each: 'bed' }, path: 'lines.1.counts' }])
    expect(sheet.components[0]?.amount).toBeNull()
  })

  it('adds a rate for each and an amount in all to the mix', () => {
    const sheet = recordSheet(buildInput({
      lines: beds([{ bed: '4' }]), water: { sizedFrom: 'water', value: '50', unit: 'L' },
      components: [component({ kind: 'perEach', value: '250', unit: 'mL', each: 'bed' }), component({ kind: 'total', value: '2', unit: 'L' })],
    }))
    expect(sheet).toMatchObject({ totalL: 53, waterL: 50 })
    expect(sheet.components.map(({ amount }) => amount)).toEqual([{ value: '1000', unit: 'mL' }, { value: '2', unit: 'L' }])
  })
})

describe('recordSheet read the other way round', () => {
  it('takes 1 part in N parts of the mix: 100 L at 1 in 20 is 5 L and 95 L of water', () => {
    const sheet = recordSheet(buildInput({ lines: [{ areaM2: 10_000 }], water: { sizedFrom: 'sprayRate', value: '100', unit: 'L/ha' }, components: [component({ kind: 'ratio', parts: '20', reading: 'in' })] }))
    expect(sheet).toMatchObject({ totalL: 100, waterL: 95 })
    expect(sheet.components[0]?.amount).toEqual({ value: '5', unit: 'L' })
  })

  it('sizes the mix by the scarcest jar: 3 L at 1 to 30 is 90 L of water', () => {
    const sheet = recordSheet(buildInput({ water: { sizedFrom: 'jar', component: 0, value: '3', unit: 'L' }, components: [component({ kind: 'ratio', parts: '30' })] }))
    expect(sheet).toMatchObject({ waterL: 90, totalL: 93 })
  })

  it('says that a jar measured by area sizes no water', () => {
    const sheet = recordSheet(buildInput({ water: { sizedFrom: 'jar', component: 0, value: '3', unit: 'L' }, components: [component({ kind: 'perArea', value: '3', unit: 'L/ha' })] }))
    expect(sheet).toMatchObject({ waterL: null, totalL: null, findings: [{ code: 'sheet.jar_fixed', path: 'water' }] })
  })

  it('puts a brew on as it is: no water, no ratio to it', () => {
    const brew = component({ kind: 'perArea', value: '40', unit: 'L/ha' })
    expect(recordSheet(buildInput({ lines: [{ areaM2: 5_000 }], water: { sizedFrom: 'none' }, components: [brew] }))).toMatchObject({ waterL: 0, totalL: 20, findings: [] })
    expect(recordSheet(buildInput({ water: { sizedFrom: 'none' }, components: [component({ kind: 'ratio', parts: '20' })] }))).toMatchObject({
      totalL: null, findings: [{ code: 'sheet.ratio_needs_water', path: 'components.0' }],
    })
  })

  it('spreads a solid dry and shares it by area', () => {
    const sheet = recordSheet({ lines: [{ areaM2: 7_500 }, { areaM2: 2_500 }], isDry: true, water: null, tankL: '400', components: [component({ kind: 'perArea', value: '800', unit: 'kg/ha' })] })
    expect(sheet).toMatchObject({ totalL: null, waterL: null, totalKg: 800, kgPerHa: 800, loads: null, findings: [] })
    expect(sheet.lines.map(({ shareKg }) => shareKg)).toEqual(['600', '200'])
  })

  it('tells the minutes of a load where the flow is known', () => {
    const sheet = recordSheet(buildInput({ water: { sizedFrom: 'water', value: '500', unit: 'L' }, components: [], flowLPerMin: '10' }))
    expect(sheet.loads).toMatchObject({ full: 2, fullMinutes: 20, lastL: 100, lastMinutes: 10 })
  })
})
