import { describe, expect, it } from 'vitest'
import { endAt, endMoment, momentAt } from '../../../../src/composables/record/lineDraft.ts'
import { basisChoices, basisUnits, choiceOf, chosenBasis } from '../../../../src/composables/record/mixUnits.ts'
import { readKeptDraft } from '../../../../src/composables/record/readKeptDraft.ts'
import { draftLike, draftOfRecord, emptyRecord } from '../../../../src/composables/record/recordDraft.ts'
import { buildDraft, buildLine, buildRecord } from './buildRecord.ts'

const zone = 'America/Los_Angeles'

describe('a record gone on with', () => {
  it('comes back as it was written, in step 2 once it was started', () => {
    const draft = draftOfRecord(buildRecord(), zone)
    expect(draft).toMatchObject({
      step: 2, method: 'drench', plain: { notes: 'wet' }, revision: 3,
      lines: [{ blockId: 'b1', start: { date: '2026-06-16', time: '06:50', offset: '' }, end: { time: '', nextDay: false }, part: { kind: 'whole' } }],
      weather: { wind: { value: '1.6', unit: 'ms', kind: 'felt' }, windFrom: 'NW', air: { value: '' } },
      water: { sizedFrom: 'sprayRate', value: '400', unit: 'L/ha', source: '' },
    })
    expect(draft.components.map(({ kind, value, unit, lotId }) => [kind, value, unit, lotId])).toEqual([['ratio', '20', 'L', 'l1'], ['perArea', '4', 'kg/ha', '']])
  })

  it('has each line with its part, counts, end on the next day and amount', () => {
    const line = { ...buildRecord().lines[0]!, part: { kind: 'rows' as const, from: 1, to: 4, of: 9 }, counts: { plant: '500' }, stage: 'in leaf', bbch: '15', endedAt: '2026-06-17T07:10:00Z', amount: { value: '50', unit: 'L' as const, known: 'counted' as const } }
    const [drafted] = draftOfRecord(buildRecord({ lines: [line] }), zone).lines
    expect(drafted).toMatchObject({
      part: { kind: 'rows', from: '1', to: '4', of: '9' }, counts: { plant: '500', bed: '' }, stage: 'in leaf', bbch: '15',
      end: { time: '00:10', nextDay: true }, amount: { value: '50', known: 'counted' },
    })
  })

  it('is in step 1 while it was only written', () => {
    expect(draftOfRecord(buildRecord({ state: 'draft' }), 'UTC').step).toBe(1)
  })
})

describe('a record like another', () => {
  it('takes the mix, the sprayer and the purpose, and nothing of when and where', () => {
    expect(draftLike(buildRecord())).toMatchObject({
      step: 1, lines: [], plain: { purpose: 'roots', notes: '' }, sprayerId: 's1', revision: null, weather: { wind: { value: '' } },
    })
  })
})

