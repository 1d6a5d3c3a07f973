import type { Acknowledged } from '../../../shared/contract/common.ts'
import type { Check, Computed } from '../../../shared/contract/record.ts'
import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { sha256Hex } from '../../../shared/evidence/sha256Hex.ts'
import { firstStart, lastEnd } from '../../../shared/records/registerRow.ts'
import { signFigures } from '../../../shared/records/signFigures.ts'
import type { FarmActor } from '../../database/actor.ts'
import type { Person } from '../../entities/Person.ts'
import type { RecordGround } from './loadRecordGround.ts'

export interface SignedPeople {
  doneBy: Person
  enteredBy: Person
  signedBy: Person
}

export interface SignatureFacts {
  actor: FarmActor
  record: SignedRecord['record']
  content: RecordContent
  ground: RecordGround
  computed: Computed
  checks: Check[]
  acknowledged: Acknowledged
  people: SignedPeople
  times: { deviceAt: string | null; receivedAt: string; signedAt: string }
  reason: string | null
  entry: SignedRecord['entry']
  /** Digest of the version before. */
  replaces: string | null
  files: SignedRecord['files']
}

/** Everything a version rests on, as it stands at its signature. @throws {RangeError} if a figure or time is missing. */
export function buildSignedRecord(facts: SignatureFacts): SignedRecord {
  const { actor, content, ground, computed, people } = facts
  return {
    schemaVersion: 2,
    entry: facts.entry,
    replaces: facts.replaces,
    farm: { id: actor.farmId, name: actor.farmName, zone: actor.zone, seasonStart: actor.seasonStart },
    record: facts.record,
    content,
    blocks: ground.blocks.map(({ id, code, name, crop, version, geometry, areaM2 }) => ({ id, code, name, crop, version, geometry, areaM2 })),
    materials: ground.materials.map(({ id, name, kind, measuredIn, organicStatus, statusBasis, label }) => ({ id, name, kind, measuredIn, organicStatus, statusBasis, label })),
    lots: ground.lots.map(({ id, code, materialId, origin, source, expiresOn }) => ({ id, code, materialId, origin, source, expiresOn })),
    sprayer: ground.sprayer && { id: ground.sprayer.id, code: ground.sprayer.code, name: ground.sprayer.name, tankL: ground.sprayer.tankL, flowLPerMin: ground.sprayer.flowLPerMin },
    computed: signFigures(computed),
    files: facts.files,
    checks: facts.checks,
    acknowledged: facts.acknowledged,
    people: { doneBy: signPerson(people.doneBy), enteredBy: signPerson(people.enteredBy), signedBy: signPerson(people.signedBy) },
    times: { startedAt: present(firstStart(content)), endedAt: present(lastEnd(content)), ...facts.times },
    reason: facts.reason,
  }
}

function signPerson({ id, name, nameSalt }: Person): { id: string; digest: string } {
  return { id, digest: sha256Hex(`${nameSalt}\n${name}`) }
}

function present(instant: string | null): string {
  if (instant === null) throw new RangeError('A signed record lacks a time')
  return instant
}
