import type { BedKind } from '../../shared/contract/bed.ts'
import type { FarmEventKind } from '../../shared/contract/farmEvent.ts'
import type { SoilContact } from '../../shared/contract/planting.ts'

/** What a crop of the demo farm is beside its name: EPPO code, what is eaten, when it was planted and is picked (MM-DD). */
export interface DemoCrop {
  eppo: string | null
  ediblePart: string
  soilContact: SoilContact
  /** A year for what stands for years; days ago for what is sown anew. */
  planted: { year: number } | { daysAgo: number }
  picks: { from: string; to: string; note: string | null }[]
}

export const DEMO_CROPS: Record<string, DemoCrop> = {
  'Apple': { eppo: 'MABSD', ediblePart: 'Fruit', soilContact: 'none', planted: { year: 2014 }, picks: [{ from: '09-08', to: '09-30', note: null }] },
  'Apple, young': { eppo: 'MABSD', ediblePart: 'Fruit', soilContact: 'none', planted: { year: 2025 }, picks: [] },
  'Pear': { eppo: 'PYUCO', ediblePart: 'Fruit', soilContact: 'none', planted: { year: 2012 }, picks: [{ from: '08-20', to: '09-12', note: null }] },
  'Cherry': { eppo: 'PRNAV', ediblePart: 'Fruit', soilContact: 'none', planted: { year: 2016 }, picks: [{ from: '06-28', to: '07-16', note: null }] },
  'Plum': { eppo: 'PRNDO', ediblePart: 'Fruit', soilContact: 'none', planted: { year: 2016 }, picks: [{ from: '08-10', to: '08-31', note: null }] },
  'Raspberry': { eppo: 'RUBID', ediblePart: 'Fruit', soilContact: 'splash', planted: { year: 2021 }, picks: [{ from: '06-24', to: '07-31', note: null }] },
  'Blackcurrant': { eppo: 'RIBNI', ediblePart: 'Fruit', soilContact: 'splash', planted: { year: 2020 }, picks: [{ from: '07-05', to: '07-25', note: null }] },
  'Strawberry': { eppo: 'FRAAN', ediblePart: 'Fruit', soilContact: 'touches', planted: { year: 2024 }, picks: [{ from: '05-28', to: '07-04', note: null }] },
  'Herbs': { eppo: null, ediblePart: 'Leaf', soilContact: 'splash', planted: { year: 2022 }, picks: [{ from: '06-20', to: '06-30', note: 'First cut' }, { from: '08-25', to: '09-05', note: 'Second cut' }] },
  'Tomato': { eppo: 'LYPES', ediblePart: 'Fruit', soilContact: 'none', planted: { daysAgo: 58 }, picks: [{ from: '07-10', to: '10-10', note: null }] },
  'Cucumber': { eppo: 'CUMSA', ediblePart: 'Fruit', soilContact: 'none', planted: { daysAgo: 44 }, picks: [{ from: '07-01', to: '09-20', note: null }] },
  'Lettuce': { eppo: 'LACSA', ediblePart: 'Leaf', soilContact: 'touches', planted: { daysAgo: 40 }, picks: [{ from: '06-22', to: '07-20', note: null }] },
  'Brassicas': { eppo: null, ediblePart: 'Leaf', soilContact: 'splash', planted: { daysAgo: 36 }, picks: [{ from: '09-15', to: '11-20', note: null }] },
  'Onion': { eppo: 'ALLCE', ediblePart: 'Bulb', soilContact: 'in_soil', planted: { daysAgo: 92 }, picks: [{ from: '08-15', to: '09-05', note: null }] },
  'Potato': { eppo: 'SOLTU', ediblePart: 'Tuber', soilContact: 'in_soil', planted: { daysAgo: 66 }, picks: [{ from: '08-20', to: '09-25', note: null }] },
  'Squash': { eppo: null, ediblePart: 'Fruit', soilContact: 'touches', planted: { daysAgo: 28 }, picks: [{ from: '09-20', to: '10-15', note: null }] },
  'Beans': { eppo: 'PHSCO', ediblePart: 'Pod', soilContact: 'none', planted: { daysAgo: 32 }, picks: [{ from: '07-20', to: '09-30', note: null }] },
}

/** Plants or trees that somebody counted. */
export const DEMO_COUNTS: Record<string, number> = { A1: 690, A2: 716, A3: 640, A4: 758, A5: 828, P1: 532, P2: 532, P3: 552, C1: 310, C2: 306, L1: 168, N1: 1790 }

interface DemoBeds { block: string; kind: BedKind; from: number; to: number; lengthM: string; widthM: string | null; plants: number | null }
export const DEMO_BEDS: DemoBeds[] = [
  { block: 'A3', kind: 'row', from: 1, to: 16, lengthM: '120', widthM: null, plants: 640 },
  { block: 'S3', kind: 'bed', from: 1, to: 14, lengthM: '95', widthM: '1.2', plants: 8400 },
  { block: 'T1', kind: 'bed', from: 1, to: 3, lengthM: '56', widthM: '0.8', plants: 420 },
  { block: 'T2', kind: 'bed', from: 4, to: 6, lengthM: '56', widthM: '0.8', plants: 360 },
  { block: 'H1', kind: 'bed', from: 1, to: 10, lengthM: '60', widthM: '1.2', plants: null },
]

interface DemoEvent { kind: FarmEventKind; blocks: string[]; daysAgo: number; note: string | null; by: 'tam' | 'oda'; takenBack?: string }
export const DEMO_EVENTS: DemoEvent[] = [
  { kind: 'mown', blocks: ['A1', 'A2', 'A3', 'A4', 'A5'], daysAgo: 58, note: null, by: 'tam' },
  { kind: 'mulched', blocks: ['A3', 'A4'], daysAgo: 41, note: 'Chipped prunings, under the trees', by: 'tam' },
  { kind: 'mown', blocks: ['A1', 'A2', 'A3', 'A4', 'A5', 'P1', 'P2', 'P3'], daysAgo: 22, note: null, by: 'tam' },
  { kind: 'planted', blocks: ['V1'], daysAgo: 40, note: null, by: 'oda' },
  { kind: 'mulched', blocks: ['S3'], daysAgo: 35, note: 'Straw', by: 'tam' },
  { kind: 'watered', blocks: ['T1', 'T2'], daysAgo: 1, note: null, by: 'tam' },
  { kind: 'watered', blocks: ['V1', 'V2'], daysAgo: 5, note: null, by: 'oda' },
  { kind: 'first_pick', blocks: ['S3'], daysAgo: 9, note: null, by: 'tam' },
  { kind: 'other', blocks: ['P1'], daysAgo: 12, note: 'Two trees grubbed up after canker', by: 'oda' },
  { kind: 'mown', blocks: ['C1'], daysAgo: 8, note: null, by: 'tam', takenBack: 'It was C2, not C1' },
]
