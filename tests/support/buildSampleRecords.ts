import type { RecordReportData } from '../../server/reports/recordReportData.ts'
import type { BlockLine } from '../../shared/contract/recordContent.ts'
import type { SignedRecord } from '../../shared/contract/signedRecord.ts'
import { upgradeSigned } from '../../shared/records/upgradeSigned.ts'
import { buildRecordReportData } from './buildRecordReportData.ts'
import { buildCheck, buildSignedBlock, buildSignedRecord } from './buildSignedRecord.ts'

const base = buildSignedRecord()
const firstLine = base.content.lines[0]
if (!firstLine) throw new Error('the base record has no line')
const line = (overrides: Partial<BlockLine>): BlockLine => ({ ...firstLine, amount: null, ...overrides })

/** Blocks of about half a hectare side by side, from west to east. */
export function buildStrips(count: number): SignedRecord['blocks'] {
  return Array.from({ length: count }, (_none, index) => {
    const west = -123.3160 + (index % 6) * 0.00092
    const south = 44.6085 + Math.floor(index / 6) * 0.0008
    const ring: [number, number][] = [[west, south], [west + 0.00088, south + 0.00002], [west + 0.0009, south + 0.00072], [west + 0.00003, south + 0.0007], [west, south]]
    return buildSignedBlock({
      id: `strip-${index + 1}`, code: `K${index + 1}`, name: `Kitchen strip ${index + 1}`, crop: index % 2 === 0 ? 'Leek' : 'Chard', version: 1 + (index % 3),
      geometry: { type: 'Polygon', coordinates: [ring] }, areaM2: String(5450.25 + index * 13.125),
    })
  })
}

const soapLabel = {
  reEntryHours: '12', preHarvestDays: 4, minDilution: null, maxDilution: null, maxRate: null, maxSeasonRate: null, maxApplications: null, minIntervalDays: null,
} as unknown as SignedRecord['materials'][number]['label']
const labelled = base.materials.map((material, index) => (index === 1 ? { ...material, label: soapLabel } : material))

const at = (time: string): string => `2026-06-16T${time}:00Z`

/** One tank over six blocks with times of their own, two of them in part. */
export function buildSixBlocks(): SignedRecord {
  const blocks = buildStrips(6)
  const inside: [number, number][] = [[-123.3151, 44.6086], [-123.31425, 44.6086], [-123.31425, 44.60885], [-123.3151, 44.60885], [-123.3151, 44.6086]]
  const parts: BlockLine['part'][] = [
    { kind: 'whole' }, { kind: 'drawn', geometry: { type: 'Polygon', coordinates: [inside] } }, { kind: 'rows', from: 3, to: 8, of: 12 },
    { kind: 'whole' }, { kind: 'fraction', fraction: '0.5' }, { kind: 'whole' },
  ]
  const lines = blocks.map(({ id }, index) => line({
    blockId: id, part: parts[index] ?? { kind: 'whole' }, stage: index < 3 ? 'six leaves' : 'eight leaves', bbch: index < 3 ? '16' : null,
    startedAt: at(`${13 + Math.floor(index / 2)}:${index % 2 ? '32' : '04'}`), endedAt: at(`${13 + Math.floor(index / 2)}:${index % 2 ? '55' : '27'}`),
    amount: { value: (120.4 + index * 11.3).toFixed(1), unit: 'L', known: index % 2 ? 'measured' : 'counted' },
  }))
  return buildSignedRecord({
    blocks, materials: labelled, sprayer: { id: 'x', code: 'M2', name: 'mist sprayer', tankL: '400', flowLPerMin: '14.5' },
    content: {
      ...base.content, lines,
      components: base.content.components.map((component, index) => (index === 0 ? { ...component, used: { value: '40', unit: 'L', known: 'measured' } } : component)),
      licence: 'PA 1143, private applicator', protection: ['gloves', 'eyes', 'longSleeves'], notes: 'Wind turned to the north after the third block.',
    },
    files: [
      { id: 'f1', label: 'Tank mark after the last block', type: 'image/jpeg', bytes: 1_834_201, digest: '9f86d081884c7d659a2feaa0c55ad015a3bf4f1b2b0b822cd15d6c15b0f00a08' },
      { id: 'f2', label: 'Soap label', type: 'application/pdf', bytes: 88_120, digest: '2c26b46b68ffc68ff99b453c1d30413413422d706483bfa0f98a5e886266e7ae' },
    ],
    times: { ...base.times, startedAt: at('13:04'), endedAt: at('15:55'), receivedAt: '2026-06-16T16:12:04Z', deviceAt: '2026-06-16T16:11:58Z' },
  })
}

