import { In } from 'typeorm'
import type { RecordVersions } from '../../../shared/contract/recordVersions.ts'
import { compareVersions } from '../../../shared/records/compareVersions.ts'
import type { FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { Person } from '../../entities/Person.ts'
import { RecordVersion } from '../../entities/RecordVersion.ts'
import { notFound } from '../../errors.ts'
import type { Services } from '../services.ts'
import { readSigned } from './readSigned.ts'

/**
 * Every signed version of a record, oldest first, with the text that its digest is over and all that changed from the one before.
 * @throws {AppError} not-found.
 */
export async function listRecordVersions(services: Services, actor: FarmActor, id: string): Promise<RecordVersions> {
  const { farmId } = actor
  return services.database.inFarm(actor, async (manager) => {
    if (!(await manager.existsBy(ApplicationRecord, { farmId, id }))) throw notFound()
    const rows = await manager.find(RecordVersion, { where: { farmId, recordId: id }, order: { version: 'ASC' } })
    const versions = rows.map((row) => ({ row, signed: readSigned(row) }))
    const ids = new Set(versions.flatMap(({ signed: { people } }) => [people.doneBy.id, people.enteredBy.id, people.signedBy.id]))
    const people = ids.size === 0 ? [] : await manager.find(Person, { select: { id: true, name: true }, where: { farmId, id: In([...ids]) } })
    const find = (person: string) => people.find((one) => one.id === person)
    return {
      items: versions.map(({ row, signed }, index) => {
        const before = versions[index - 1]?.signed
        const { version, entry, reason, seq, digest, canonicalText, signedWith } = row
        return {
          version, entry, reason, seq, digest, canonicalText, signed, signedWith,
          signedBy: find(row.signedById) ?? null,
          signedAt: row.signedAt.toISOString(),
          changes: before ? compareVersions(before, signed, (person) => find(person)?.name ?? '') : [],
        }
      }),
      people,
      next: null,
    }
  })
}
