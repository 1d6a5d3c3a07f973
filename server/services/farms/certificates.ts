import type { EntityManager } from 'typeorm'
import type { Certificate as CertificateAnswer } from '../../../shared/contract/certificate.ts'
import type { AddCertificate, ChangeCertificate } from '../../../shared/contract/certificateChanges.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Certificate } from '../../entities/Certificate.ts'
import { AppError, invalid, notFound, stale } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { digestOf, findRepeat, insertOnce } from '../insertOnce.ts'
import type { Services } from '../services.ts'

/** Every certificate of the farm, oldest first, those taken back among them. */
export async function readCertificates(manager: EntityManager, { farmId }: Pick<FarmActor, 'farmId'>): Promise<CertificateAnswer[]> {
  const rows = await manager.find(Certificate, { where: { farmId }, order: { validFrom: { direction: 'ASC', nulls: 'FIRST' }, createdAt: 'ASC', id: 'ASC' } })
  return rows.map(present)
}

/** Writes a certificate down; from its first day on it stands in place of the one before. @throws {AppError} `farm.certificate_dates`, `idempotency.mismatch`. */
export async function addCertificate(services: Services, actor: FarmActor, input: AddCertificate): Promise<{ made: boolean; certificate: CertificateAnswer }> {
  return services.database.inFarm(actor, async (manager) => {
    const creationDigest = digestOf(input)
    const repeated = await findRepeat(manager, Certificate, { farmId: actor.farmId, id: input.id, creationDigest })
    if (repeated) return { made: false, certificate: present(repeated) }
    assertDays(input)
    const row: Certificate = { farmId: actor.farmId, ...input, withdrawnAt: null, withdrawnReason: null, revision: 1, creationDigest, createdAt: services.clock.now() }
    const { made, stored } = await insertOnce(manager, Certificate, row, { path: 'id', code: 'idempotency.mismatch' })
    if (made) await appendJournal(services, manager, actor, { action: 'certificate.added', subjectId: input.id, detail: { number: input.number } })
    return { made, certificate: present(stored) }
  })
}

/** Corrects what was written down of one; what stood before is kept in the journal. @throws {AppError} not-found, `stale`, `certificate.withdrawn`, `farm.certificate_dates`. */
export async function changeCertificate(services: Services, actor: FarmActor, id: string, { revision, ...fields }: ChangeCertificate): Promise<CertificateAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const found = await lock(manager, actor, id)
    if (found.revision !== revision) throw stale(present(found))
    if (found.withdrawnAt !== null) throw new AppError('conflict', 'certificate.withdrawn', { current: present(found) })
    assertDays(fields)
    const changes = { ...fields, revision: revision + 1 }
    await manager.update(Certificate, { farmId: actor.farmId, id }, changes)
    const { number, body, scope, validFrom, validUntil } = found
    await appendJournal(services, manager, actor, { action: 'certificate.changed', subjectId: id, detail: { before: { number, body, scope, validFrom, validUntil }, after: fields } })
    return present({ ...found, ...changes })
  })
}

/** Takes one back that should not stand here, with the reason; it stays readable and is printed nowhere. @throws {AppError} not-found, `certificate.withdrawn`. */
export async function withdrawCertificate(services: Services, actor: FarmActor, id: string, { reason }: { reason: string }): Promise<CertificateAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const found = await lock(manager, actor, id)
    if (found.withdrawnAt !== null) {
      if (found.withdrawnReason === reason) return present(found)
      throw new AppError('conflict', 'certificate.withdrawn', { current: present(found) })
    }
    const changes = { withdrawnAt: services.clock.now(), withdrawnReason: reason, revision: found.revision + 1 }
    await manager.update(Certificate, { farmId: actor.farmId, id }, changes)
    await appendJournal(services, manager, actor, { action: 'certificate.withdrawn', subjectId: id, detail: { reason } })
    return present({ ...found, ...changes })
  })
}

async function lock(manager: EntityManager, { farmId }: FarmActor, id: string): Promise<Certificate> {
  const found = await manager.findOne(Certificate, { where: { farmId, id }, lock: { mode: 'pessimistic_write' } })
  if (!found) throw notFound()
  return found
}

function assertDays({ validFrom, validUntil }: { validFrom: string; validUntil: string | null }): void {
  if (validUntil !== null && validUntil < validFrom) throw invalid([{ path: 'validUntil', code: 'farm.certificate_dates' }])
}

function present({ id, number, body, scope, validFrom, validUntil, withdrawnAt, withdrawnReason, revision }: Certificate): CertificateAnswer {
  return {
    id, number, body, scope, validFrom, validUntil, revision,
    withdrawn: withdrawnAt === null ? null : { at: withdrawnAt.toISOString(), reason: withdrawnReason ?? '' },
  }
}
