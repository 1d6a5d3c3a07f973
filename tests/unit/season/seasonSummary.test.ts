import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { seasonDigest } from '../../../shared/evidence/seasonDigest.ts'
import { openSeasonSummary, type SummarisedRecord } from '../../../shared/season/openSeasonSummary.ts'
import { landFigures } from '../../../shared/records/landFigures.ts'
import { sumRegisterRows } from '../../../shared/register/sumRegisterRows.ts'

/** amountL: what was written on the line; its share of the mix where nothing else is said. */
interface Line { block: string; areaM2: number; shareL: string; amountL?: string; known: 'measured' | 'counted' | 'workedOut' | null }
const M2_PER_HA = 10_000
const amountOf = ({ known, shareL, amountL }: Line) => ({ amount: known === null ? null : { value: amountL ?? shareL, unit: 'L' as const, known } })
const sum = (values: readonly (number | string)[]): number => values.reduce<number>((total, value) => total + Number(value), 0)

const buildRecord = (lines: readonly Line[], changes: Partial<SummarisedRecord['row']> = {}, state: SummarisedRecord['state'] = 'signed', totalKg: number | null = null): SummarisedRecord => ({
  state,
  row: {
    number: '2026-0001', season: 2026, version: 1, method: 'foliar', startedAt: '2026-06-16T13:00:00Z', endedAt: '2026-06-16T14:00:00Z', signedAt: '2026-06-16T15:00:00Z',
    blocks: lines.map(({ block }) => ({ id: block, code: block })), preparations: [], lots: [],
    areaHa: String(sum(lines.map(({ areaM2 }) => areaM2)) / M2_PER_HA),
    ...landFigures(lines.map(amountOf), { areaHa: 1, totalL: sum(lines.map(({ shareL }) => shareL)), totalKg, sprayPerEach: null }), by: 'Tam Lisk', lateHours: null, tally: { stop: 0, caution: 0, unknown: 0 }, ...changes,
  },
  content: { lines: lines.map((line) => ({
    blockId: line.block, part: { kind: 'whole' as const }, counts: {}, stage: null, bbch: null, startedAt: '2026-06-16T13:00:00Z', endedAt: '2026-06-16T14:00:00Z', ...amountOf(line),
  })) },
  computed: {
    totalL: sum(lines.map(({ shareL }) => shareL)), totalKg,
    lines: lines.map(({ areaM2, shareL }) => ({ areaM2, shareL, shareKg: totalKg === null ? null : String(totalKg / lines.length), reEntryUntil: null, pickFrom: null })),
  },
})

const summarise = (records: readonly SummarisedRecord[]) => {
  const summary = openSeasonSummary('America/Los_Angeles')
  for (const record of records) summary.add(record)
  return summary.finish()
}

const line = fc.record({
  block: fc.constantFrom('A1', 'A2', 'P1', 'N1'), areaM2: fc.integer({ min: 1, max: 50_000 }), shareL: fc.integer({ min: 1, max: 90_000 }).map((tenths) => String(tenths / 10)), amountL: fc.integer({ min: 1, max: 90_000 }).map((tenths) => String(tenths / 10)),
  known: fc.constantFrom('measured' as const, 'workedOut' as const, null),
})
const record = fc.tuple(fc.array(line, { minLength: 1, maxLength: 6 }), fc.boolean(), fc.boolean(), fc.option(fc.integer({ min: 1, max: 500 }))).map(([lines, isWithdrawn, isOld, totalKg]) => {
  const made = buildRecord(lines, {}, isWithdrawn ? 'withdrawn' : 'signed', totalKg)
  return isOld ? { ...made, computed: { ...made.computed, lines: [] } } : made
})

