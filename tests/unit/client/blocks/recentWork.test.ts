import { describe, expect, it } from 'vitest'
import type { RegisterRow } from '../../../../shared/contract/record.ts'
import { recentWork } from '../../../../src/composables/map/recentWork.ts'

const NOW = new Date('2026-06-13T12:00:00Z')
const row = (facts: Partial<RegisterRow>): RegisterRow => ({
  id: 'r', state: 'signed', number: '2026-0001', season: 2026, version: 1, method: 'foliar', startedAt: '2026-06-12T06:00:00Z', endedAt: null, signedAt: null,
  blocks: [{ id: 'a', code: 'A' }], preparations: [], lots: [], areaHa: '1', totalL: null, totalKg: null, sprayLPerHa: null, sprayPerEach: null, kgPerHa: null, by: 'Oda',
  lateHours: null, tally: { stop: 0, caution: 0, unknown: 0 }, ...facts,
})

describe('recentWork', () => {
  it('tells foliar from what goes to the soil, block by block', () => {
    const found = recentWork([row({}), row({ method: 'drench', blocks: [{ id: 'a', code: 'A' }, { id: 'b', code: 'B' }] })], NOW)
    expect(found.get('a')).toEqual({ foliar: true, drench: true })
    expect(found.get('b')).toEqual({ foliar: false, drench: true })
  })

  it.each([
    ['older than three days', { startedAt: '2026-06-10T11:59:00Z' }],
    ['not begun', { state: 'draft', startedAt: null }],
    ['withdrawn', { state: 'withdrawn' }],
  ] as const)('leaves out what is %s', (_what, facts) => {
    expect(recentWork([row(facts)], NOW).size).toBe(0)
  })
})
