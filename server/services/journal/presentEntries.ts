import { In, type EntityManager } from 'typeorm'
import type { JournalEntry as EntryAnswer, JournalFact } from '../../../shared/contract/journal.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Account } from '../../entities/Account.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import type { JournalEntry } from '../../entities/JournalEntry.ts'
import { Person } from '../../entities/Person.ts'

/** What a deed may say of its own: everything else in its detail is for the server. */
const FACTS: readonly JournalFact['name'][] = ['reason', 'version', 'season', 'seasons', 'endsOn', 'format', 'volume']

type Detail = Record<string, unknown>

/** Entries as they are read: who is called what now, and what the deed was about. */
export async function presentEntries(manager: EntityManager, { farmId }: Pick<FarmActor, 'farmId'>, entries: readonly JournalEntry[]): Promise<EntryAnswer[]> {
  const people = await manager.find(Person, { select: { id: true, name: true }, where: { farmId, id: In(entries.flatMap(({ personId }) => personId ?? [])) } })
  const outsiders = await manager.find(Account, { select: { id: true, name: true }, where: { id: In(entries.flatMap(({ personId, accountId }) => (personId === null ? accountId ?? [] : []))) } })
  const numbers = await readNumbers(manager, farmId, entries)
  return entries.map((entry) => {
    const detail = entry.detail as Detail
    const isOutsider = entry.personId === null && entry.accountId !== null
    const name = isOutsider ? outsiders.find(({ id }) => id === entry.accountId)?.name : people.find(({ id }) => id === entry.personId)?.name
    return {
      id: entry.id,
      at: entry.at.toISOString(),
      by: entry.personId === null && !isOutsider ? null : { personId: entry.personId, name: name ?? '' },
      isOutsider,
      action: entry.action,
      subjectId: entry.subjectId,
      subject: textOf(detail['number']) ?? textOf(detail['code']) ?? textOf(detail['name']) ?? textOf(detail['crop']) ?? numbers.get(entry.subjectId ?? '') ?? null,
      facts: FACTS.flatMap((fact) => {
        const value = textOf(detail[fact])
        return value === null ? [] : [{ name: fact, value }]
      }),
      from: { network: entry.fromNetwork, device: entry.fromDevice },
    }
  })
}

/** Numbers of the records that entries without a number of their own are about. */
async function readNumbers(manager: EntityManager, farmId: string, entries: readonly JournalEntry[]): Promise<Map<string, string>> {
  const ids = entries.flatMap(({ action, subjectId }) => (action.startsWith('record.') && subjectId !== null ? [subjectId] : []))
  const records = await manager.find(ApplicationRecord, { select: { id: true, registerRow: true }, where: { farmId, id: In(ids) } })
  return new Map(records.flatMap(({ id, registerRow: { number } }) => (number === null ? [] : [[id, number] as const])))
}

function textOf(value: unknown): string | null {
  if (typeof value === 'string') return value === '' ? null : value
  if (typeof value === 'number') return String(value)
  return Array.isArray(value) && value.every((each) => typeof each === 'number') && value.length > 0 ? value.join(', ') : null
}