describe('the summary of a season', () => {
  it('comes to what the register adds up to, whatever was recorded', () => {
    fc.assert(fc.property(fc.array(record, { maxLength: 30 }), (records) => {
      const { figures, blocks } = summarise(records)
      const sums = sumRegisterRows(records.map(({ state, row }) => ({ ...row, state })))
      const total = (name: 'areaHa' | 'litres' | 'kg') => blocks.reduce((sum, block) => sum + Number(block[name]), 0)
      expect(figures.signed).toBe(sums.signed)
      expect(figures.withdrawn).toHaveLength(sums.withdrawn)
      expect(total('areaHa')).toBeCloseTo(Number(sums.areaHa), 6)
      expect(total('litres')).toBeCloseTo(Number(sums.totalL), 4)
      expect(total('kg')).toBeCloseTo(Number(sums.totalKg), 4)
      expect(Number(figures.areaHa)).toBeCloseTo(Number(sums.areaHa), 6)
      expect(Number(figures.litresMeasured)).toBeLessThanOrEqual(Number(figures.litres))
    }), { numRuns: 200 })
  })

  it('counts a record of two blocks as one pass on each, and keeps the day of the farm', () => {
    const { blocks, figures } = summarise([buildRecord([
      { block: 'A2', areaM2: 10_000, shareL: '400', known: 'measured' }, { block: 'A1', areaM2: 5_000, shareL: '200', known: 'workedOut' },
    ], { startedAt: '2026-06-16T03:00:00Z' })])
    expect(blocks.map(({ code, foliar, areaHa, litres }) => ({ code, foliar, areaHa, litres }))).toEqual([
      { code: 'A1', foliar: 1, areaHa: '0.5', litres: '200' }, { code: 'A2', foliar: 1, areaHa: '1', litres: '400' },
    ])
    expect(figures).toMatchObject({ signed: 1, litres: '600', litresMeasured: '400', from: '2026-06-16', to: '2026-06-16' })
  })

  it('tells what was signed with a stop, entered late and not known, each once a record', () => {
    const one: Line = { block: 'A1', areaM2: 1, shareL: '1', known: null }
    const { figures } = summarise([
      buildRecord([one, one], { number: '2026-0003', lateHours: 30, tally: { stop: 2, caution: 0, unknown: 3 } }), buildRecord([one], { number: '2026-0002', lateHours: 169 }),
      buildRecord([one], { number: '2026-0009', lateHours: 200, tally: { stop: 1, caution: 0, unknown: 1 } }, 'withdrawn'),
    ])
    expect(figures).toMatchObject({ signed: 2, withdrawn: ['2026-0009'], first: '2026-0002', last: '2026-0003', stops: 1, late: 2, veryLate: 1, unknown: 1 })
  })
})

describe('the digest of a season', () => {
  const entries = [1, 2, 5].map((seq) => ({ seq, digest: String(seq).repeat(64).slice(0, 64) }))
  const whole = seasonDigest('farm', 2026, entries)

  it.each([
    ['changed', entries.map((entry) => (entry.seq === 2 ? { ...entry, digest: 'f'.repeat(64) } : entry))],
    ['taken out', entries.filter(({ seq }) => seq !== 2)],
    ['slipped in', [...entries.slice(0, 2), { seq: 4, digest: 'a'.repeat(64) }, ...entries.slice(2)]],
  ])('is another where an entry was %s', (_what, other) => {
    expect(seasonDigest('farm', 2026, other)).not.toBe(whole)
  })

  it('is that of the canonical text, which anybody can hash with other tools', () => {
    // printf '{"entries":[[1,"11…"]],"farmId":"farm","season":2026}' | sha256sum (GNU coreutils 9.1), the digest 64 times "1".
    expect(seasonDigest('farm', 2026, entries.slice(0, 1))).toBe('cbce6461965ebd0da066f7d18c8202dd16c2edd484c861cb833b97da2022e54f')
  })

  it('takes entries in their order alone', () => {
    expect(() => seasonDigest('farm', 2026, [...entries].reverse())).toThrow(RangeError)
  })
})
