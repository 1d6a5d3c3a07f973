import type { LabelLimits } from '../../../shared/contract/input.ts'
import type { FactLot, FactMaterial, RecordFacts } from '../../../shared/checks/recordFacts.ts'
import type { RecordSheet, SheetComponent } from '../../../shared/mix/sheetTypes.ts'

/** A label that sets nothing but what a test names. */
export const buildLabel = (over: Partial<LabelLimits> = {}): LabelLimits => ({
  maxRate: null, minStrengthPct: null, maxStrengthPct: null, reEntryHours: null, preHarvestDays: null, source: 'part 3', ...over,
})

export const buildMaterial = (over: Partial<FactMaterial> = {}): FactMaterial => ({
  id: 'm1', name: 'Potash soap', organicStatus: 'allowed', statusBasis: 'System plan 2026, line 14', label: null, ...over,
})

export const buildLot = (over: Partial<FactLot> = {}): FactLot => ({
  id: 'l1', code: '26-018', origin: 'bought', receivedOn: '2026-03-02', expiresOn: null, left: { value: '11.4', unit: 'L' }, ...over,
})

export const buildSheetComponent = (over: Partial<SheetComponent> = {}): SheetComponent => ({
  amount: { value: '3.75', unit: 'L' }, inL: '3.75', inKg: null, perHa: '5', perFullLoad: '1.9', perLastLoad: '1.85',
  measure: { id: 'test.measure', params: {} }, ...over,
})

export const buildSheet = (over: Partial<RecordSheet> = {}): RecordSheet => ({
  areaM2: 7500, areaHa: 0.75, counts: {}, waterL: 746.25, totalL: 750, totalKg: null, sprayLPerHa: 1000, kgPerHa: null, sprayPerEach: null, loads: null,
  components: [buildSheetComponent()], water: { perHa: null, perFullLoad: null, perLastLoad: null }, appliedL: null, appliedKg: null, lines: [{ areaHa: 0.75, shareL: '750', shareKg: null, amountL: null, amountKg: null }], findings: [], ...over,
})

/** A foliar record of one block and one component, judged at noon UTC on 16 June 2026 on a farm in New York's zone. */
export const buildFacts = (over: Partial<RecordFacts> = {}): RecordFacts => ({
  content: {
    method: 'foliar',
    lines: [{ blockId: 'b1', startedAt: null, endedAt: null, amount: null }],
    components: [{ materialId: 'm1', lotId: 'l1' }],
    weather: {
      wind: { value: '2', unit: 'ms', kind: 'readHere' }, air: { value: '20', unit: 'degC', kind: 'station' }, humidity: { value: '50', unit: '%', kind: 'station' },
    },
  },
  sheet: buildSheet(),
  blocks: [{ id: 'b1', code: 'A3' }, { id: 'b2', code: 'A2' }],
  materials: [buildMaterial()],
  lots: [buildLot()],
  sprayer: null,
  zone: 'America/New_York',
  now: '2026-06-16T12:00:00Z',
  ...over,
})
