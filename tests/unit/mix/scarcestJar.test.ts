import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { recordSheet } from '../../../shared/mix/recordSheet.ts'
import { scarcestJar } from '../../../shared/mix/scarcestJar.ts'
import type { SheetInput } from '../../../shared/mix/sheetTypes.ts'
import { ExactDecimal } from '../../../shared/units/exactDecimal.ts'

type Dry = Omit<SheetInput, 'water'>
const sheet = (components: Dry['components'], over: Partial<Dry> = {}): Dry => ({ lines: [{ areaM2: 10_000 }], tankL: '400', components, ...over })
const ratio = (parts: string, reading: 'to' | 'in' = 'to') => ({ basis: { kind: 'ratio' as const, parts, reading } })

describe('how far a jar goes', () => {
  it('is its litres times the parts of water', () => {
    expect(scarcestJar(sheet([ratio('20')]), [{ components: [0], left: { value: '4.2', unit: 'L' } }]))
      .toEqual([{ component: 0, amount: { value: '4.2', unit: 'L' }, waterL: 84, totalL: 88.2 }])
  })

  it('is its litres times the parts of the whole where the ratio is read so', () => {
    const [reach] = scarcestJar(sheet([ratio('20', 'in')]), [{ components: [0], left: { value: '4.2', unit: 'L' } }])
    expect(reach).toMatchObject({ totalL: 84, waterL: 79.8 })
  })

  it('comes scarcest first, whichever jar holds less', () => {
    const jars = [{ components: [0], left: { value: '10', unit: 'L' as const } }, { components: [1], left: { value: '1', unit: 'L' as const } }]
    expect(scarcestJar(sheet([ratio('20'), ratio('500')]), jars).map(({ component, waterL }) => [component, waterL])).toEqual([[0, 200], [1, 500]])
    expect(scarcestJar(sheet([ratio('20'), ratio('100')]), jars).map(({ component, waterL }) => [component, waterL])).toEqual([[1, 100], [0, 200]])
  })

  it('is shared by all that is taken from it', () => {
    const [reach] = scarcestJar(sheet([ratio('20'), ratio('20')]), [{ components: [0, 1], left: { value: '4.2', unit: 'L' } }])
    expect(reach).toMatchObject({ component: 0, amount: { value: '2.1' }, waterL: 42 })
  })

  it('reads a jar by tank, and in the unit of the lot', () => {
    // 2 L in each tank of 400 L: 1 US gallon is enough for 3.785411784 ÷ 2 × 400 L.
    const [reach] = scarcestJar(sheet([{ basis: { kind: 'perTank', value: '2', unit: 'L' } }]), [{ components: [0], left: { value: '1', unit: 'galUS' } }])
    expect(reach?.totalL).toBeCloseTo(757.0824, 3)
  })

  it.each([
    { name: 'measured by area', components: [{ basis: { kind: 'perArea' as const, value: '5', unit: 'L/ha' } }], left: { value: '4', unit: 'L' as const } },
    { name: 'measured in all', components: [{ basis: { kind: 'total' as const, value: '5', unit: 'L' } }], left: { value: '4', unit: 'L' as const } },
    { name: 'weighed, and poured in the mix', components: [ratio('20')], left: { value: '4', unit: 'kg' as const } },
    { name: 'empty', components: [ratio('20')], left: { value: '0', unit: 'L' as const } },
    { name: 'not measured out yet', components: [ratio('')], left: { value: '4', unit: 'L' as const } },
  ])('is nothing for one $name', ({ components, left }) => {
    expect(scarcestJar(sheet(components), [{ components: [0], left }])).toEqual([])
  })

  it('takes no more than every jar holds when the scarcest sizes the mix', () => {
    const parts = fc.integer({ min: 20, max: 5_000 }).map((count) => new ExactDecimal(count).div(10).toFixed())
    const left = fc.integer({ min: 1, max: 900_000 }).map((count) => new ExactDecimal(count).div(1000).toFixed())
    const jar = fc.record({ parts, left, reading: fc.constantFrom('to' as const, 'in' as const) })
    fc.assert(fc.property(fc.array(jar, { minLength: 1, maxLength: 5 }), fc.integer({ min: 1, max: 40 }), (jars, areaRate) => {
      const components = [...jars.map((one) => ratio(one.parts, one.reading)), { basis: { kind: 'perArea' as const, value: String(areaRate), unit: 'mL/ha' } }]
      const [scarcest] = scarcestJar(sheet(components), jars.map((one, index) => ({ components: [index], left: { value: one.left, unit: 'L' as const } })))
      if (scarcest === undefined) return
      const sized = recordSheet({ ...sheet(components), water: { sizedFrom: 'jar', component: scarcest.component, ...scarcest.amount } })
      expect(sized.waterL).toBe(scarcest.waterL)
      jars.forEach((one, index) => { expect(Number(sized.components[index]?.inL)).toBeLessThanOrEqual(Number(one.left) * (1 + 1e-9)) })
    }), { seed: 20_260_616, numRuns: 200 })
  })
})
