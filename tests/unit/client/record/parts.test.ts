import { describe, expect, it } from 'vitest'
import LotPicker from '../../../../src/components/record/LotPicker.vue'
import { drawPlan } from '../../../../src/components/record/drawPlan.ts'
import RecordSteps from '../../../../src/components/record/RecordSteps.vue'
import TankLoads from '../../../../src/components/record/TankLoads.vue'
import { createPinia, setActivePinia } from 'pinia'
import { mountWithWords } from '../mountWithWords.ts'
import { buildBlock } from './buildRecord.ts'

setActivePinia(createPinia())

describe('the block to scale', () => {
  const frame = { width: 214, height: 182 }

  it('fills its frame, north up, with a bar of a round length', () => {
    // 0.0011° of longitude at 38° N is about 96.5 m, 0.0009° of latitude about 99.9 m.
    const plan = drawPlan(buildBlock(), [], frame)
    const numbers = (plan.path.match(/-?[\d.]+/g) ?? []).map(Number)
    const ys = numbers.filter((_, index) => index % 2 === 1)
    expect(Math.min(...ys)).toBeCloseTo(20, 0)
    expect(Math.max(...ys)).toBeCloseTo(162, 0)
    expect([10, 20, 50, 100]).toContain(plan.bar.value)
    expect(plan.bar.px / plan.bar.metres).toBeCloseTo(142 / 99.9, 2)
    expect([plan.x, plan.y]).toEqual([expect.closeTo(107, 0), expect.closeTo(91, 0)])
  })

  it('draws a neighbour in its place and leaves out one that is far', () => {
    const east = buildBlock({ id: 'b2', code: 'A4', geometry: { type: 'Polygon', coordinates: [[[-120.9988, 38], [-120.9977, 38], [-120.9977, 38.0009], [-120.9988, 38]]] } })
    const far = buildBlock({ id: 'b3', code: 'Z9', geometry: { type: 'Polygon', coordinates: [[[-120, 38], [-119.999, 38], [-119.999, 38.001], [-120, 38]]] } })
    const { neighbours, x } = drawPlan(buildBlock(), [east, far], frame)
    expect(neighbours.map(({ code }) => code)).toEqual(['A4'])
    expect(neighbours[0]?.x).toBeGreaterThan(x)
  })
})

describe('several blocks to scale', () => {
  const east = buildBlock({ id: 'b2', code: 'A4', geometry: { type: 'Polygon', coordinates: [[[-120.9988, 38], [-120.9977, 38], [-120.9977, 38.0009], [-120.9988, 38.0009], [-120.9988, 38]]] } })
  const frame = { width: 214, height: 182 }
  const xs = (path: string): number[] => (path.match(/-?[\d.]+/g) ?? []).map(Number).filter((_, index) => index % 2 === 0)

  it('fit the frame together, side by side', () => {
    const { path, also } = drawPlan(buildBlock(), [], frame, { also: [east] })
    expect(Math.min(...xs(path))).toBeCloseTo(20, 0)
    expect(Math.max(...xs(also[0]?.path ?? ''))).toBeCloseTo(194, 0)
    expect(Math.min(...xs(also[0]?.path ?? ''))).toBeGreaterThan(Math.max(...xs(path)))
  })

  it('are filled whole, and where only a part was treated, by that part', () => {
    expect(drawPlan(buildBlock(), [], frame, { also: [east] }).fills).toHaveLength(2)
    const [half, ...more] = drawPlan(buildBlock(), [], frame, { fills: [{ type: 'Polygon', coordinates: [[[-121, 38], [-120.99945, 38], [-120.99945, 38.0009], [-121, 38.0009], [-121, 38]]] }] }).fills
    expect(more).toEqual([])
    expect(Math.max(...xs(half ?? ''))).toBeCloseTo(107, 0)
  })
})

describe('tank loads', () => {
  const names = (loads: { full: number; count: number; tankL: number; lastL: number }) =>
    mountWithWords(TankLoads, { loads: { ...loads, lastAreaHa: 0 } }).findAll('svg').map((vessel) => vessel.attributes('aria-label'))

  it('are one vessel each, filled to scale', () => {
    const wrapper = mountWithWords(TankLoads, { loads: { full: 1, count: 2, tankL: 400, lastL: 100, lastAreaHa: 0.1 } })
    expect(wrapper.findAll('rect.fill').map((fill) => Number(fill.attributes('height')))).toEqual([40, 10])
    expect(wrapper.findAll('text').map((text) => text.text())).toEqual(['400', '100'])
  })

  it('are told, not drawn, when there are many', () => {
    expect(names({ full: 12, count: 13, tankL: 400, lastL: 10 })).toHaveLength(5)
    expect(names({ full: 2, count: 2, tankL: 400, lastL: 0 })).toHaveLength(2)
  })
})

describe('the two steps', () => {
  it('say which is open and open the other', async () => {
    const wrapper = mountWithWords(RecordSteps, { modelValue: 1 })
    const [ready, happened] = wrapper.findAll('button')
    expect(ready?.attributes('aria-current')).toBe('step')
    await happened?.trigger('click')
    expect(wrapper.emitted('update:modelValue')).toEqual([[2]])
  })
})

describe('the lots to choose from', () => {
  it('keep what is past its use, with the reason', () => {
    const lot = {
      id: 'l1', materialId: 'm1', code: 'NF-24', origin: 'made', source: null, receivedOn: '2026-05-01', quantity: { value: '100', unit: 'L' }, expiresOn: '2026-06-10',
      materialName: 'Nettle ferment', left: { value: '2', unit: 'L' }, revision: 1, createdAt: '2026-05-01T00:00:00Z',
    }
    const wrapper = mountWithWords(LotPicker, { modelValue: '', name: 'lot', ranked: [{ lot, fitness: 'past', leftShare: 0.02 }] })
    expect(wrapper.text()).toContain('past its use, 10 June')
    expect(wrapper.findAll('input[type=radio]')).toHaveLength(2)
  })
})
