import { describe, expect, it } from 'vitest'
import { recordSheet } from '../../../../shared/mix/recordSheet.ts'
import { emptyPart, type LineDraft } from '../../../../src/composables/record/lineDraft.ts'
import { sheetInputOf } from '../../../../src/composables/record/recordContent.ts'
import { emptyRecord, type RecordDraft } from '../../../../src/composables/record/recordDraft.ts'
import { signGaps, startGap, unreadable } from '../../../../src/composables/record/recordGaps.ts'
import { buildComponent, buildDraft, buildLine } from './buildRecord.ts'

const zone = 'America/Los_Angeles'
const factsOf = (draft: RecordDraft) => ({ draft, zone, sheet: recordSheet(sheetInputOf(draft, { blocks: [{ id: 'b1', areaM2: 10_000 }], sprayer: null })) })
const happened = (line: Partial<LineDraft> = {}, over: Partial<RecordDraft> = {}): RecordDraft => buildDraft({ step: 2, lines: [buildLine(line)], ...over })
const water = (over: Partial<RecordDraft['water']>): RecordDraft['water'] => ({ ...emptyRecord().water, value: '750', ...over })

describe('what keeps a record from being started', () => {
  it.each([
    { name: 'no block', draft: emptyRecord(), gap: 'records.ready.needBlock' },
    { name: 'every block left out', draft: buildDraft({ lines: [buildLine({ skipped: true })] }), gap: 'records.ready.needBlock' },
    { name: 'a part that is not said', draft: buildDraft({ lines: [buildLine({ part: { ...emptyPart(), kind: 'rows', from: '1', to: '4' } })] }), gap: 'recordForm.ready.needPart' },
    { name: 'nothing that goes in', draft: buildDraft({ components: [] }), gap: 'records.ready.needMaterial' },
    { name: 'no count of what it is sized by', draft: buildDraft({ water: water({ sizedFrom: 'perEach', value: '40', unit: 'mL' }) }), gap: 'recordForm.ready.needCounts' },
    { name: 'no water', draft: buildDraft({ water: water({ value: '' }) }), gap: 'records.ready.needMix' },
    { name: 'a rate per tank without a tank', draft: buildDraft({ components: [buildComponent({ kind: 'perTank', value: '2' })] }), gap: 'records.ready.needMix' },
    { name: 'nothing: a lot may follow', draft: buildDraft({ components: [buildComponent({ lotId: '' })] }), gap: null },
    { name: 'nothing: a solid has no water', draft: buildDraft({ method: 'solid', water: water({ value: '' }), components: [buildComponent({ kind: 'total', value: '800', unit: 'kg' })] }), gap: null },
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

  it.each([['a'.repeat(4001), 'problems.text.too_long'], ['a\n'.repeat(300), 'problems.text.too_many_lines'], ['stirred \u202Ebackwards', 'problems.text.bidi_control']])(
    'is a note that cannot be kept, in the words of texts: %#', (notes, gap) => {
      const draft = happened({}, { plain: { purpose: '', licence: '', notes } })
      expect(signGaps({ ...factsOf(draft), hasStops: false })).toEqual({ notes: gap })
    },
  )

  it('is never a stop, only what is not said about it', () => {
    expect(Object.keys(signGaps({ ...factsOf(happened()), hasStops: true }))).toEqual(['stop.why', 'stop.told', 'stop.done'])
    expect(signGaps({ ...factsOf(happened({}, { stop: { why: 'a', told: 'b', done: 'c' } })), hasStops: true })).toEqual({})
  })

  it.each<{ name: string; line?: Partial<LineDraft>; over?: Partial<RecordDraft>; gap: Record<string, string> }>([
    { name: 'no start', line: { start: { date: '2026-06-16', time: '', offset: '' } }, gap: { 'lines.0.startedAt': 'records.sign.needStart' } },
    { name: 'no end', line: { end: { time: '', offset: '', nextDay: false } }, gap: { 'lines.0.endedAt': 'records.sign.needEnd' } },
    { name: 'an end before the start', line: { end: { time: '06:00', offset: '', nextDay: false } }, gap: { 'lines.0.endedAt': 'records.sign.endBeforeStart' } },
    { name: 'a time the clock skipped', line: { start: { date: '2026-03-08', time: '02:30', offset: '' } }, gap: { 'lines.0.startedAt': 'records.gap.time' } },
    { name: 'an amount measured and not written', line: { amount: { value: '', unit: 'L', known: 'measured' } }, gap: { 'lines.0.amount': 'records.sign.needAmount' } },
  ])('$name', ({ line = {}, over = {}, gap }) => {
    expect(signGaps({ ...factsOf(happened(line, over)), hasStops: false })).toEqual(gap)
  })

  it('counts the lines as they go into the record, past those that were left out', () => {
    const draft = happened({}, { lines: [buildLine({ skipped: true }), buildLine(), buildLine({ end: { time: '', offset: '', nextDay: false } })] })
    expect(signGaps({ ...factsOf(draft), hasStops: false })).toEqual({ 'lines.1.endedAt': 'records.sign.needEnd' })
  })
})

describe('what cannot stand in a field', () => {
  it('is said of it as one types, and an empty field is none of it', () => {
    const draft = buildDraft({ water: water({ value: '7x' }) })
    draft.components.push(buildComponent({ materialId: '', lotId: '', value: '1:20' }))
    draft.weather.air.value = '-3'
    expect(unreadable(draft)).toEqual({ water: 'records.gap.number', 'components.1.basis': 'records.gap.number' })
    expect(unreadable(emptyRecord())).toEqual({})
  })

  it.each([
    { component: { value: '0' }, gap: 'recordForm.gap.ratioZero' },
    { component: { value: '0.5' }, gap: undefined },
    { component: { value: '0.5', reading: 'in' as const }, gap: 'problems.ratio.in_below_one' },
    { component: { kind: 'total' as const, value: '0,0' }, gap: 'recordForm.gap.aboveZero' },
  ])('a measure of $component.value ($component.kind $component.reading) is $gap', ({ component, gap }) => {
    expect(unreadable(buildDraft({ components: [buildComponent(component)] }))['components.0.basis']).toBe(gap)
  })

  it.each([
    { part: { kind: 'fraction' as const, fraction: '1.5' }, gap: 'problems.part.fraction' },
    { part: { kind: 'fraction' as const, fraction: '' }, gap: undefined },
    { part: { kind: 'rows' as const, from: '5', to: '4', of: '9' }, gap: 'problems.part.span' },
    { part: { kind: 'beds' as const, from: '1', to: '2.5', of: '' }, gap: 'problems.number.whole' },
    { part: { kind: 'rows' as const, from: '1', to: '', of: '9' }, gap: undefined },
  ])('a part of $part.kind $part.fraction$part.from–$part.to is $gap', ({ part, gap }) => {
    expect(unreadable(buildDraft({ lines: [buildLine({ part: { ...emptyPart(), ...part } })] }))['lines.0.part']).toBe(gap)
  })

  it('is half a plant, and is not half a metre of row', () => {
    const counts = { plant: '12.5', tree: '', rowM: '12.5', bed: '0', pot: '' }
    expect(unreadable(buildDraft({ lines: [buildLine({ counts })] }))).toEqual({ 'lines.0.counts.plant': 'problems.number.whole', 'lines.0.counts.bed': 'recordForm.gap.aboveZero' })
  })
})
