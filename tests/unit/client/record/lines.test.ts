import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it } from 'vitest'
import { effectScope, nextTick, ref } from 'vue'
import LineAmount from '../../../../src/components/record/LineAmount.vue'
import LineTimes from '../../../../src/components/record/LineTimes.vue'
import { emptyAmount, emptyPart } from '../../../../src/composables/record/lineDraft.ts'
import { useLinePicking } from '../../../../src/composables/record/useLinePicking.ts'
import { mountWithWords } from '../mountWithWords.ts'
import { buildDraft, buildLine } from './buildRecord.ts'

setActivePinia(createPinia())
// The desk: no query of a narrower window matches.
const zone = 'America/Los_Angeles'

describe('the times of a line', () => {
  const mountTimes = (line = buildLine()) => {
    const model = ref(line)
    return { model, wrapper: mountWithWords(LineTimes, { modelValue: model.value, zone, code: 'A3', errors: {} }) }
  }

  it('ask about an end before the start, and take the next day only when it is said', async () => {
    const { model, wrapper } = mountTimes(buildLine({ start: { date: '2026-06-16', time: '22:50', offset: '' }, end: { time: '00:10', offset: '', nextDay: false } }))
    expect(wrapper.text()).toContain('00:10 lies before the start at 22:50.')
    expect(model.value.end.nextDay).toBe(false)
    await wrapper.findAll('button').find((button) => button.text().includes('next day'))?.trigger('click')
    expect(model.value.end.nextDay).toBe(true)
  })

  it('ask nothing where the end follows the start', () => {
    expect(mountTimes().wrapper.text()).not.toContain('lies before')
  })

  it('take this moment, on the farm’s clock, with its day', async () => {
    const { model, wrapper } = mountTimes(buildLine({ start: { date: '2020-01-01', time: '', offset: '' } }))
    await wrapper.find('button[aria-label="A3, start: Now"]').trigger('click')
    expect(model.value.start.time).toMatch(/^\d\d:\d\d$/)
    expect(model.value.start.date > '2020-01-01').toBe(true)
  })
})

describe('the amount of a line', () => {
  const mountAmount = (amount = emptyAmount()) => mountWithWords(LineAmount, { modelValue: amount, label: 'Amount', proposed: '373.5', unit: 'L' })
  const last = (wrapper: ReturnType<typeof mountAmount>): unknown => wrapper.emitted('update:modelValue')?.at(-1)?.[0]

  it('shows what was worked out, and is measured once it is written over', async () => {
    const wrapper = mountAmount()
    const field = wrapper.find('input.val')
    expect((field.element as HTMLInputElement).value).toBe('373.5')
    await field.setValue('370')
    expect(last(wrapper)).toEqual({ value: '370', unit: 'L', known: 'measured' })
  })

  it('is stepped up and down from what was worked out', async () => {
    const wrapper = mountAmount()
    const [less, more] = wrapper.findAll('button.step')
    await more?.trigger('click')
    expect(last(wrapper)).toEqual({ value: '374.5', unit: 'L', known: 'measured' })
    await less?.trigger('click')
    expect(last(wrapper)).toEqual({ value: '373.5', unit: 'L', known: 'measured' })
  })

  it('keeps the figure when only how it is known changes', async () => {
    const wrapper = mountAmount({ value: '370', unit: 'L', known: 'measured' })
    await wrapper.findAll('input[type=radio]')[1]?.setValue(true)
    expect(last(wrapper)).toEqual({ value: '370', unit: 'L', known: 'counted' })
  })
})

describe('choosing blocks', () => {
  beforeEach(() => { setActivePinia(createPinia()) })
  const pickingOf = (draft: ReturnType<typeof buildDraft>) => {
    const model = ref(draft)
    const picking = effectScope().run(() => useLinePicking(model))
    if (picking === undefined) throw new TypeError('nothing to pick from')
    return { model, picking }
  }

  it('adds them in the order they were ticked, on the day of the work', async () => {
    const { model, picking } = pickingOf(buildDraft({ lines: [buildLine({ blockId: 'b1' })] }))
    picking.pick(['b3', 'b2'])
    await nextTick()
    expect(model.value.lines.map(({ blockId, start }) => [blockId, start.date])).toEqual([['b1', '2026-06-16'], ['b3', '2026-06-16'], ['b2', '2026-06-16']])
    expect([...picking.taken.value]).toEqual(['b1', 'b3', 'b2'])
  })

  it('adds another part of a block beside the first, and neither is then the whole of it', () => {
    const { model, picking } = pickingOf(buildDraft({ lines: [buildLine({ key: 'k1' }), buildLine({ key: 'k2', blockId: 'b2' })] }))
    picking.another('k1')
    expect(model.value.lines.map(({ blockId, part }) => [blockId, part.kind])).toEqual([['b1', 'rows'], ['b1', 'rows'], ['b2', 'whole']])
    const beds = pickingOf(buildDraft({ lines: [buildLine({ key: 'k1', part: { ...emptyPart(), kind: 'beds', from: '1', to: '2', of: '8' } })] }))
    beds.picking.another('k1')
    expect(beds.model.value.lines[1]?.part).toMatchObject({ kind: 'beds', from: '', to: '', of: '8' })
  })
})
