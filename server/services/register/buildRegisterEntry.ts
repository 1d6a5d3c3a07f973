import type { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import type { RegisterEntry } from '../../entities/RegisterEntry.ts'

/** Room for the numbers of one season. */
const SEASON_STEP = 10_000_000
/** After every number that can be given. */
export const NO_NUMBER_YET = '9000000000000000'

type Entered = Pick<ApplicationRecord, 'farmId' | 'id' | 'state' | 'season' | 'number' | 'sortAt' | 'registerRow'>

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
    totalKg: row.totalKg ?? '0',
    late: row.lateHours !== null,
  }
}
