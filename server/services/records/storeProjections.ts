import type { EntityManager } from 'typeorm'
import { lastHeldDay } from '../../../shared/season/lastHeldDay.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { seasonOf } from '../../../shared/time/seasonOf.ts'
import { together } from '../../database/together.ts'
import type { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { RecordComponent } from '../../entities/RecordComponent.ts'
import { RecordLine } from '../../entities/RecordLine.ts'
import { RecordTerm } from '../../entities/RecordTerm.ts'
import { RegisterEntry } from '../../entities/RegisterEntry.ts'
import { buildRegisterEntry } from '../register/buildRegisterEntry.ts'
import { recordTerms } from '../register/recordTerms.ts'

/**
 * Writes everything a record is found, sorted and added up by: its lines and components, its entry of the register and its
 * terms. Whatever changes a record (a new version, a withdrawal) calls this with the record as it then stands.
 * @param anew false for a record that has none yet.
 */
export async function storeProjections(manager: EntityManager, record: ApplicationRecord, anew: boolean): Promise<void> {
  const key = { farmId: record.farmId, recordId: record.id }
  if (anew) await dropProjections(manager, key)
  const { season, sortAt, content, computed } = record
  const { blockNames, workSeason, zone } = await readGround(manager, record)
  // What is taken back, or not signed yet, holds nothing.
  const heldTo = (position: number): string | null => {
    const { reEntryUntil, pickFrom } = computed.lines[position] ?? {}
    return record.state === 'signed' ? lastHeldDay({ reEntryUntil: reEntryUntil ?? null, pickFrom: pickFrom ?? null }, zone) : null
  }
  const components = content.components.map(({ materialId, lotId }, position) => {
    const amount = computed.components[position]?.amount ?? null
    return { ...key, position, materialId, lotId, amount: amount?.value ?? null, unit: amount?.unit ?? null, season }
  })
  await together([
    manager.insert(RecordLine, content.lines.map(({ blockId }, position) => ({ ...key, position, blockId, season, sortAt, heldTo: heldTo(position) }))),
    components.length > 0 && manager.insert(RecordComponent, components),
    manager.insert(RegisterEntry, buildRegisterEntry(record, workSeason)),
    manager.query(
      `INSERT INTO record_terms (farm_id, record_id, term, season, work_season, sort_at)
       SELECT $1, $2, term, $3, $4, $5 FROM unnest($6::text[]) AS term`,
      [record.farmId, record.id, season, workSeason, sortAt, recordTerms(record, blockNames)],
    ),
  ])
}

/** Takes away all that finds a record, as before a draft goes. */
export async function dropProjections(manager: EntityManager, key: { farmId: string; recordId: string }): Promise<void> {
  await together([RecordLine, RecordComponent, RegisterEntry, RecordTerm].map((projection) => manager.delete(projection, key)))
}

async function readGround(manager: EntityManager, { farmId, season, sortAt, content }: ApplicationRecord): Promise<{ blockNames: string[]; workSeason: number; zone: string }> {
  const [ground]: [{ zone: string; season_start: string; names: string[] | null }] = await manager.query(
    `SELECT f.zone, f.season_start, (SELECT array_agg(b.name) FROM blocks b WHERE b.farm_id = f.id AND b.id = ANY ($2)) AS names
     FROM farms f WHERE f.id = $1`,
    [farmId, content.lines.map(({ blockId }) => blockId)],
  )
  return {
    blockNames: ground.names ?? [], zone: ground.zone,
    workSeason: season ?? seasonOf(civilDateIn(ground.zone, sortAt.toISOString()), ground.season_start),
  }
}
