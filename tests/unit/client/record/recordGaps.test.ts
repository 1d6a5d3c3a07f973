import { describe, expect, it } from 'vitest'
import { recordSheet } from '../../../../shared/mix/recordSheet.ts'
import { sheetInputOf } from '../../../../src/composables/recordContent.ts'
import { emptyRecord, type RecordDraft } from '../../../../src/composables/recordDraft.ts'
import { signGaps, startGap, unreadable } from '../../../../src/composables/recordGaps.ts'
import { buildDraft } from './buildRecord.ts'

const zone = 'America/Los_Angeles'
const factsOf = (draft: RecordDraft) => ({ draft, zone, sheet: recordSheet(sheetInputOf(draft, { areaM2: draft.blockId === '' ? null : 10_000, tankL: null })) })
const happened = (over: Partial<RecordDraft> = {}): RecordDraft => buildDraft({
  step: 2, start: { date: '2026-06-16', time: '06:50', offset: '' }, end: { date: '2026-06-16', time: '07:36', offset: '' }, ...over,
})

describe('what keeps a record from being started', () => {
  it.each([
    { name: 'no block', draft: emptyRecord(), gap: 'records.ready.needBlock' },
    { name: 'nothing that goes in', draft: buildDraft({ components: [] }), gap: 'records.ready.needMaterial' },
    { name: 'no water', draft: buildDraft({ water: { sizedFrom: 'water', value: '', unit: 'L', source: '', each: 'plant', component: 0 } }), gap: 'records.ready.needMix' },
    { name: 'a rate per tank without a tank', draft: buildDraft({ components: [{ key: 'k', materialId: 'm1', lotId: '', kind: 'perTank', value: '2', unit: 'L', each: 'plant', reading: 'to' }] }), gap: 'records.ready.needMix' },
    { name: 'nothing: a lot may follow', draft: buildDraft({ components: [{ key: 'k', materialId: 'm1', lotId: '', kind: 'ratio', value: '20', unit: 'L', each: 'plant', reading: 'to' }] }), gap: null },
  ])('$name', ({ draft, gap }) => {
    expect(startGap(factsOf(draft))).toBe(gap)
  })

  it('is a weather value that is no number or no percentage', () => {
    const draft = buildDraft()
    draft.weather.humidity.value = '140'
    expect(startGap(factsOf(draft))).toBe('records.ready.needFields')
    draft.weather.humidity.value = 'wet'
    expect(startGap(factsOf(draft))).toBe('records.ready.needFields')
    draft.weather.humidity.value = '78'
    expect(startGap(factsOf(draft))).toBeNull()
  })
})

describe('what keeps a record from being signed', () => {
  it('is nothing once it says what happened', () => {
    expect(signGaps({ ...factsOf(happened()), hasStops: false })).toEqual({})
  })

  it('is never a stop, only what is not said about it', () => {
    expect(Object.keys(signGaps({ ...factsOf(happened()), hasStops: true }))).toEqual(['stop.why', 'stop.told', 'stop.done'])
    expect(signGaps({ ...factsOf(happened({ stop: { why: 'a', told: 'b', done: 'c' } })), hasStops: true })).toEqual({})
  })

  it.each([
    { name: 'no start', over: { start: { date: '2026-06-16', time: '', offset: '' } }, gap: { 'lines.0.startedAt': 'records.sign.needStart' } },
    { name: 'no end', over: { end: { date: '', time: '', offset: '' } }, gap: { 'lines.0.endedAt': 'records.sign.needEnd' } },
    { name: 'an end before the start', over: { end: { date: '2026-06-16', time: '06:00', offset: '' } }, gap: { 'lines.0.endedAt': 'records.sign.endBeforeStart' } },
    { name: 'a time the clock skipped', over: { start: { date: '2026-03-08', time: '02:30', offset: '' } }, gap: { 'lines.0.startedAt': 'records.gap.time' } },
    { name: 'an amount measured and not written', over: { amount: { value: '', unit: 'L', known: 'measured' as const } }, gap: { 'lines.0.amount': 'records.sign.needAmount' } },
    { name: 'no lot', over: { components: [{ key: 'k', materialId: 'm1', lotId: '', kind: 'ratio' as const, value: '20', unit: 'L', each: 'plant' as const, reading: 'to' as const }] }, gap: { 'components.0.lotId': 'records.sign.needLot' } },
  ])('$name', ({ over, gap }) => {
    expect(signGaps({ ...factsOf(happened(over)), hasStops: false })).toEqual(gap)
  })
})

describe('what is no number', () => {
  it('is said of its field as one types, and an empty field is none of it', () => {
    const draft = buildDraft({ water: { sizedFrom: 'water', value: '7x', unit: 'L', source: '', each: 'plant', component: 0 } })
    draft.components.push({ key: 'k2', materialId: '', lotId: '', kind: 'ratio', value: '1:20', unit: 'L', each: 'plant', reading: 'to' })
    draft.weather.air.value = '-3'
    expect(unreadable(draft)).toEqual({ water: 'records.gap.number', 'components.1.basis': 'records.gap.number' })
    expect(unreadable(emptyRecord())).toEqual({})
  })
})
