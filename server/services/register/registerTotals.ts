import { ExactDecimal } from '../../../shared/units/exactDecimal.ts'
import type { Method } from '../../../shared/contract/recordContent.ts'
import type { RecordState } from '../../../shared/contract/record.ts'
import type { RegisterFilter, RegisterTotals } from '../../../shared/contract/register.ts'
import type { FarmActor } from '../../database/actor.ts'
import type { Services } from '../services.ts'
import { findTerms } from './findTerms.ts'
import { totalsStatement } from './registerQuery.ts'

/** The records of one method and state. */
interface GroupRow { method: Method; state: RecordState; records: number; area_ha: string; total_l: string; total_kg: string; late: number }
interface Sums { records: number; areaHa: string; totalL: string; totalKg: string }

const COLUMNS = `d.method, d.state, count(*)::integer AS records, sum(d.area_ha)::text AS area_ha, coalesce(sum(d.total_l), 0)::text AS total_l,
  coalesce(sum(d.total_kg), 0)::text AS total_kg, count(*) FILTER (WHERE d.late)::integer AS late`

/**
 * What the records of a filter add up to, exactly. Only signed ones are in the sums; withdrawn and unsigned ones are counted beside them.
 * Hectares add up passes: ground treated twice counts twice.
 */
export async function registerTotals(services: Services, actor: FarmActor, filter: RegisterFilter): Promise<RegisterTotals> {
  const groups: GroupRow[] = await services.database.inFarm(actor, async (manager) => {
    const { sql, params } = totalsStatement(actor.farmId, await findTerms(manager, actor, filter), COLUMNS, 'd.method, d.state')
    return manager.query(sql, params)
  })
  const signed = groups.filter(({ state }) => state === 'signed')
  const count = (...states: RecordState[]) => groups.filter(({ state }) => states.includes(state)).reduce((sum, { records }) => sum + records, 0)
  const methods = [...new Set(signed.map(({ method }) => method))]
  return {
    ...addUp(signed),
    found: count('draft', 'started', 'signed', 'withdrawn'),
    withdrawn: count('withdrawn'),
    unsigned: count('draft', 'started'),
    late: signed.reduce((sum, { late }) => sum + late, 0),
    byMethod: Object.fromEntries(methods.map((method) => [method, addUp(signed.filter((group) => group.method === method))])),
  }
}

function addUp(groups: readonly GroupRow[]): Sums {
  const sum = (name: 'area_ha' | 'total_l' | 'total_kg') => groups.reduce((total, group) => total.plus(group[name]), new ExactDecimal(0)).toFixed()
  return { records: groups.reduce((total, { records }) => total + records, 0), areaHa: sum('area_ha'), totalL: sum('total_l'), totalKg: sum('total_kg') }
}
