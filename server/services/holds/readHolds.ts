import type { EntityManager } from 'typeorm'
import type { Hold } from '../../../shared/contract/hold.ts'
import type { SheetQuery } from '../../../shared/contract/job.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { notFound } from '../../errors.ts'
import { formatRecordNumber } from '../records/formatRecordNumber.ts'
import type { Services } from '../services.ts'

interface HoldRow {
  block_id: string
  record_id: string
  season: number
  number: number
  started_at: string
  ended_at: string
  held_to: string
  re_entry_until: string | null
  pick_from: string | null
}

/** What holds the farm's blocks today: an hour that is over is for the reader's own clock to see. */
export function listHolds({ database, clock }: Services, actor: FarmActor): Promise<{ items: Hold[] }> {
  const today = civilDateIn(actor.zone, clock.now().toISOString())
  return database.inFarm(actor, async (manager) => ({ items: await readHolds(manager, actor, { from: today, to: today }) }))
}

/** What held one block on any day from one to another. @throws {AppError} not-found. */
export function listBlockHolds({ database }: Services, actor: FarmActor, blockId: string, days: SheetQuery): Promise<{ items: Hold[] }> {
  return database.inFarm(actor, async (manager) => {
    if (!(await manager.existsBy(Block, { farmId: actor.farmId, id: blockId }))) throw notFound()
    return { items: await readHolds(manager, actor, days, blockId) }
  })
}

/** Each block that was worked, with itself and all that came of it by splitting and merging: a hold lies on the ground, whatever it is called since. */
const GROUND = `WITH RECURSIVE ground AS (
    SELECT block_id AS worked_id, block_id FROM record_lines WHERE farm_id = $1 AND held_to >= $2
    UNION SELECT g.worked_id, next.id FROM ground g JOIN blocks b ON b.farm_id = $1 AND b.id = g.block_id JOIN blocks next ON next.farm_id = $1 AND next.id = ANY (b.into_ids)
  )`

async function readHolds(manager: EntityManager, { farmId, zone }: FarmActor, { from, to }: SheetQuery, blockId: string | null = null): Promise<Hold[]> {
  const rows: HoldRow[] = await manager.query(
    `${GROUND} SELECT g.block_id, l.record_id, r.season, r.number, l.held_to::text,
       coalesce(r.content->'lines'->l.position->>'startedAt', to_json(l.sort_at)#>>'{}') AS started_at,
       r.content->'lines'->l.position->>'endedAt' AS ended_at,
       r.computed->'lines'->l.position->>'reEntryUntil' AS re_entry_until, r.computed->'lines'->l.position->>'pickFrom' AS pick_from
     FROM ground g JOIN record_lines l ON l.farm_id = $1 AND l.block_id = g.worked_id JOIN application_records r ON r.farm_id = l.farm_id AND r.id = l.record_id
     WHERE l.held_to >= $2 AND ($3::uuid IS NULL OR g.block_id = $3) ORDER BY l.sort_at, l.record_id, l.position`,
    [farmId, from, blockId],
  )
  return rows
    .map((row): Hold => ({
      blockId: row.block_id, recordId: row.record_id, number: formatRecordNumber(row.season, row.number), on: civilDateIn(zone, row.started_at), from: row.ended_at,
      reEntryUntil: row.re_entry_until, pickFrom: row.pick_from, heldTo: row.held_to,
    }))
    .filter(({ on }) => on <= to)
}
