import type { Check } from '../../shared/contract/record.ts'
import type { SignedRecord } from '../../shared/contract/signedRecord.ts'
import { presentComputed } from '../../shared/records/presentComputed.ts'
import { sheetOf } from '../../shared/records/sheetOf.ts'
import { signFigures } from '../../shared/records/signFigures.ts'

const id = (last: number): string => `01890000-0000-7000-8000-${String(last).padStart(12, '0')}`

type Block = SignedRecord['blocks'][number]

/** Long Bank 3 of the demo farm. */
export const LONG_BANK_3: Block['geometry'] = {
  type: 'Polygon',
  coordinates: [[
    [-123.3142097, 44.6089463], [-123.3142092, 44.6090527], [-123.3141998, 44.6091591], [-123.3141811, 44.6092655],
    [-123.3141575, 44.6093719], [-123.3141318, 44.6094784], [-123.3141062, 44.6095848], [-123.3157348, 44.6096387],
    [-123.3157211, 44.6095278], [-123.3157335, 44.6094169], [-123.3157684, 44.609306], [-123.3158171, 44.6091951],
    [-123.3158752, 44.6090842], [-123.3159365, 44.6089732], [-123.3142097, 44.6089463],
  ]],
}
/** Long Bank 2 of the demo farm. */
export const LONG_BANK_2: Block['geometry'] = {
  type: 'Polygon',
  coordinates: [[
    [-123.3140914, 44.6096477], [-123.3140697, 44.6097557], [-123.3140522, 44.6098636], [-123.3140394, 44.6099715],
    [-123.3140352, 44.6100794], [-123.3140373, 44.6101873], [-123.314043, 44.6102952], [-123.3158373, 44.6103762],
    [-123.3158838, 44.6102638], [-123.3158955, 44.6101514], [-123.3158769, 44.6100389], [-123.3158383, 44.6099265],
    [-123.3157934, 44.6098141], [-123.315752, 44.6097017], [-123.3140914, 44.6096477],
  ]],
}

export function buildSignedBlock(overrides: Partial<Block> = {}): Block {
  return {
    id: id(3), code: 'A3', name: 'Long Bank 3', crop: 'Apple, Marl Pippin', version: 3, geometry: LONG_BANK_3, areaM2: '8815.4', ...overrides,
  }
}

export function buildCheck(overrides: Partial<Check> = {}): Check {
  return {
    code: 'wind', verdict: 'pass', rests: 'house', about: 'wind',
    title: { id: 'checks.wind.title', params: {} },
    text: { id: 'checks.wind.within', params: { low: 1.3, high: 3.6, unit: 'ms' } },
    figure: { id: 'checks.figure.amount', params: { value: 1.9, unit: 'ms' } },
    source: { id: 'checks.wind.source', params: {} },
    band: null,
    ...overrides,
  }
}

/** Checks of every verdict and most things they rest on. */
export function buildChecks(): Check[] {
  const soap = 'Potash soap'
  return [
    buildCheck(),
    buildCheck({
      code: 'law', verdict: 'unknown', rests: 'law', about: null, figure: null, source: null,
      title: { id: 'checks.law.title', params: {} }, text: { id: 'checks.law.none', params: {} },
    }),
    buildCheck({
      code: 'label.strength', rests: 'label', about: 'component:1',
      title: { id: 'checks.labelStrength.title', params: {} },
      text: { id: 'checks.labelStrength.withinRange', params: { material: soap, part: 3.75, total: 791.3, low: 0.4, high: 2 } },
      figure: { id: 'checks.figure.percent', params: { value: 0.47 } },
      source: { id: 'checks.source.labelPart', params: { material: soap, part: 'part 4' } },
    }),
    buildCheck({
      code: 'label.re_entry', verdict: 'caution', rests: 'label', about: 'component:1',
      title: { id: 'checks.reEntry.title', params: { hours: 12 } },
      text: { id: 'checks.reEntry.until', params: { blocks: 'A3, A2', untilTime: '20:37', untilOn: '2026-06-16' } },
      figure: { id: 'checks.figure.time', params: { time: '20:37' } },
      source: { id: 'checks.source.labelPart', params: { material: soap, part: 'part 2' } },
    }),
    buildCheck({
      code: 'status', rests: 'certifier', about: 'component:1', figure: null, source: null,
      title: { id: 'checks.status.title', params: { material: soap } },
      text: { id: 'checks.status.allowed', params: { basis: 'system plan 2026, line 14' } },
    }),
    buildCheck({
      code: 'lot.use', rests: 'recipe', about: 'component:0', source: null,
      title: { id: 'checks.lotUse.title', params: { lot: 'NF-31' } },
      text: { id: 'checks.lotUse.within', params: { material: 'Nettle ferment', expiresOn: '2026-06-26' } },
      figure: { id: 'checks.figure.date', params: { dayOn: '2026-06-26' } },
    }),
  ]
}

