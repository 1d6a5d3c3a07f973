import { In, type EntityManager } from 'typeorm'
import type { Acknowledged } from '../../../shared/contract/common.ts'
import type { RecordContent } from '../../../shared/contract/record.ts'
import { canonicalText } from '../../../shared/evidence/canonicalText.ts'
import { sha256Hex } from '../../../shared/evidence/sha256Hex.ts'
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
import { buildSignedRecord, type SignedPeople } from './buildSignedRecord.ts'
import type { JudgedRecord } from './judgeRecord.ts'
import type { RecordGround } from './loadRecordGround.ts'
import { formatRecordNumber } from './presentRecord.ts'
import { storeProjections } from './storeProjections.ts'
import { takeNumber } from './takeNumber.ts'

const CHECK_CODE_LENGTH = 20

interface Signature {
  record: ApplicationRecord
  content: RecordContent
  ground: RecordGround
  judged: JudgedRecord
  acknowledged: Acknowledged
  now: Date
}

/** Writes the first signed version: canonical text, digest, entry in the log, and the record's own columns. */
export async function writeVersion(
  services: Pick<Services, 'clock'>,
  manager: EntityManager,
  actor: FarmActor,
  { record, content, ground, judged, acknowledged, now }: Signature,
): Promise<ApplicationRecord> {
  const people = await loadPeople(manager, actor, record)
  const season = seasonOf(civilDateIn(actor.zone, firstStart(content) ?? ''), actor.seasonStart)
  const { number, seq } = await takeNumber(manager, actor.farmId, season)
  const stamp = { id: record.id, number: formatRecordNumber(season, number), season, version: 1, seq }
  await holdFiles(manager, record, stamp)
  const text = canonicalText(
    buildSignedRecord({
      actor, content, ground, people, acknowledged, record: stamp, sheet: judged.sheet, checks: judged.checks, reason: null,
      times: { deviceAt: record.deviceAt?.toISOString() ?? null, receivedAt: record.receivedAt.toISOString(), signedAt: now.toISOString() },
    }),
  )
  const digest = sha256Hex(text)
  const changes = {
    state: 'signed' as const, content, computed: judged.computed, checks: judged.checks, acknowledged, season, number, seq, digest,
    registerRow: registerRow({ content, ...judged, ...ground, doneBy: people.doneBy.name, signed: { ...stamp, at: now.toISOString() } }),
    version: stamp.version, revision: record.revision + 1, signedById: people.signedBy.id, signedAt: now,
  }
  await manager.update(ApplicationRecord, { farmId: actor.farmId, id: record.id }, changes as never)
  const written = { ...record, ...changes }
  await storeProjections(manager, written, true)
  await manager.insert(RecordVersion, {
    farmId: actor.farmId, recordId: record.id, version: stamp.version, seq, season, number: stamp.number, canonicalText: text, digest,
    checkCode: digest.slice(0, CHECK_CODE_LENGTH), signedById: people.signedBy.id, signedAt: now, reason: null,
  })
  await appendJournal(services, manager, actor, { action: 'record.signed', subjectId: record.id, detail: { number: stamp.number, seq } })
  return written
}

async function loadPeople(manager: EntityManager, actor: FarmActor, record: ApplicationRecord): Promise<SignedPeople> {
  const signedById = personOf(actor)
  const people = await manager.findBy(Person, { farmId: actor.farmId, id: In([record.doneById, record.enteredById, signedById]) })
  const pick = (id: string) => {
    const person = people.find((candidate) => candidate.id === id)
    if (!person) throw new Error(`Person ${id} is gone from the farm`)
    return person
  }
  return { doneBy: pick(record.doneById), enteredBy: pick(record.enteredById), signedBy: pick(signedById) }
}
