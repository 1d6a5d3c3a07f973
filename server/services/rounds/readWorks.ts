import type { EntityManager } from 'typeorm'
import type { Method } from '../../../shared/contract/recordContent.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { formatRecordNumber } from '../records/formatRecordNumber.ts'

/** One block line of a signed record. */
export interface SignedWork {
  recordId: string
  /** `2026-0143`. */
  number: string
  blockId: string
  /** Civil day in the farm's zone on which it was begun. */
  on: string
  method: Method
  materialIds: string[]
  preparations: string[]
  reEntryUntil: string | null
  pickFrom: string | null
  isWithdrawn: boolean
}

interface WorkRow {
  state: 'signed' | 'withdrawn'
  id: string
  season: number
  number: number
  method: Method
  preparations: string[]
  material_ids: string[] | null
  block_id: string
  started_at: string
  re_entry_until: string | null
  pick_from: string | null
}

/** Lines of a record may lie after its first start. */
const LONGEST_RECORD_DAYS = 3

/** Signed work from one civil day to another, as its records say now: amended ones newly, withdrawn ones only where they are asked for. */
export async function readWorks(manager: EntityManager, { farmId, zone }: { farmId: string; zone: string }, { from, to, withWithdrawn = false }: { from: string; to: string; withWithdrawn?: boolean }): Promise<SignedWork[]> {
  const rows: WorkRow[] = await manager.query(
    `SELECT r.id, r.state, r.season, r.number, r.content->>'method' AS method, r.register_row->'preparations' AS preparations,
       (SELECT array_agg(c.material_id) FROM record_components c WHERE c.farm_id = r.farm_id AND c.record_id = r.id) AS material_ids,
       l.line->>'blockId' AS block_id, l.line->>'startedAt' AS started_at,
       r.computed->'lines'->(l.place - 1)::integer->>'reEntryUntil' AS re_entry_until, r.computed->'lines'->(l.place - 1)::integer->>'pickFrom' AS pick_from
     FROM application_records r CROSS JOIN LATERAL jsonb_array_elements(r.content->'lines') WITH ORDINALITY AS l (line, place)
     WHERE r.farm_id = $1 AND r.state = ANY ($4) AND r.sort_at >= $2::date - ${LONGEST_RECORD_DAYS} AND r.sort_at < $3::date + 2
     ORDER BY r.sort_at, r.id, l.place`,
    [farmId, from, to, withWithdrawn ? ['signed', 'withdrawn'] : ['signed']],
  )
  return rows.map((row) => ({
    recordId: row.id, number: formatRecordNumber(row.season, row.number), blockId: row.block_id, on: civilDateIn(zone, row.started_at), method: row.method,
    materialIds: row.material_ids ?? [], preparations: row.preparations, reEntryUntil: row.re_entry_until, pickFrom: row.pick_from, isWithdrawn: row.state === 'withdrawn',
  }))
}
