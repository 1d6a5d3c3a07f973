import { convertQuantity } from '../../../shared/units/convertQuantity.ts'
import type { UnitCode } from '../../../shared/units/unitTable.ts'
import type { ReferenceCase } from '../referenceCase.ts'

type Mix = { product: number; water: number }

const TABLE = 'COMPUTED from exact constants: 5 US gal = 18.92705892 L'
const WESTCOAST = 'westcoastmm.com dilution charts'
const MICHCO = 'michco.com dilution table'

const inUnit = (value: number, from: UnitCode, to: UnitCode): number => Number(convertQuantity({ value: value.toFixed(12), unit: from }, to))
const product = (unit: UnitCode, to: UnitCode) => (mix: Mix): number => inUnit(mix.product, unit, to)
const ratio = (value: number, from: UnitCode, to: UnitCode) => ({ value, from, to })

/** The table of 5 US gallons: product for both readings in mL, fl oz and tsp, water, ppm. Half a unit of the last printed digit. */
const FIVE_GALLONS: readonly (readonly [n: number, ...figures: number[]])[] = [
  [30, 630.902, 21.3333, 128, 610.55, 20.6452, 123.871, 18.3165, 33_333.3, 32_258.1],
  [250, 75.7082, 2.56, 15.36, 75.4066, 2.5498, 15.299, 18.8517, 4_000, 3_984.06],
  [500, 37.8541, 1.28, 7.68, 37.7786, 1.2774, 7.6647, 18.8893, 2_000, 1_996.01],
  [1_000, 18.9271, 0.64, 3.84, 18.9082, 0.6394, 3.8362, 18.9082, 1_000, 999],
]
const COLUMNS: readonly (readonly [name: string, reading: 'in' | 'to', read: (mix: Mix) => number, unitOfTotal: 'L' | 'ppm', tolerance: number])[] = [
  ['product in N, mL', 'in', product('L', 'mL'), 'L', 5.1e-4],
  ['product in N, fl oz', 'in', product('L', 'flozUS'), 'L', 5.1e-5],
  ['product in N, tsp', 'in', product('L', 'tspUS'), 'L', 5.1e-4],
  ['product to N, mL', 'to', product('L', 'mL'), 'L', 5.1e-4],
  ['product to N, fl oz', 'to', product('L', 'flozUS'), 'L', 5.1e-5],
  ['product to N, tsp', 'to', product('L', 'tspUS'), 'L', 5.1e-4],
  ['water to N, L', 'to', (mix) => mix.water, 'L', 5.1e-5],
  ['ppm in N', 'in', (mix) => mix.product, 'ppm', 0.051],
  ['ppm to N', 'to', (mix) => mix.product, 'ppm', 0.051],
]

/** Dilution: the published charts and the table that shows both readings of 1:N. */
export const DILUTION_CASES: ReferenceCase[] = [
  ...FIVE_GALLONS.flatMap(([n, ...figures]) => COLUMNS.map(([name, reading, read, totalUnit, tolerance], column): ReferenceCase => {
    const expected = figures[column] ?? 0
    const total = totalUnit === 'L' ? { value: 18.92705892, unit: 'L' } : { value: 1_000_000, unit: 'mL' }
    return { id: `1:${n} ${name}`, source: TABLE, fn: 'dilute', args: { total, n, reading }, read, expected, tolerance }
  })),
  chart('W2.1 1:4', WESTCOAST, 1, 4, 'to', 'flozUS', 25.5, 0.15),
  chart('W2.1 1:10', WESTCOAST, 1, 10, 'to', 'flozUS', 11.5, 0.15),
  chart('W2.2 1:4, five gallons', WESTCOAST, 5, 4, 'to', 'flozUS', 128, 1e-9),
  chart('W2.3 1:4', MICHCO, 1, 4, 'in', 'flozUS', 32, 1e-9),
  chart('W2.3 1:10 (printed 12, exact 12.8)', MICHCO, 1, 10, 'in', 'flozUS', 12.8, 1e-9),
  active('W2.4', MICHCO, 256, 'in', 176, 0.5),
  active('W2.5', 'essind.com, ppm', 64, 'to', 692, 0.5),
  active('W2.11', MICHCO, 128, 'in', 352, 0.5),
  chart('W2.8, W2.9 1 gal in 100 gal', 'MU Extension G7510 (weight basis, ±5 %)', 1, 100, 'in', 'tspUS', 8, 0.4),
  chart('W2.10 1 %', 'qualitygreenspecialists.com table', 5, 100, 'in', 'flozUS', 6.4, 1e-9),
  chart('W2.10 5 %', 'qualitygreenspecialists.com table', 5, 20, 'in', 'flozUS', 32, 1e-9),
  {
    id: 'W2.13 (COMPUTED)', source: '15 imperial gal at 1:500', fn: 'dilute', read: product('galImp', 'mL'), expected: 136.3827, tolerance: 1e-4,
    args: { total: { value: 15, unit: 'galImp' }, n: 500, reading: 'in' },
  },
  parts('W2.6 1½ tsp a gallon (ratio COMPUTED)', 'Q&A page on FPJ', ratio(1, 'galUS', 'tspUS'), 1.5, 512, 1e-9),
  parts('W2.6 2½ tbsp in 5 gal (ratio COMPUTED)', 'Q&A page on FPJ', ratio(5, 'galUS', 'tbspUS'), 2.5, 512, 1e-9),
  parts('W2.6 5 tbsp in 10 gal (ratio COMPUTED)', 'Q&A page on FPJ', ratio(10, 'galUS', 'tbspUS'), 5, 512, 1e-9),
  parts('W2.7 1 tsp in 4 L (ratio COMPUTED)', 'naturalgardenoz.com; printed "approximately 1:1000"', ratio(4, 'L', 'tspUS'), 1, 811.5, 0.05),
  parts('W2.7 metric teaspoon of 5 mL (FROM MEMORY)', 'naturalgardenoz.com', ratio(4, 'L', 'mL'), 5, 800, 1e-9),
  parts('W2.12', `${MICHCO}, "1 to 85" from 1.5 oz a gallon`, ratio(1, 'galUS', 'flozUS'), 1.5, 85, 0.5),
  parts('W1.7 1 qt an acre at 40 gal an acre, fl oz a gallon', '"1/128 method of calibration", slide deck (slidegur 5284)', ratio(1, 'qtUS', 'flozUS'), 40, 0.8, 1e-9),
]

function chart(
  id: string, source: string, gallons: number, n: number, reading: 'to' | 'in', to: UnitCode, expected: number, tolerance: number,
): ReferenceCase {
  const args = { total: { value: gallons, unit: 'galUS' }, n, reading }
  return { id, source, fn: 'dilute', args, read: product('galUS', to), expected, tolerance }
}

/** Parts per million of a 4.5 % active in the mix. */
function active(id: string, source: string, n: number, reading: 'to' | 'in', expected: number, tolerance: number): ReferenceCase {
  const args = { total: { value: 1_000_000, unit: 'mL' }, n, reading }
  return { id, source, fn: 'dilute', args, read: (mix: Mix) => mix.product * 0.045, expected, tolerance }
}

/** Parts of the whole in one part, from a volume and a count of its measures. */
function parts(
  id: string, source: string, args: { value: number; from: UnitCode; to: UnitCode }, measures: number, expected: number, tolerance: number,
): ReferenceCase {
  return { id, source, fn: 'convert', args, read: (count: number) => count / measures, expected, tolerance }
}
