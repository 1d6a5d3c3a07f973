import { convertQuantity } from '../../../shared/units/convertQuantity.ts'
import { ExactDecimal } from '../../../shared/units/exactDecimal.ts'
import { dimensionOf } from '../../../shared/units/dimensionOf.ts'
import type { Computed } from '../../../shared/contract/record.ts'
import type { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import type { RegisterEntry } from '../../entities/RegisterEntry.ts'

/** Room for the numbers of one season. */
const SEASON_STEP = 10_000_000
/** After every number that can be given. */
export const NO_NUMBER_YET = '9000000000000000'

type Entered = Pick<ApplicationRecord, 'farmId' | 'id' | 'state' | 'season' | 'number' | 'sortAt' | 'computed' | 'registerRow'>

/** What the register sorts a record by and adds up of it; its figures are those of its row. */
export function buildRegisterEntry(record: Entered, workSeason: number): RegisterEntry {
  const { registerRow: row, season, number } = record
  return {
    farmId: record.farmId,
    recordId: record.id,
    state: record.state,
    method: row.method,
    season,
    workSeason,
    sortAt: record.sortAt,
    numberSort: season === null || number === null ? NO_NUMBER_YET : String(season * SEASON_STEP + number),
    areaSort: Number(row.areaHa),
    areaHa: row.areaHa,
    totalL: row.totalL,
    totalKg: massOf(record.computed),
    late: row.lateHours !== null,
  }
}

/** Kilograms of the components that were measured by mass, as plain decimal text. */
function massOf({ components }: Computed): string {
  return components
    .flatMap(({ amount }) => (amount !== null && dimensionOf(amount.unit) === 'mass' ? [convertQuantity(amount, 'kg')] : []))
    .reduce((sum, kg) => sum.plus(kg), new ExactDecimal(0))
    .toFixed()
}
