import { describe, expect, it } from 'vitest'
import { recordContentSchema } from '../../../../shared/contract/recordContent.ts'
import { recordSheet } from '../../../../shared/mix/recordSheet.ts'
import { emptyPart } from '../../../../src/composables/record/lineDraft.ts'
import { contentOf, partOf, sheetInputOf, weatherOf } from '../../../../src/composables/record/recordContent.ts'
import type { RecordDraft } from '../../../../src/composables/record/recordDraft.ts'
import { buildComponent, buildDraft, buildLine } from './buildRecord.ts'

const ID = '01978000-0000-7000-8000-000000000001'
const OTHER = '01978000-0000-7000-8000-000000000002'
const zone = 'America/Los_Angeles'
const ground = { blocks: [{ id: ID, areaM2: 10_000 }, { id: OTHER, areaM2: '20000' }], sprayer: { tankL: '400', flowLPerMin: '8' } }
const sheetOf = (draft: RecordDraft) => recordSheet(sheetInputOf(draft, ground))
const contentFor = (draft: RecordDraft, happened = true) => contentOf(draft, { zone, happened })
const full = (over: Partial<RecordDraft> = {}): RecordDraft => buildDraft({
  sprayerId: ID, plain: { purpose: ' aphids ', licence: '', notes: '' }, lines: [buildLine({ blockId: ID })], components: [buildComponent({ materialId: ID, lotId: ID })], ...over,
})

describe('a form as the record it is sent as', () => {
  it('fits the contract, with times as instants of the farm’s clock', () => {
    const content = recordContentSchema.parse(contentFor(full()))
    expect(content.lines[0]).toMatchObject({ startedAt: '2026-06-16T13:50:00Z', endedAt: '2026-06-16T14:36:00Z' })
    expect(content.purpose).toBe('aphids')
    expect(content.weather).toBeNull()
  })

  it.each([['0.4', '0.4'], ['2/5', '0.4'], ['40 %', '0.4'], ['12,5%', '0.125'], ['100 %', '1'], ['40', null], ['120 %', null], ['%', null], ['0 %', null]])(
    'reads a share of the block typed %s', (fraction, read) => {
      expect(partOf({ part: { ...emptyPart(), kind: 'fraction', fraction } })).toEqual(read === null ? null : { kind: 'fraction', fraction: read })
    },
  )

  it('leaves out the end, the amount and what was used while it is only planned', () => {
    const draft = full()
    draft.components[0]!.used = { value: '36', unit: 'L', known: 'measured' }
    expect(contentFor(draft, false).lines[0]).toMatchObject({ endedAt: null, amount: null })
    expect(contentFor(draft, false).components?.[0]?.used).toBeNull()
    expect(contentFor(draft).components?.[0]?.used).toEqual({ value: '36', unit: 'L', known: 'measured' })
  })

  it('holds every line but those that were not sprayed, each with its part, counts and stage', () => {
    const content = recordContentSchema.parse(contentFor(full({ lines: [
      buildLine({ blockId: ID, part: { ...emptyPart(), kind: 'rows', from: '1', to: '4', of: '12' }, counts: { plant: '1 200', tree: '', rowM: '', bed: '', pot: '' } }),
      buildLine({ blockId: OTHER, skipped: true }),
      buildLine({ blockId: OTHER, part: { ...emptyPart(), kind: 'fraction', fraction: '1/2' }, stage: ' fruit to 20 mm ', bbch: '72' }),
    ] })))
    expect(content.lines).toMatchObject([
      { blockId: ID, part: { kind: 'rows', from: 1, to: 4, of: 12 }, counts: { plant: '1200' }, stage: null },
      { blockId: OTHER, part: { kind: 'fraction', fraction: '0.5' }, counts: {}, stage: 'fruit to 20 mm', bbch: '72' },
    ])
  })

  it('ends on the next day only where that was said', () => {
    const line = buildLine({ blockId: ID, start: { date: '2026-06-16', time: '22:50', offset: '' }, end: { time: '00:10', offset: '', nextDay: true } })
    expect(contentFor(full({ lines: [line] })).lines[0]?.endedAt).toBe('2026-06-17T07:10:00Z')
    line.end.nextDay = false
    expect(contentFor(full({ lines: [line] })).lines[0]?.endedAt).toBe('2026-06-16T07:10:00Z')
  })

  it('reads numbers as people type them', () => {
    const draft = full()
    draft.water.value = '1 200,5'
    draft.components = [buildComponent({ materialId: ID, lotId: ID, kind: 'perTank', value: '1 1/2', unit: 'qtUS' })]
    const content = recordContentSchema.parse(contentFor(draft))
    expect(content.water).toMatchObject({ value: '1200.5' })
    expect(content.components[0]?.basis).toEqual({ kind: 'perTank', value: '1.5', unit: 'qtUS' })
  })

  it('leaves a worked-out amount to the sheet, and sends what was measured or counted', () => {
    const draft = full()
    const line = draft.lines[0]!
    expect(contentFor(draft).lines[0]?.amount).toBeNull()
    line.amount = { value: '786', unit: 'L', known: 'measured' }
    expect(contentFor(draft).lines[0]?.amount).toEqual({ value: '786', unit: 'L', known: 'measured' })
    line.amount = { value: '', unit: 'L', known: 'counted' }
    expect(contentFor(draft).lines[0]?.amount).toBeNull()
  })

  it('does not guess a time that the clock skipped, and takes the one chosen of two', () => {
    const at = (start: { date: string; time: string; offset: string }) => contentFor(full({ lines: [buildLine({ blockId: ID, start })] })).lines[0]?.startedAt
    expect(at({ date: '2026-03-08', time: '02:30', offset: '' })).toBeNull()
    expect(at({ date: '2026-11-01', time: '01:30', offset: '' })).toBeNull()
    expect(at({ date: '2026-11-01', time: '01:30', offset: '-08:00' })).toBe('2026-11-01T09:30:00Z')
  })

  it('has neither water nor tank for a solid, and its worked-in day for nothing else', () => {
    const draft = full({ method: 'solid', workedInOn: '2026-06-17', components: [buildComponent({ materialId: ID, lotId: ID, kind: 'total', value: '800', unit: 'kg' })] })
    expect(recordContentSchema.parse(contentFor(draft))).toMatchObject({ method: 'solid', water: null, sprayerId: null, workedInOn: '2026-06-17' })
    expect(recordContentSchema.parse(contentFor({ ...draft, method: 'drench' }))).toMatchObject({ workedInOn: null, sprayerId: ID })
  })

  it.each([
    { water: { sizedFrom: 'perEach', value: '40', unit: 'mL', each: 'plant' } as const, wanted: { sizedFrom: 'perEach', value: '40', unit: 'mL', each: 'plant', source: null } },
    { water: { sizedFrom: 'jar', value: '4.2', unit: 'L', component: 0 } as const, wanted: { sizedFrom: 'jar', component: 0, value: '4.2', unit: 'L', source: null } },
    { water: { sizedFrom: 'none' } as const, wanted: { sizedFrom: 'none' } },
  ])('is sized from $water.sizedFrom', ({ water, wanted }) => {
    const draft = full()
    draft.water = { ...draft.water, ...water }
    expect(recordContentSchema.parse(contentFor(draft)).water).toEqual(wanted)
  })
})

