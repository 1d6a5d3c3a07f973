import type { EntityManager, EntityTarget, FindOneOptions } from 'typeorm'
import { canonicalText } from '../../../shared/evidence/canonicalText.ts'
import type { JournalAction } from '../../../shared/journal/journalActions.ts'
import type { FarmActor } from '../../database/actor.ts'
import { notFound, stale } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'

interface Changeable { farmId: string; id: string; name: string; revision: number }

interface Change<Row> {
  target: EntityTarget<Row>
  id: string
  /** Which state the writer saw. */
  revision: number
  /** What is to stand; what is left out stays. */
  changes: Partial<Row>
  action: JournalAction
  present: (row: Row) => unknown
  /** Refuses what the parts together cannot be. */
  judge?: (row: Row) => void
}

/**
 * Changes some columns of one row; what stood before goes into the journal. A change to what is there already writes nothing.
 * @throws {AppError} not-found, `stale` if it changed since it was read, and what `judge` throws.
 */
export async function changeRow<Row extends Changeable>(
  { services, manager, actor }: { services: Services; manager: EntityManager; actor: FarmActor },
  { target, id, revision, changes, action, present, judge }: Change<Row>,
): Promise<Row> {
  const found: FindOneOptions<Changeable> = { where: { farmId: actor.farmId, id }, lock: { mode: 'pessimistic_write' } }
  const row = await manager.findOne(target, found as FindOneOptions<Row>)
  if (!row) throw notFound()
  if (row.revision !== revision) throw stale(present(row))
  const before = Object.fromEntries(Object.entries(changes).filter(([name, value]) => value !== undefined && !isSame(row[name as keyof Row], value)).map(([name]) => [name, row[name as keyof Row]]))
  if (Object.keys(before).length === 0) return row
  const written = Object.fromEntries(Object.keys(before).map((name) => [name, changes[name as keyof Row]])) as Partial<Row>
  const changed: Row = { ...row, ...written, revision: row.revision + 1 }
  judge?.(changed)
  await updateRow<Changeable>(manager, target as EntityTarget<Changeable>, { farmId: actor.farmId, id }, { ...written, revision: changed.revision })
  await appendJournal(services, manager, actor, { action, subjectId: id, detail: { name: changed.name, before } })
  return changed
}

const isSame = (a: unknown, b: unknown): boolean => canonicalText(a ?? null) === canonicalText(b ?? null)
