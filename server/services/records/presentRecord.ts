import { In, type EntityManager } from 'typeorm'
import type { ApplicationRecord as RecordAnswer } from '../../../shared/contract/record.ts'
import type { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { Person } from '../../entities/Person.ts'

/** A record as the contract shows it, with the names of its people as they stand now. */
export async function presentRecord(manager: EntityManager, record: ApplicationRecord): Promise<RecordAnswer> {
  const ids = [record.doneById, record.enteredById, record.signedById].filter((id) => id !== null)
  const people = await manager.find(Person, { select: { id: true, name: true }, where: { farmId: record.farmId, id: In(ids) } })
  const person = (id: string | null) => people.find((candidate) => candidate.id === id) ?? null
  return {
    ...record.content,
    id: record.id,
    state: record.state,
    number: record.season === null || record.number === null ? null : formatRecordNumber(record.season, record.number),
    season: record.season,
    version: record.version,
    revision: record.revision,
    digest: record.digest,
    seq: record.seq,
    computed: record.computed,
    checks: record.checks,
    acknowledged: record.acknowledged,
    doneBy: person(record.doneById),
    enteredBy: person(record.enteredById),
    signedBy: person(record.signedById),
    signedAt: record.signedAt?.toISOString() ?? null,
    deviceAt: record.deviceAt?.toISOString() ?? null,
    receivedAt: record.receivedAt.toISOString(),
  }
}

/** `2026-0143`: the season and the number in it, at least four digits. */
export function formatRecordNumber(season: number, number: number): string {
  return `${season}-${String(number).padStart(4, '0')}`
}
