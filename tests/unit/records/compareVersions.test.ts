import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import { canonicalText } from '../../../shared/evidence/canonicalText.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import { LANGUAGES } from '../../../shared/messages/translate.ts'
import { compareVersions, pairVersions } from '../../../shared/records/compareVersions.ts'
import { buildCheck, buildSignedRecord, LONG_BANK_2, LONG_BANK_3 } from '../../support/buildSignedRecord.ts'

const standing = buildSignedRecord()
const [first, second] = standing.blocks.map(({ id }) => id) as [string, string]
const [nettle, soap] = standing.materials.map(({ id }) => id) as [string, string]
const [jar, sack] = standing.lots.map(({ id }) => id) as [string, string]
const personName = (id: string) => (id.endsWith('41') ? 'Tam Lisk' : 'Ruan Teal')
const change = (content: Partial<RecordContent>) => buildSignedRecord({ content: { ...standing.content, ...content } })
const paths = (after: ReturnType<typeof buildSignedRecord>) => compareVersions(standing, after, personName).map(({ path }) => path)

const value = fc.constantFrom('1', '12.5', '0.04', '400')
const amount = fc.option(fc.record({ value, unit: fc.constantFrom('L' as const, 'mL' as const), known: fc.constantFrom('measured' as const, 'workedOut' as const) }), { nil: null })
const moment = fc.option(fc.constantFrom('2026-06-16T13:50:00Z', '2026-06-16T14:50:00Z', '2026-06-16T13:50:30Z', '2026-11-01T08:30:00Z'), { nil: null })
const text = fc.option(fc.constantFrom('Rain tank 2', 'Well'), { nil: null })
const part = fc.constantFrom<RecordContent['lines'][number]['part'][]>(
  { kind: 'whole' }, { kind: 'fraction', fraction: '0.5' }, { kind: 'fraction', fraction: '0.25' }, { kind: 'rows', from: 1, to: 3, of: 9 }, { kind: 'beds', from: 1, to: 3, of: 9 },
  { kind: 'drawn', geometry: LONG_BANK_2 }, { kind: 'drawn', geometry: LONG_BANK_3 },
)
const line = fc.record({
  blockId: fc.constantFrom(first, second), part, counts: fc.constantFrom({}, { plant: '40' }, { plant: '40', bed: '2' }), stage: text, bbch: fc.constantFrom(null, '65'),
  startedAt: moment, endedAt: moment, amount,
})
const basis = fc.oneof(
  fc.record({ kind: fc.constant('ratio' as const), parts: value, reading: fc.constantFrom('to' as const, 'in' as const) }),
  fc.record({ kind: fc.constant('perArea' as const), value, unit: fc.constantFrom('L/ha' as const, 'mL/ha' as const) }),
  fc.record({ kind: fc.constant('perEach' as const), value, unit: fc.constant('mL' as const), each: fc.constantFrom('plant' as const, 'pot' as const) }),
  fc.record({ kind: fc.constantFrom('perTank' as const, 'total' as const), value, unit: fc.constant('L' as const) }),
)
const component = fc.record({ materialId: fc.constantFrom(nettle, soap), lotId: fc.constantFrom(null, jar, sack), basis, used: amount })
const water = fc.option(fc.oneof(
  fc.record({ sizedFrom: fc.constant('water' as const), value, unit: fc.constant('L' as const), source: text }),
  fc.record({ sizedFrom: fc.constant('sprayRate' as const), value, unit: fc.constant('L/ha' as const), source: text }),
  fc.record({ sizedFrom: fc.constant('perEach' as const), value, unit: fc.constant('L' as const), each: fc.constantFrom('tree' as const, 'bed' as const), source: text }),
  fc.record({ sizedFrom: fc.constant('jar' as const), component: fc.nat(1), value, unit: fc.constant('L' as const), source: text }),
  fc.constant({ sizedFrom: 'none' as const }),
), { nil: null })
const reading = <Unit extends string>(unit: Unit) => fc.record({ value, unit: fc.constant(unit), kind: fc.constantFrom('readHere' as const, 'felt' as const, 'station' as const, 'model' as const) })
const content: fc.Arbitrary<RecordContent> = fc.record({
  method: fc.constantFrom('foliar' as const, 'drench' as const, 'injected' as const),
  lines: fc.array(line, { minLength: 1, maxLength: 3 }), components: fc.array(component, { maxLength: 3 }), water,
  sprayerId: fc.constantFrom(null, standing.content.sprayerId), workedInOn: fc.constantFrom(null, '2026-06-17'),
  weather: fc.option(fc.record({ wind: reading('ms'), windFrom: fc.constantFrom(null, 'NW' as const), air: fc.option(reading('degC'), { nil: null }), humidity: fc.option(reading('%'), { nil: null }) }), { nil: null }),
  protection: fc.subarray(['gloves' as const, 'eyes' as const, 'boots' as const]), purpose: text, licence: text, notes: text,
  doneById: fc.constant(standing.content.doneById),
})
/** A second content that differs from the first in some fields only, often in none. */
const two = fc.tuple(content, content, fc.subarray(Object.keys(standing.content) as (keyof RecordContent)[]))
  .map(([one, other, taken]) => [one, { ...one, ...Object.fromEntries(taken.map((key) => [key, other[key]])) } as RecordContent] as const)

