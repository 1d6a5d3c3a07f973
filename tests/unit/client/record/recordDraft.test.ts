import { describe, expect, it } from 'vitest'
import { endDate } from '../../../../src/composables/endDate.ts'
import { basisKinds, basisUnits } from '../../../../src/composables/mixUnits.ts'
import { draftLike, draftOfRecord, momentAt } from '../../../../src/composables/recordDraft.ts'
import { buildRecord } from './buildRecord.ts'

describe('a record gone on with', () => {
  it('comes back as it was written, in step 2 once it was started', () => {
    const draft = draftOfRecord(buildRecord(), 'America/Los_Angeles')
    expect(draft).toMatchObject({
      step: 2, method: 'drench', blockId: 'b1', plain: { notes: 'wet' }, revision: 3,
      start: { date: '2026-06-16', time: '06:50', offset: '' }, end: { date: '', time: '' },
      weather: { wind: { value: '1.6', unit: 'ms', kind: 'felt' }, windFrom: 'NW', air: { value: '' } },
      water: { sizedFrom: 'sprayRate', value: '400', unit: 'L/ha', source: '' },
    })
    expect(draft.components.map(({ kind, value, unit, lotId }) => [kind, value, unit, lotId])).toEqual([['ratio', '20', 'L', 'l1'], ['perArea', '4', 'kg/ha', '']])
  })

  it('is in step 1 while it was only written', () => {
    expect(draftOfRecord(buildRecord({ state: 'draft' }), 'UTC').step).toBe(1)
  })
})

describe('a record like another', () => {
  it('takes the mix, the sprayer and the purpose, and nothing of when and where', () => {
    expect(draftLike(buildRecord())).toMatchObject({
      step: 1, blockId: '', plain: { purpose: 'roots', notes: '' }, sprayerId: 's1', revision: null, start: { date: '' }, weather: { wind: { value: '' } },
    })
  })
})

describe('the farm’s clock', () => {
  it('keeps which of two equal times an instant was', () => {
    expect(momentAt('America/Los_Angeles', '2026-11-01T08:30:40Z')).toEqual({ date: '2026-11-01', time: '01:30', offset: '-07:00' })
    expect(momentAt('America/Los_Angeles', '2026-11-01T09:30:40Z')).toEqual({ date: '2026-11-01', time: '01:30', offset: '-08:00' })
    expect(momentAt('America/Los_Angeles', '2026-06-16T13:50:59Z')).toEqual({ date: '2026-06-16', time: '06:50', offset: '' })
  })

  it.each([
    { start: { date: '2026-06-16', time: '06:50' }, end: '07:36', on: '2026-06-16' },
    { start: { date: '2026-06-16', time: '22:50' }, end: '01:10', on: '2026-06-17' },
    { start: { date: '2026-12-31', time: '22:50' }, end: '00:10', on: '2027-01-01' },
    { start: { date: '2026-06-16', time: '06:50' }, end: '06:50', on: '2026-06-16' },
    { start: { date: '2026-06-16', time: '' }, end: '06:50', on: '2026-06-16' },
    { start: { date: '', time: '06:50' }, end: '07:50', on: '' },
  ])('work from $start.time to $end ends on $on', ({ start, end, on }) => {
    expect(endDate(start, end)).toBe(on)
  })
})

describe('how a material may be measured out', () => {
  it('has no parts of water for what is weighed', () => {
    expect(basisKinds({ measuredIn: 'mass' })).toEqual(['perArea', 'perTank'])
    expect(basisUnits('perArea', { measuredIn: 'mass' })).toEqual(['kg/ha', 'lb/acre'])
    expect(basisUnits('perTank', { measuredIn: 'mass' })).toContain('kg')
  })

  it('has all three for what is poured', () => {
    expect(basisKinds({ measuredIn: 'volume' })).toEqual(['ratio', 'perArea', 'perTank'])
    expect(basisUnits('perArea', { measuredIn: 'volume' })).not.toContain('kg/ha')
  })
})
