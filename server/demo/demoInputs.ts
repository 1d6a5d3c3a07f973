import type { z } from 'zod'
import type { createMaterialSchema } from '../../shared/contract/input.ts'

type MaterialFacts = Omit<z.input<typeof createMaterialSchema>, 'id'>

/** Invented preparations of the demo farm with a lot each, in litres or kilograms as the preparation is measured; label figures are invented too. */
export const DEMO_MATERIALS: Record<string, { material: MaterialFacts; lots: { code: string; origin: 'bought' | 'gathered' | 'made'; amount: string; daysAgo: number; keepsDays: number | null; source: string }[] }> = {
  nettle: {
    material: { name: 'Nettle ferment', kind: 'ferment', measuredIn: 'volume', organicStatus: 'allowed', statusBasis: 'System plan, line 3' },
    lots: [
      { code: 'NF-31', origin: 'made', amount: '640', daysAgo: 60, keepsDays: 90, source: 'Brew house, vat 2' },
      { code: 'NF-24', origin: 'made', amount: '120', daysAgo: 190, keepsDays: 185, source: 'Brew house, vat 1' },
    ],
  },
  soap: {
    material: {
      name: 'Potash soap', kind: 'soap', measuredIn: 'volume', organicStatus: 'restricted', statusBasis: 'System plan, line 14: for aphids, when predators are few',
      label: { minStrengthPct: '0.5', maxStrengthPct: '2', reEntryHours: '12', source: 'soap label, parts 2 to 4' },
    },
    lots: [{ code: '26-018', origin: 'bought', amount: '60', daysAgo: 200, keepsDays: 700, source: 'Marrow & Daughters' }],
  },
  eggshell: {
    material: { name: 'Eggshell vinegar', kind: 'mineral', measuredIn: 'volume', organicStatus: 'allowed', statusBasis: 'System plan, line 5' },
    lots: [{ code: 'EV-29', origin: 'made', amount: '80', daysAgo: 120, keepsDays: 360, source: 'Brew house, shelf 4' }],
  },
  comfrey: {
    material: { name: 'Comfrey ferment', kind: 'ferment', measuredIn: 'volume', organicStatus: 'allowed', statusBasis: 'System plan, line 4' },
    lots: [{ code: 'CF-28', origin: 'made', amount: '260', daysAgo: 90, keepsDays: 98, source: 'Brew house, vat 3' }],
  },
  leafMould: {
    material: { name: 'Leaf-mould extract', kind: 'microbial', measuredIn: 'volume', organicStatus: 'unknown' },
    lots: [{ code: 'LM-12', origin: 'gathered', amount: '900', daysAgo: 40, keepsDays: null, source: 'Hedge wood, north edge' }],
  },
  horsetail: {
    material: { name: 'Horsetail extract', kind: 'extract', measuredIn: 'volume', organicStatus: 'allowed', statusBasis: 'System plan, line 6' },
    lots: [{ code: 'HE-07', origin: 'made', amount: '300', daysAgo: 30, keepsDays: 34, source: 'Brew house, kettle' }],
  },
  sulphur: {
    material: {
      name: 'Wettable sulphur', kind: 'mineral', measuredIn: 'mass', organicStatus: 'restricted', statusBasis: 'System plan, line 16',
      label: { maxRate: { value: '6', unit: 'kg/ha' }, reEntryHours: '24', preHarvestDays: 7, source: 'sulphur label, part 5' },
    },
    lots: [{ code: '26-007', origin: 'bought', amount: '40', daysAgo: 210, keepsDays: 900, source: 'Marrow & Daughters' }],
  },
}
