import type { Acknowledged } from '../../../shared/contract/common.ts'
import type { Check, RecordContent } from '../../../shared/contract/record.ts'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { sha256Hex } from '../../../shared/evidence/sha256Hex.ts'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'
import { firstStart, lastEnd } from '../../../shared/records/registerRow.ts'
import { decimalTextOf } from '../../../shared/units/decimalTextOf.ts'
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
  sheet: RecordSheet
  checks: Check[]
  acknowledged: Acknowledged
  people: SignedPeople
  times: { deviceAt: string | null; receivedAt: string; signedAt: string }
  reason: string | null
}

/** Everything a version rests on, as it stands at its signature. @throws {RangeError} if a figure or time is missing. */
export function buildSignedRecord(facts: SignatureFacts): SignedRecord {
  const { actor, content, ground, sheet, people } = facts
  return {
    schemaVersion: 1,
    farm: { id: actor.farmId, name: actor.farmName, zone: actor.zone, seasonStart: actor.seasonStart },
    record: facts.record,
    content,
    blocks: ground.blocks.map(({ id, code, name, crop, version, geometry, areaM2 }) => ({ id, code, name, crop, version, geometry, areaM2 })),
    materials: ground.materials.map(({ id, name, kind, measuredIn, organicStatus, statusBasis, label }) => ({ id, name, kind, measuredIn, organicStatus, statusBasis, label })),
    lots: ground.lots.map(({ id, code, materialId, origin, source, expiresOn }) => ({ id, code, materialId, origin, source, expiresOn })),
    sprayer: ground.sprayer && { id: ground.sprayer.id, code: ground.sprayer.code, name: ground.sprayer.name, tankL: ground.sprayer.tankL },
    computed: signFigures(sheet),
    checks: facts.checks,
    acknowledged: facts.acknowledged,
    people: { doneBy: signPerson(people.doneBy), enteredBy: signPerson(people.enteredBy), signedBy: signPerson(people.signedBy) },
    times: { startedAt: present(firstStart(content)), endedAt: present(lastEnd(content)), ...facts.times },
    reason: facts.reason,
  }
}

function signFigures(sheet: RecordSheet): SignedRecord['computed'] {
  const text = (value: number | null) => (value === null ? null : decimalTextOf(value))
  return {
    areaM2: decimalTextOf(sheet.areaM2),
    totalL: text(sheet.totalL),
    waterL: text(sheet.waterL),
    sprayLPerHa: text(sheet.sprayLPerHa),
    loads: sheet.loads && {
      full: sheet.loads.full,
      tankL: decimalTextOf(sheet.loads.tankL),
      lastL: decimalTextOf(sheet.loads.lastL),
      lastAreaHa: decimalTextOf(sheet.loads.lastAreaHa),
    },
    components: sheet.components.map(({ amount }) => ({ amount: present(amount) as SignedRecord['computed']['components'][number]['amount'] })),
  }
}

function signPerson({ id, name, nameSalt }: Person): { id: string; digest: string } {
  return { id, digest: sha256Hex(`${nameSalt}\n${name}`) }
}

function present<T>(value: T | null): T {
  if (value === null) throw new RangeError('A signed record lacks a figure or a time')
  return value
}
