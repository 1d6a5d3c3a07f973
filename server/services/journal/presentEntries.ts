import { In, type EntityManager } from 'typeorm'
import type { JournalEntry as EntryAnswer, JournalFact } from '../../../shared/contract/journal.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Account } from '../../entities/Account.ts'
import type { JournalEntry } from '../../entities/JournalEntry.ts'
import { Person } from '../../entities/Person.ts'
import { readSubjectNames } from './subjectNames.ts'

/** What a deed may say of its own: everything else in its detail is for the server. */
const FACTS: readonly JournalFact['name'][] = ['reason', 'version', 'season', 'seasons', 'endsOn', 'format', 'volume']
/** What a deed of one kind says besides, and under which key. */
const FACTS_OF: Readonly<Record<string, readonly { name: JournalFact['name']; key: string }[]>> = {
  'person.added': [{ name: 'role', key: 'role' }],
  'person.role_changed': [{ name: 'roleFrom', key: 'from' }, { name: 'roleTo', key: 'to' }],
  'invitation.sent': [{ name: 'role', key: 'role' }],
  'invitation.taken': [{ name: 'role', key: 'role' }],
  'job.moved': [{ name: 'dayFrom', key: 'from' }, { name: 'dayTo', key: 'to' }],
}

type Detail = Record<string, unknown>

/** Entries as they are read: who is called what now, and what the deed was about. */
export async function presentEntries(manager: EntityManager, { farmId }: Pick<FarmActor, 'farmId'>, entries: readonly JournalEntry[]): Promise<EntryAnswer[]> {
  const people = await manager.find(Person, { select: { id: true, name: true }, where: { farmId, id: In(entries.flatMap(({ personId }) => personId ?? [])) } })
  const outsiders = await manager.find(Account, { select: { id: true, name: true }, where: { id: In(entries.flatMap(({ personId, accountId }) => (personId === null ? accountId ?? [] : []))) } })
  const names = await readSubjectNames(manager, farmId, entries.filter(({ detail }) => ownWords(detail as Detail) === null))
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
      subject: ownWords(detail) ?? names.get(entry.subjectId ?? '') ?? null,
      facts: factsOf(entry.action, detail),
      from: { network: entry.fromNetwork, device: entry.fromDevice },
    }
  })
}

/** What a deed itself says of the thing it was about; null where the thing has to be asked. */
const ownWords = (detail: Detail): string | null => textOf(detail['number']) ?? textOf(detail['code']) ?? textOf(detail['name']) ?? textOf(detail['crop']) ?? jobOf(detail)

/** A job has no name of its own: its block, and what is put on it. */
function jobOf({ block, preparation }: Detail): string | null {
  const words = [textOf(block), textOf(preparation)].filter((word) => word !== null)
  return words.length === 0 ? null : words.join(', ')
}

function factsOf(action: string, detail: Detail): JournalFact[] {
  const facts = [...FACTS.map((name) => ({ name, key: name })), ...(FACTS_OF[action] ?? [])]
  return facts.flatMap(({ name, key }) => {
    const value = textOf(detail[key])
    return value === null ? [] : [{ name, value }]
  })
}

function textOf(value: unknown): string | null {
  if (typeof value === 'string') return value === '' ? null : value
  if (typeof value === 'number') return String(value)
  return Array.isArray(value) && value.every((each) => typeof each === 'number') && value.length > 0 ? value.join(', ') : null
}
