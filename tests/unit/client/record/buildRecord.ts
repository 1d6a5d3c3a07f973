import type { Block } from '../../../../shared/contract/block.ts'
import type { ApplicationRecord } from '../../../../shared/contract/record.ts'
import { emptyLine, type LineDraft } from '../../../../src/composables/record/lineDraft.ts'
import { emptyComponent, emptyRecord, type ComponentDraft, type RecordDraft } from '../../../../src/composables/record/recordDraft.ts'

/** A block of about a hectare, with its outline. */
export const buildBlock = (over: Partial<Block> = {}): Block => ({
  id: 'b1', code: 'A3', name: 'Long Bank 3', crop: null, areaM2: 10_000, perimeterM: 400, version: 1, revision: 1, createdAt: '2026-01-01T00:00:00Z',
  endedOn: null, endedBy: null, fromIds: [], intoIds: [], land: null, counts: { plants: null, beds: null, rows: null, rowM: null },
  geometry: { type: 'Polygon', coordinates: [[[-121, 38], [-120.9989, 38], [-120.9989, 38.0009], [-121, 38.0009], [-121, 38]]] }, ...over,
})

/** A line on the block of `buildBlock`, worked from 06:50 to 07:36. */
export const buildLine = (over: Partial<LineDraft> = {}): LineDraft => ({
  ...emptyLine('b1'), start: { date: '2026-06-16', time: '06:50', offset: '' }, end: { time: '07:36', offset: '', nextDay: false }, ...over,
})

/** One ingredient, 1 part to 20. */
export const buildComponent = (over: Partial<ComponentDraft> = {}): ComponentDraft => ({ ...emptyComponent(), key: 'k1', materialId: 'm1', lotId: 'l1', value: '20', ...over })

/** A form filled in far enough to be started: 750 L of water, one ingredient 1 to 20. */
export const buildDraft = (over: Partial<RecordDraft> = {}): RecordDraft => ({
  ...emptyRecord(),
  lines: [emptyLine('b1')],
  components: [buildComponent()],
  water: { sizedFrom: 'water', value: '750', unit: 'L', source: '', each: 'plant', component: 0 },
  ...over,
})

/** A record started on another device. */
export const buildRecord = (over: Partial<ApplicationRecord> = {}): ApplicationRecord => ({
  id: 'r1', state: 'started', number: null, season: null, version: 0, revision: 3, digest: null, seq: null,
  method: 'drench', purpose: 'roots', licence: null, notes: 'wet', workedInOn: null, protection: [], sprayerId: 's1', doneById: null,
  lines: [{ blockId: 'b1', part: { kind: 'whole' }, counts: {}, stage: null, bbch: null, startedAt: '2026-06-16T13:50:00Z', endedAt: null, amount: null }],
  components: [
    { materialId: 'm1', lotId: 'l1', basis: { kind: 'ratio', parts: '20', reading: 'to' }, used: null },
    { materialId: 'm2', lotId: null, basis: { kind: 'perArea', value: '4', unit: 'kg/ha' }, used: null },
  ],
  water: { sizedFrom: 'sprayRate', value: '400', unit: 'L/ha', source: null },
  weather: { wind: { value: '1.6', unit: 'ms', kind: 'felt' }, windFrom: 'NW', air: null, humidity: null },
  computed: {
    areaM2: 10_000, counts: {}, totalL: 400, totalKg: null, waterL: 380, sprayLPerHa: 400, kgPerHa: null, sprayPerEach: null, loads: null, components: [], lines: [], air: null,
  },
  reason: null, reviews: [],
  checks: [], acknowledged: [], doneBy: null, enteredBy: null, signedBy: null, signedAt: null, signedWith: null, deviceAt: null, receivedAt: '2026-06-16T13:51:00Z', clockSkewMinutes: null, ...over,
})
