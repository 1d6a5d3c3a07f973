import { In, type EntityManager } from 'typeorm'
import type { Acknowledged } from '../../../shared/contract/common.ts'
import type { Check, Computed } from '../../../shared/contract/record.ts'
import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { canonicalText } from '../../../shared/evidence/canonicalText.ts'
import { cutCheckCode } from '../../../shared/evidence/checkCode.ts'
import { sha256Hex } from '../../../shared/evidence/sha256Hex.ts'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'
import { firstStart, registerRow } from '../../../shared/records/registerRow.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { seasonOf } from '../../../shared/time/seasonOf.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { Person } from '../../entities/Person.ts'
import { RecordVersion } from '../../entities/RecordVersion.ts'
import { appendJournal } from '../appendJournal.ts'
import { holdFiles } from '../files/holdFiles.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'
import { buildSignedRecord, type SignedPeople } from './buildSignedRecord.ts'
import { formatRecordNumber } from './formatRecordNumber.ts'
import type { RecordGround } from './loadRecordGround.ts'
import { storeProjections } from './storeProjections.ts'
import { takeNumber, takeSeq } from './takeNumber.ts'

export interface Signature {
  record: ApplicationRecord
  entry: SignedRecord['entry']
  /** Why it is amended or withdrawn; null for the first version. */
  reason: string | null
  content: RecordContent
  ground: RecordGround
  judged: { sheet: RecordSheet; computed: Computed; checks: Check[] }
  acknowledged: Acknowledged
  deviceAt: Date | null
  /** When its first version was signed; how late an entry is does not change with an amendment. */
  firstSignedAt: Date
  now: Date
}

/** Writes a signed version: canonical text, digest, entry in the log, and the record's own columns. */
export async function writeVersion(
  services: Pick<Services, 'clock'>,
  manager: EntityManager,
  actor: FarmActor,
  signature: Signature,
): Promise<ApplicationRecord> {
  const { record, entry, reason, content, ground, judged, acknowledged, now } = signature
  const people = await loadPeople(manager, actor, { doneById: content.doneById ?? record.doneById, enteredById: record.enteredById })
  const { season, number, seq } = await takeStamp(manager, actor, record, content)
  const stamp = { id: record.id, number: formatRecordNumber(season, number), season, version: record.version + 1, seq }
  const files = await holdFiles(manager, record, stamp)
  const text = canonicalText(
    buildSignedRecord({
      actor, entry, content, ground, people, acknowledged, files, reason, record: stamp, computed: judged.computed, checks: judged.checks,
      replaces: record.digest,
      times: { deviceAt: signature.deviceAt?.toISOString() ?? null, receivedAt: (entry === 'signed' ? record.receivedAt : now).toISOString(), signedAt: now.toISOString() },
    }),
  )
  const digest = sha256Hex(text)
  const changes = {
    state: entry === 'withdrawn' ? 'withdrawn' as const : 'signed' as const,
    content, computed: judged.computed, checks: judged.checks, acknowledged, season, number, seq, digest,
    registerRow: registerRow({ content, ...judged, ...ground, doneBy: people.doneBy.name, signed: { ...stamp, at: now.toISOString(), firstAt: signature.firstSignedAt.toISOString() } }),
    sortAt: new Date(firstStart(content) ?? record.sortAt), doneById: people.doneBy.id,
    version: stamp.version, revision: record.revision + 1, signedById: people.signedBy.id, signedAt: now,
  }
  await updateRow(manager, ApplicationRecord, { farmId: actor.farmId, id: record.id }, changes)
  const written = { ...record, ...changes }
  await storeProjections(manager, written, true)
  await manager.insert(RecordVersion, {
    farmId: actor.farmId, recordId: record.id, version: stamp.version, entry, seq, season, number: stamp.number, canonicalText: text, digest,
    checkCode: cutCheckCode(digest), signedById: people.signedBy.id, signedAt: now, signedWith: actor.signsWith, reason,
  })
  await appendJournal(services, manager, actor, { action: `record.${entry}`, subjectId: record.id, detail: { number: stamp.number, version: stamp.version, seq } })
  return written
}

/** Number and season are given once, with the first signature; each version is an entry of the log. */
async function takeStamp(
  manager: EntityManager, actor: FarmActor, record: ApplicationRecord, content: RecordContent,
): Promise<{ season: number; number: number; seq: number }> {
  if (record.season !== null && record.number !== null) {
    return { season: record.season, number: record.number, seq: await takeSeq(manager, actor.farmId) }
  }
  const season = seasonOf(civilDateIn(actor.zone, firstStart(content) ?? ''), actor.seasonStart)
  return { season, ...(await takeNumber(manager, actor.farmId, season)) }
}

async function loadPeople(
  manager: EntityManager, actor: FarmActor, { doneById, enteredById }: Pick<ApplicationRecord, 'doneById' | 'enteredById'>,
): Promise<SignedPeople> {
  const signedById = personOf(actor)
  const people = await manager.findBy(Person, { farmId: actor.farmId, id: In([doneById, enteredById, signedById]) })
  const pick = (id: string) => {
    const person = people.find((candidate) => candidate.id === id)
    if (!person) throw new Error(`Person ${id} is gone from the farm`)
    return person
  }
  return { doneBy: pick(doneById), enteredBy: pick(enteredById), signedBy: pick(signedById) }
}
