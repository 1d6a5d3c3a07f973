import { describe, expect, it } from 'vitest'
import { recordContentSchema } from '../../../../shared/contract/recordContent.ts'
import { recordSheet } from '../../../../shared/mix/recordSheet.ts'
import { contentOf, sheetInputOf, weatherOf } from '../../../../src/composables/recordContent.ts'
import type { RecordDraft } from '../../../../src/composables/recordDraft.ts'
import { buildDraft } from './buildRecord.ts'

const ID = '01978000-0000-7000-8000-000000000001'
const zone = 'America/Los_Angeles'
const sheetOf = (draft: RecordDraft) => recordSheet(sheetInputOf(draft, { areaM2: 10_000, tankL: '400' }))
const contentFor = (draft: RecordDraft, happened = true) => contentOf(draft, { zone, sheet: sheetOf(draft), happened })
const full = (): RecordDraft => {
  const draft = buildDraft({ blockId: ID, sprayerId: ID, plain: { purpose: ' aphids ', licence: '', notes: '' } })
  draft.components = draft.components.map((component) => ({ ...component, materialId: ID, lotId: ID }))
  draft.start = { date: '2026-06-16', time: '06:50', offset: '' }
  draft.end = { date: '2026-06-16', time: '07:36', offset: '' }
  return draft
}

describe('a form as the record it is sent as', () => {
  it('fits the contract, with times as instants of the farm’s clock', () => {
    const content = recordContentSchema.parse(contentFor(full()))
    expect(content.lines[0]).toMatchObject({ startedAt: '2026-06-16T13:50:00Z', endedAt: '2026-06-16T14:36:00Z' })
    expect(content.purpose).toBe('aphids')
    expect(content.weather).toBeNull()
  })

  it('leaves out the end and the amount while it is only planned', () => {
    expect(contentFor(full(), false).lines[0]).toMatchObject({ endedAt: null, amount: null })
  })

  it('reads numbers as people type them', () => {
    const draft = full()
    draft.water.value = '1 200,5'
    draft.components[0] = { ...draft.components[0]!, kind: 'perTank', value: '1 1/2', unit: 'qtUS', each: 'plant', reading: 'to' }
    const content = recordContentSchema.parse(contentFor(draft))
    expect(content.water).toMatchObject({ value: '1200.5' })
    expect(content.components[0]?.basis).toEqual({ kind: 'perTank', value: '1.5', unit: 'qtUS', each: 'plant', reading: 'to' })
  })

  it('sends the sheet’s own total where the amount was worked out, and what was measured where it was', () => {
    const draft = full()
    expect(contentFor(draft).lines[0]?.amount).toEqual({ value: '787.5', unit: 'L', known: 'workedOut' })
    draft.amount = { value: '786', unit: 'L', known: 'measured' }
    expect(contentFor(draft).lines[0]?.amount).toEqual({ value: '786', unit: 'L', known: 'measured' })
    draft.amount = { value: '', unit: 'L', known: 'counted' }
    expect(contentFor(draft).lines[0]?.amount).toBeNull()
  })

  it('does not guess a time that the clock skipped, and takes the one chosen of two', () => {
    const draft = full()
    draft.start = { date: '2026-03-08', time: '02:30', offset: '' }
    expect(contentFor(draft).lines[0]?.startedAt).toBeNull()
    draft.start = { date: '2026-11-01', time: '01:30', offset: '' }
    expect(contentFor(draft).lines[0]?.startedAt).toBeNull()
    draft.start.offset = '-08:00'
    expect(contentFor(draft).lines[0]?.startedAt).toBe('2026-11-01T09:30:00Z')
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
    const draft = buildDraft({ water: { sizedFrom: 'water', value: '7x', unit: 'L', source: '', each: 'plant', component: 0 } })
    expect(recordSheet(sheetInputOf(draft, { areaM2: null, tankL: null })).totalL).toBeNull()
  })

  it('holds the amount that was measured, not the one worked out', () => {
    const draft = buildDraft({ amount: { value: '786', unit: 'L', known: 'workedOut' } })
    expect(sheetOf(draft).lines[0]?.amountL).toBeNull()
    draft.amount.known = 'measured'
    expect(sheetOf(draft).lines[0]?.amountL).toBe('786')
  })
})
