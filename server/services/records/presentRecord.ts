import { In, type EntityManager } from 'typeorm'
import type { ApplicationRecord as RecordAnswer } from '../../../shared/contract/record.ts'
import { clockSkewMinutes } from '../../../shared/records/clockSkewMinutes.ts'
import { fillComputed, fillContent } from '../../../shared/records/fillStored.ts'
import type { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { Person } from '../../entities/Person.ts'
import { RecordReview } from '../../entities/RecordReview.ts'
import { RecordVersion } from '../../entities/RecordVersion.ts'
import { formatRecordNumber } from './formatRecordNumber.ts'

/** A record as the contract shows it, with the names of its people as they stand now. */
export async function presentRecord(manager: EntityManager, record: ApplicationRecord): Promise<RecordAnswer> {
  const { reason, signedWith, reviews } = await readVersionFacts(manager, record)
  const ids = [record.doneById, record.enteredById, record.signedById, ...reviews.map(({ reviewedById }) => reviewedById)].filter((id) => id !== null)
  const people = await manager.find(Person, { select: { id: true, name: true }, where: { farmId: record.farmId, id: In(ids) } })
  const person = (id: string | null) => people.find((candidate) => candidate.id === id) ?? null
  return {
    ...fillContent(record.content),
    id: record.id,
    state: record.state,
    number: record.season === null || record.number === null ? null : formatRecordNumber(record.season, record.number),
    season: record.season,
    version: record.version,
    revision: record.revision,
    digest: record.digest,
    seq: record.seq,
    computed: fillComputed(record.computed),
    checks: record.checks,
    acknowledged: record.acknowledged,
    doneBy: person(record.doneById),
    enteredBy: person(record.enteredById),
    signedBy: person(record.signedById),
    signedAt: record.signedAt?.toISOString() ?? null,
    signedWith,
    deviceAt: record.deviceAt?.toISOString() ?? null,
    receivedAt: record.receivedAt.toISOString(),
    clockSkewMinutes: clockSkewMinutes(record.deviceAt, record.receivedAt),
    reason,
    reviews: reviews.map(({ version, reviewedById, at, note }) => ({ version, by: person(reviewedById), at: at.toISOString(), note })),
  }
}

async function readVersionFacts(
  manager: EntityManager, { farmId, id, version }: ApplicationRecord,
): Promise<{ reason: string | null; signedWith: RecordVersion['signedWith'] | null; reviews: RecordReview[] }> {
  if (version === 0) return { reason: null, signedWith: null, reviews: [] }
  const newest = await manager.findOne(RecordVersion, { select: { reason: true, version: true, signedWith: true }, where: { farmId, recordId: id, version } })
  const reviews = await manager.find(RecordReview, { where: { farmId, recordId: id }, order: { at: 'ASC', id: 'ASC' } })
  return { reason: newest?.reason ?? null, signedWith: newest?.signedWith ?? null, reviews }
}