/** A drench per plant and bed, sized by the plant, with beds said from–to. */
export function buildPlantDrench(): SignedRecord {
  const blocks = buildStrips(2)
  return buildSignedRecord({
    blocks, sprayer: { id: 'x', code: 'D1', name: 'drench lance', tankL: '378.5412', flowLPerMin: null },
    content: {
      ...base.content, method: 'drench',
      lines: [
        line({ blockId: 'strip-1', part: { kind: 'beds', from: 3, to: 8, of: 12 }, counts: { plant: '240' }, stage: 'six leaves' }),
        line({ blockId: 'strip-2', counts: { plant: '1125', rowM: '310.5' }, stage: 'six leaves', startedAt: at('14:44'), endedAt: at('15:37') }),
      ],
      components: [
        { materialId: base.materials[0]!.id, lotId: base.lots[0]!.id, basis: { kind: 'ratio', parts: '50', reading: 'in' }, used: null },
        { materialId: base.materials[1]!.id, lotId: null, basis: { kind: 'perEach', value: '1.5', unit: 'mL', each: 'plant' }, used: { value: '2', unit: 'L', known: 'counted' } },
      ],
      water: { sizedFrom: 'perEach', value: '0.75', unit: 'L', each: 'plant', source: 'Rain tank 1' },
      weather: null,
    },
    checks: [buildCheck({ code: 'law', verdict: 'unknown', rests: 'law', about: null, figure: null, source: null, title: { id: 'checks.law.title', params: {} }, text: { id: 'checks.law.none', params: {} } })],
  })
}

/** A solid by weight over whole blocks, worked in the day after. */
export function buildSolidSpread(): SignedRecord {
  const compost = { ...base.materials[0]!, id: 'compost', name: 'Yard compost', measuredIn: 'mass' as const }
  const meal = { ...base.materials[0]!, id: 'meal', name: 'Basalt meal', measuredIn: 'mass' as const }
  const content: SignedRecord['content'] = {
    ...base.content, method: 'solid', water: null, sprayerId: null, workedInOn: '2026-06-17',
    lines: base.content.lines.map(({ blockId }) => line({ blockId })),
    components: [
      { materialId: 'compost', lotId: null, basis: { kind: 'perArea', value: '2500', unit: 'kg/ha' }, used: { value: '4750', unit: 'kg', known: 'counted' } },
      { materialId: 'meal', lotId: null, basis: { kind: 'perArea', value: '250', unit: 'kg/ha' }, used: null },
    ],
  }
  return buildSignedRecord({ sprayer: null, materials: [compost, meal], lots: [], content, checks: [] })
}

const REASON = 'The second load went on A2, not on A3: the tank book was read wrongly.'

/** The second version of a record. */
export function buildAmended(): RecordReportData {
  return buildRecordReportData({
    signed: buildSignedRecord({ entry: 'amended', replaces: '77e0'.padEnd(64, 'b'), reason: REASON, record: { ...base.record, version: 2, seq: 1851 } }),
    reviews: [{ by: 'Marl Hensley', at: '2026-06-18T17:05:00Z', note: 'Tank book seen.' }],
  })
}

/** A record taken back. */
export function buildWithdrawn(): RecordReportData {
  return buildRecordReportData({
    state: 'withdrawn',
    signed: buildSignedRecord({ entry: 'withdrawn', replaces: '77e0'.padEnd(64, 'b'), reason: 'Entered twice: 2026-0142 is the same work.', record: { ...base.record, version: 3, seq: 1860 } }),
  })
}

/** A text of the first schema, as it was signed, read by today's program. */
export function buildFirstSchema(): SignedRecord {
  const { entry: _entry, replaces: _replaces, files: _files, ...old } = structuredClone(base)
  const { areaM2, totalL, waterL, sprayLPerHa, loads, components } = old.computed
  const { full = 0, tankL = '', lastL = '', lastAreaHa = '' } = loads ?? {}
  const content = {
    ...old.content,
    lines: old.content.lines.map(({ blockId, startedAt, endedAt, amount }) => ({ blockId, part: { kind: 'whole' }, startedAt, endedAt, amount })),
  }
  const computed = { areaM2, totalL, waterL, sprayLPerHa, loads: { full, tankL, lastL, lastAreaHa }, components }
  return upgradeSigned({ ...old, schemaVersion: 1, content, computed } as unknown as Parameters<typeof upgradeSigned>[0])
}