describe('weather', () => {
  it('is nothing where nothing was read, and each value with its kind where it was', () => {
    const draft = buildDraft()
    expect(weatherOf(draft)).toBeNull()
    draft.weather.air = { value: '−2,5', unit: 'degC', kind: 'station' }
    draft.weather.windFrom = 'NW'
    expect(weatherOf(draft)).toEqual({ wind: null, windFrom: 'NW', air: { value: '-2.5', unit: 'degC', kind: 'station' }, humidity: null })
  })
})

describe('the sheet of a half-typed form', () => {
  it('never throws and knows no total', () => {
    const draft = buildDraft({ lines: [buildLine({ blockId: ID, part: { ...emptyPart(), kind: 'fraction', fraction: '2x' } })] })
    expect(sheetOf(draft).totalL).toBe(787.5)
    expect(sheetOf(draft).sprayLPerHa).toBeNull()
    draft.water.value = '7x'
    expect(sheetOf(draft).totalL).toBeNull()
  })

  it('shares the mix out by the parts of the blocks', () => {
    const sheet = sheetOf(full({ lines: [
      buildLine({ blockId: ID, part: { ...emptyPart(), kind: 'beds', from: '3', to: '7', of: '10' } }), buildLine({ blockId: OTHER, skipped: true }), buildLine({ blockId: OTHER }),
    ] }))
    expect(sheet.lines.map(({ areaHa, shareL }) => [areaHa, shareL])).toEqual([[0.5, '157.5'], [2, '630']])
  })

  it('holds the amount that was measured, not the one worked out', () => {
    const draft = full()
    draft.lines[0]!.amount = { value: '786', unit: 'L', known: 'workedOut' }
    expect(sheetOf(draft).lines[0]?.amountL).toBeNull()
    draft.lines[0]!.amount.known = 'measured'
    expect(sheetOf(draft).lines[0]?.amountL).toBe('786')
  })
})