const content: SignedRecord['content'] = {
  method: 'foliar',
  lines: [
    { blockId: id(3), part: { kind: 'whole' }, counts: {}, stage: null, bbch: null, startedAt: '2026-06-16T13:50:00Z', endedAt: '2026-06-16T14:36:00Z', amount: { value: '372.0', unit: 'L', known: 'measured' } },
    { blockId: id(2), part: { kind: 'whole' }, counts: {}, stage: null, bbch: null, startedAt: '2026-06-16T14:44:00Z', endedAt: '2026-06-16T15:37:00Z', amount: { value: '419.3', unit: 'L', known: 'measured' } },
  ],
  components: [
    { materialId: id(11), lotId: id(21), basis: { kind: 'ratio', parts: '20', reading: 'to' }, used: null },
    { materialId: id(12), lotId: id(22), basis: { kind: 'perTank', value: '1.9', unit: 'L' }, used: null },
  ],
  water: { sizedFrom: 'water', value: '750', unit: 'L', source: 'Rain tank 2' },
  sprayerId: id(31),
  workedInOn: null,
  weather: {
    wind: { value: '1.9', unit: 'ms', kind: 'readHere' }, windFrom: 'NW',
    air: { value: '14.5', unit: 'degC', kind: 'station' }, humidity: { value: '74', unit: '%', kind: 'station' },
  },
  protection: ['gloves', 'eyes'],
  purpose: 'Aphids on shoot tips',
  licence: null,
  notes: null,
  doneById: id(41),
}

const base: Omit<SignedRecord, 'computed'> = {
  schemaVersion: 2,
  entry: 'signed',
  replaces: null,
  farm: { id: id(1), name: 'Wennick Hollow', zone: 'America/Los_Angeles', seasonStart: '01-01' },
  record: { id: id(5), number: '2026-0143', season: 2026, version: 1, seq: 1844 },
  content,
  blocks: [
    buildSignedBlock(),
    buildSignedBlock({ id: id(2), code: 'A2', name: 'Long Bank 2', crop: 'Apple, Hollow Russet', version: 2, geometry: LONG_BANK_2, areaM2: '9945.5' }),
  ],
  materials: [
    { id: id(11), name: 'Nettle ferment', kind: 'ferment', measuredIn: 'volume', organicStatus: 'allowed', statusBasis: 'own making', label: null },
    { id: id(12), name: 'Potash soap', kind: 'soap', measuredIn: 'volume', organicStatus: 'allowed', statusBasis: 'system plan 2026, line 14', label: null },
  ],
  lots: [
    { id: id(21), code: 'NF-31', materialId: id(11), origin: 'made', source: null, expiresOn: '2026-06-26' },
    { id: id(22), code: '26-018', materialId: id(12), origin: 'bought', source: 'Marl Supply', expiresOn: null },
  ],
  sprayer: { id: id(31), code: 'M2', name: 'mist sprayer', tankL: '400', flowLPerMin: null },
  checks: buildChecks(),
  acknowledged: [],
  people: { doneBy: { id: id(41), digest: 'a' }, enteredBy: { id: id(41), digest: 'a' }, signedBy: { id: id(41), digest: 'a' } },
  times: {
    startedAt: '2026-06-16T13:50:00Z', endedAt: '2026-06-16T15:37:00Z', deviceAt: '2026-06-16T16:11:58Z',
    receivedAt: '2026-06-16T16:12:04Z', signedAt: '2026-06-16T16:12:40Z',
  },
  files: [],
  reason: null,
}

/** A valid signed record; a test names only what it is about. Figures are the sheet's own unless given. */
export function buildSignedRecord(overrides: Partial<SignedRecord> = {}): SignedRecord {
  const signed = { ...base, ...overrides }
  return { ...signed, computed: overrides.computed ?? computeSigned(signed) }
}

function computeSigned({ content, blocks, sprayer, materials, farm }: Omit<SignedRecord, 'computed'>): SignedRecord['computed'] {
  const sheet = sheetOf(content, { blocks, sprayer })
  return signFigures(presentComputed({ content, sheet, materials, zone: farm.zone }))
}
