import type { Method, RecordContentInput } from '../../shared/contract/recordContent.ts'

/** One kind of work that the demo farm repeats: which blocks, what goes in, how it is sized. */
export interface DemoWork {
  blocks: string[]
  method: Method
  everyDays: number
  sprayer: string
  purpose: string
  water: NonNullable<RecordContentInput['water']>
  components: { material: string; basis: NonNullable<RecordContentInput['components']>[number]['basis'] }[]
  minutes: number
  /** Clock time of the first block's start, and how many days ago the last round went. */
  from: string
  lastDaysAgo: number
  /** Parts of water in the newest round where it went wrong. */
  strongOnce?: string
  by: 'tam' | 'ruan' | 'oda'
}

const rate = (value: string) => ({ sizedFrom: 'sprayRate', value, unit: 'L/ha', source: 'Rain tank 2' }) as const
const litres = (value: string) => ({ sizedFrom: 'water', value, unit: 'L', source: 'Rain tank 1' }) as const
const parts = (n: string) => ({ kind: 'ratio', parts: n }) as const

/** The farm's year in eight kinds of work; amounts are of a size that people really spray and drench. */
export const DEMO_WORK: DemoWork[] = [
  { blocks: ['A1', 'A2', 'A3', 'A4', 'A5'], method: 'foliar', everyDays: 13, sprayer: 'M2', purpose: 'Leaf strength before bloom and after', water: rate('425'), components: [{ material: 'nettle', basis: parts('40') }], minutes: 46, from: '05:50', lastDaysAgo: 1, by: 'tam' },
  { blocks: ['P1', 'P2', 'P3'], method: 'foliar', everyDays: 17, sprayer: 'M2', purpose: 'Leaf strength', water: rate('440'), components: [{ material: 'nettle', basis: parts('50') }], minutes: 52, from: '06:05', lastDaysAgo: 2, by: 'tam' },
  { blocks: ['C1', 'C2', 'L1'], method: 'foliar', everyDays: 23, sprayer: 'M2', purpose: 'Firm skins', water: rate('400'), components: [{ material: 'eggshell', basis: parts('500') }], minutes: 41, from: '06:20', lastDaysAgo: 3, by: 'ruan' },
  { blocks: ['S1', 'S2', 'S3'], method: 'foliar', everyDays: 19, sprayer: 'M2', purpose: 'Mildew on young leaves', water: rate('480'), components: [{ material: 'horsetail', basis: parts('30') }], minutes: 25, from: '18:40', lastDaysAgo: 4, by: 'oda' },
  { blocks: ['T1', 'T2'], method: 'drench', everyDays: 9, sprayer: 'D1', purpose: 'Soil life in the tunnel beds', water: litres('320'), components: [{ material: 'leafMould', basis: parts('20') }], minutes: 35, from: '05:05', lastDaysAgo: 0, by: 'ruan' },
  { blocks: ['H1'], method: 'drench', everyDays: 16, sprayer: 'D1', purpose: 'Feed after cutting', water: litres('300'), components: [{ material: 'comfrey', basis: parts('15') }], minutes: 30, from: '07:10', lastDaysAgo: 6, by: 'ruan' },
  { blocks: ['V6'], method: 'foliar', everyDays: 31, sprayer: 'M2', purpose: 'Aphids on shoot tips', water: rate('510'), components: [{ material: 'soap', basis: { kind: 'ratio', parts: '100' } }], minutes: 38, from: '18:30', lastDaysAgo: 4, strongOnce: '40', by: 'tam' },
  // Its label keeps everybody out for a day and picking back for a week: on the demo farm something is always held.
  { blocks: ['N1'], method: 'foliar', everyDays: 31, sprayer: 'M2', purpose: 'Scab on young leaves', water: rate('500'), components: [{ material: 'sulphur', basis: { kind: 'perArea', value: '4', unit: 'kg/ha' } }], minutes: 48, from: '18:20', lastDaysAgo: 1, by: 'tam' },
]