describe('a draft that an older program kept', () => {
  const first = {
    step: 2, method: 'drench', blockId: 'b1', plain: { purpose: 'roots', notes: 'wet' }, doneById: '', sprayerId: 's1',
    components: [{ key: 'k1', materialId: 'm1', lotId: 'l1', kind: 'ratio', value: '20', unit: 'L' }],
    water: { sizedFrom: 'sprayRate', value: '400', unit: 'L/ha', source: 'well' },
    weather: { wind: { value: '2', unit: 'ms', kind: 'felt' }, windFrom: 'N', air: { value: '', unit: 'degC', kind: 'readHere' }, humidity: { value: '', unit: '%', kind: 'readHere' } },
    start: { date: '2026-06-16', time: '22:50', offset: '' }, end: { date: '2026-06-17', time: '00:10', offset: '' }, amount: { value: '380', unit: 'L', known: 'measured' },
    stop: { why: 'a', told: '', done: '' }, revision: 4,
  }

  it('has its block, times and amount on a line, and everything else as it was', () => {
    const draft = readKeptDraft(first)
    expect(draft).toMatchObject({
      version: 2, step: 2, method: 'drench', sprayerId: 's1', revision: 4, plain: { purpose: 'roots', notes: 'wet', licence: '' }, stop: { why: 'a' }, protection: [],
      lines: [{ blockId: 'b1', start: { date: '2026-06-16', time: '22:50' }, end: { time: '00:10', nextDay: true }, amount: { value: '380', known: 'measured' }, part: { kind: 'whole' }, skipped: false }],
      components: [{ key: 'k1', value: '20', reading: 'to', each: 'plant', used: { known: 'workedOut' } }],
      water: { value: '400', source: 'well', each: 'plant', component: 0 }, weather: { windFrom: 'N', wind: { value: '2' } },
    })
    expect(draft).not.toHaveProperty('blockId')
  })

  it('has no line where no block was chosen and nothing timed', () => {
    expect(readKeptDraft({ ...first, blockId: '', start: { date: '2026-06-16', time: '', offset: '' }, end: { date: '', time: '', offset: '' } }).lines).toEqual([])
  })

  it('of this shape is read as it is', () => {
    const draft = buildDraft({ lines: [buildLine({ skipped: true })], protection: ['gloves'] })
    expect(readKeptDraft(JSON.parse(JSON.stringify(draft)))).toEqual(draft)
    expect(readKeptDraft({})).toMatchObject({ ...emptyRecord(), components: [{ kind: 'ratio' }] })
  })
})

describe('the farm’s clock', () => {
  it('keeps which of two equal times an instant was', () => {
    expect(momentAt(zone, '2026-11-01T08:30:40Z')).toEqual({ date: '2026-11-01', time: '01:30', offset: '-07:00' })
    expect(momentAt(zone, '2026-11-01T09:30:40Z')).toEqual({ date: '2026-11-01', time: '01:30', offset: '-08:00' })
    expect(momentAt(zone, '2026-06-16T13:50:59Z')).toEqual({ date: '2026-06-16', time: '06:50', offset: '' })
  })

  it('knows the next day of an end that happens now, and never infers it from two times', () => {
    expect(endAt(zone, '2026-06-17T07:10:00Z', '2026-06-16')).toEqual({ time: '00:10', offset: '', nextDay: true })
    expect(endAt(zone, '2026-06-16T14:36:00Z', '2026-06-16')).toEqual({ time: '07:36', offset: '', nextDay: false })
    const start = { date: '2026-12-31', time: '22:50', offset: '' }
    expect(endMoment({ start, end: { time: '00:10', offset: '', nextDay: true } }).date).toBe('2027-01-01')
    expect(endMoment({ start, end: { time: '00:10', offset: '', nextDay: false } }).date).toBe('2026-12-31')
  })
})

describe('how a material may be measured out', () => {
  it('has no parts of water for what is weighed', () => {
    expect(basisChoices({ measuredIn: 'mass' }, 'foliar')).toEqual(['perArea', 'plant', 'tree', 'rowM', 'bed', 'pot', 'perTank', 'total'])
    expect(basisUnits('perArea', { measuredIn: 'mass' })).toEqual(['kg/ha', 'lb/acre'])
    expect(basisUnits('perEach', { measuredIn: 'mass' })).toContain('g')
  })

  it('has neither water nor tank for what is spread dry', () => {
    expect(basisChoices({ measuredIn: 'volume' }, 'solid')).toEqual(['perArea', 'plant', 'tree', 'rowM', 'bed', 'pot', 'total'])
  })

  it('has both readings of a ratio for what is poured, and each choice comes back as itself', () => {
    const choices = basisChoices({ measuredIn: 'volume' }, 'drench')
    expect(choices.slice(0, 2)).toEqual(['ratioTo', 'ratioIn'])
    for (const choice of choices) expect(choiceOf({ kind: 'ratio', reading: 'to', each: 'plant', ...chosenBasis(choice) })).toBe(choice)
  })
})