describe('comparing versions', () => {
  it('lists a difference exactly where the canonical texts of the contents differ, and its words differ', () => {
    fc.assert(fc.property(two, ([one, other]) => {
      // The figures stand still here: what follows from a change is not what is being looked for.
      const { computed } = standing
      const [before, after] = [one, other].map((content) => buildSignedRecord({ content, computed, sprayer: content.sprayerId === null ? null : standing.sprayer }))
      if (!before || !after) throw new Error('two records')
      const differences = compareVersions(before, after, personName).filter(({ path }) => path.startsWith('content.'))
      expect(differences.length > 0).toBe(canonicalText(one) !== canonicalText(other))
      for (const { path, label, before: was, after: is } of differences) {
        const [said, says] = [was, is].map((side) => side.map((message) => LANGUAGES.map((language) => renderMessage(language, message))).join(' '))
        expect(`${path} ${said}`).not.toBe(`${path} ${says}`)
        expect(label.map((message) => renderMessage('es', message)).every((words) => words !== '')).toBe(true)
      }
    }), { numRuns: 200 })
  })

  it('lists no difference between a version and itself, and pairs everything it says', () => {
    expect(compareVersions(standing, standing, personName)).toEqual([])
    const rows = pairVersions(standing, standing, personName)
    expect(rows.every(({ before, after }) => canonicalText(before) === canonicalText(after))).toBe(true)
    expect(rows.map(({ path }) => path)).toEqual(expect.arrayContaining(['content.water', 'content.lines.1.endedAt', 'content.components.1.basis', 'content.purpose', 'computed.totalL']))
  })

  it('says what followed from a change of water', () => {
    expect(paths(change({ water: { sizedFrom: 'water', value: '600', unit: 'L', source: 'Rain tank 2' } }))).toEqual(
      ['computed.components.0.amount', 'computed.components.1.amount', 'content.water', 'computed.totalL'])
  })

  it('keeps the lines apart by their block when one between them goes', () => {
    expect(paths(change({ lines: standing.content.lines.slice(1) }))).toEqual(expect.arrayContaining(['content.lines', 'content.lines.0.startedAt']))
    const differences = compareVersions(standing, change({ lines: standing.content.lines.slice(1) }), personName)
    const gone = differences.filter(({ label }) => label[0]?.params['text'] === 'A3')
    expect(gone.length).toBeGreaterThan(2)
    expect(gone.every(({ after }) => after.length === 0)).toBe(true)
    expect(differences.filter(({ label }) => label[0]?.params['text'] === 'A2')).toEqual([])
  })

  it('finds no difference in another spelling of the same instant', () => {
    const lines = standing.content.lines.map((one) => ({ ...one, startedAt: one.startedAt === null ? null : new Date(one.startedAt).toISOString() }))
    expect(paths(change({ lines }))).toEqual([])
  })

  it('says which stop came and which went, what was said of it, and which paper was added', () => {
    const stop = buildCheck({ code: 'label.rate', verdict: 'stop', title: { id: 'checks.labelRate.title', params: {} } })
    const after = buildSignedRecord({
      checks: [...standing.checks, stop], acknowledged: [{ code: 'label.rate', reason: 'Measured twice' }],
      files: [{ id: 'f', label: 'Tank, morning', type: 'image/jpeg', bytes: 10, digest: 'd' }],
    })
    const differences = compareVersions(standing, after, personName)
    expect(differences).toEqual([
      { path: 'files', label: [{ id: 'versions.label.files', params: {} }], before: [], after: [{ id: 'versions.text', params: { text: 'Tank, morning' } }] },
      { path: 'checks.stop', label: [{ id: 'versions.label.stops', params: {} }], before: [], after: [{ id: 'checks.labelRate.title', params: {} }] },
      { path: 'acknowledged.0', label: [{ id: 'versions.label.said', params: {} }, { id: 'checks.labelRate.title', params: {} }], before: [], after: [{ id: 'versions.text', params: { text: 'Measured twice' } }] },
    ])
  })

  it('names who did it', () => {
    const doneById = '01890000-0000-7000-8000-000000000042'
    const after = buildSignedRecord({ content: { ...standing.content, doneById }, people: { ...standing.people, doneBy: { id: doneById, digest: 'b' } } })
    expect(compareVersions(standing, after, personName)).toEqual([
      { path: 'content.doneById', label: [{ id: 'versions.label.doneBy', params: {} }], before: [{ id: 'versions.text', params: { text: 'Tam Lisk' } }], after: [{ id: 'versions.text', params: { text: 'Ruan Teal' } }] },
    ])
  })
})
