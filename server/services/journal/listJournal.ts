import type { EntityManager } from 'typeorm'
import { z } from 'zod'
import type { Page } from '../../../shared/contract/common.ts'
import type { JournalEntry as EntryAnswer, JournalFilter } from '../../../shared/contract/journal.ts'
import type { FarmActor } from '../../database/actor.ts'
import { JournalEntry } from '../../entities/JournalEntry.ts'
import { cutPage, decodeCursor } from '../cursor.ts'
import { digestOf } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { presentEntries } from './presentEntries.ts'

/** From midnight to midnight on the farm, as its clocks go. */
const DAY = 'j.at >= (:day::date::timestamp AT TIME ZONE :zone) AND j.at < ((:day::date + 1)::timestamp AT TIME ZONE :zone)'
const instantKey = z.iso.datetime({ precision: 3, abort: true }).refine((text) => /^(?:19|2\d)/.test(text))

/** A page of the farm's journal, the newest deed first. @throws {AppError} invalid-input for a cursor of another filter. */
export async function listJournal(services: Services, actor: FarmActor, { limit, cursor, ...filter }: Page & JournalFilter): Promise<{ items: EntryAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, (manager) => readJournalPage(manager, actor, filter, { limit, cursor }))
}

/** The same inside a transaction. */
export async function readJournalPage(
  manager: EntityManager, actor: FarmActor, filter: JournalFilter, { limit, cursor }: Page,
): Promise<{ items: EntryAnswer[]; next: string | null }> {
  const { farmId, zone } = actor
  const list = digestOf(filter).slice(0, 16)
  const after = decodeCursor(cursor, instantKey, list)
  const query = manager.getRepository(JournalEntry).createQueryBuilder('j').where('j.farmId = :farmId', { farmId })
  if (after) query.andWhere('(j.at, j.id) < (:key::timestamptz, :id::uuid)', after)
  if (filter.person !== undefined) query.andWhere('j.personId = :person', { person: filter.person })
  if (filter.subject !== undefined) query.andWhere('j.subjectId = :subject', { subject: filter.subject })
  if (filter.kind !== undefined) query.andWhere("split_part(j.action, '.', 1) = :kind", { kind: filter.kind })
  if (filter.day !== undefined) query.andWhere(DAY, { day: filter.day, zone })
  const rows = await query.orderBy('j.at', 'DESC').addOrderBy('j.id', 'DESC').limit(limit + 1).getMany()
  const { items, next } = cutPage(rows, limit, (row) => row, ({ at, id }) => [at.toISOString(), id, list])
  return { items: await presentEntries(manager, actor, items), next }
}
