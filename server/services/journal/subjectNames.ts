import type { EntityManager } from 'typeorm'
import type { JournalKind } from '../../../shared/journal/journalActions.ts'
import type { JournalEntry } from '../../entities/JournalEntry.ts'

/** What things are called now, by the kind of deed that is about them: `id` and `name` of the farm in $1 and the ids in $2. */
const NAMES: Partial<Record<JournalKind, string>> = {
  record: "SELECT id, register_row->>'number' AS name FROM application_records WHERE farm_id = $1 AND id = ANY($2)",
  block: 'SELECT id, code AS name FROM blocks WHERE farm_id = $1 AND id = ANY($2)',
  certificate: 'SELECT id, number AS name FROM certificates WHERE farm_id = $1 AND id = ANY($2)',
  sprayer: 'SELECT id, code AS name FROM sprayers WHERE farm_id = $1 AND id = ANY($2)',
  lot: 'SELECT id, code AS name FROM lots WHERE farm_id = $1 AND id = ANY($2)',
  material: 'SELECT id, name FROM materials WHERE farm_id = $1 AND id = ANY($2)',
  plan: 'SELECT id, name FROM season_plans WHERE farm_id = $1 AND id = ANY($2)',
  phone: 'SELECT id, name FROM shared_phones WHERE farm_id = $1 AND id = ANY($2)',
  person: 'SELECT id, name FROM people WHERE farm_id = $1 AND id = ANY($2)',
  paper: "SELECT d.id, d.title || ', ' || p.name AS name FROM person_papers d JOIN people p ON p.farm_id = d.farm_id AND p.id = d.person_id WHERE d.farm_id = $1 AND d.id = ANY($2)",
  invitation: 'SELECT id, coalesce(name, email) AS name FROM invitations WHERE farm_id = $1 AND id = ANY($2)',
}

/** An invitation that was taken is about the person who came of it. */
const kindOf = ({ action }: JournalEntry): string => (action === 'invitation.taken' ? 'person' : (action.split('.')[0] ?? ''))

/**
 * What the things that entries are about are called now, by their ids. Names of people follow what was done to them under People: the journal
 * itself holds none.
 */
export async function readSubjectNames(manager: EntityManager, farmId: string, entries: readonly JournalEntry[]): Promise<Map<string, string>> {
  const names = new Map<string, string>()
  for (const [kind, statement] of Object.entries(NAMES)) {
    const ids = entries.flatMap((entry) => (kindOf(entry) === kind && entry.subjectId !== null ? [entry.subjectId] : []))
    if (ids.length === 0) continue
    const rows: { id: string; name: string | null }[] = await manager.query(statement, [farmId, ids])
    for (const { id, name } of rows) if (name !== null) names.set(id, name)
  }
  return names
}
