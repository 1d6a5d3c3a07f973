import { randomBytes } from 'node:crypto'
import { IsNull } from 'typeorm'
import type { EnrolPhone, SharedPhone as PhoneAnswer } from '../../../shared/contract/sharedPhone.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { SharedPhone } from '../../entities/SharedPhone.ts'
import { notFound } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { assertPassword } from '../assertPassword.ts'
import { digestOf, insertOnce } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { phoneKey } from '../sessions/recordSession.ts'
import { updateRow } from '../updateRow.ts'
import { presentPhones } from './listPhones.ts'
import { digestOfSecret } from './phoneCookie.ts'

const SECRET_BYTES = 32

/**
 * Makes a phone the farm's. Repeated, it gives the phone a new secret: the first answer may have been lost on its way.
 * @returns the phone, whether this call made it, and the secret that it keeps from now on.
 * @throws {AppError} `session.wrong_password`, `idempotency.mismatch`, not-found for one that was taken away.
 */
export async function enrolPhone(services: Services, actor: FarmActor, { id, name, password }: EnrolPhone): Promise<{ made: boolean; phone: PhoneAnswer; secret: string }> {
  await assertPassword(services, actor, password)
  const secret = randomBytes(SECRET_BYTES).toString('base64url')
  return services.database.inFarm(actor, async (manager) => {
    const { made, stored } = await insertOnce(manager, SharedPhone, {
      farmId: actor.farmId, id, name, secretDigest: digestOfSecret(secret), enrolledById: personOf(actor), enrolledAt: services.clock.now(),
      lastUsedAt: null, revokedAt: null, creationDigest: digestOf({ id, name }),
    }, { path: 'id', code: 'idempotency.mismatch' })
    if (stored.revokedAt !== null) throw notFound()
    if (made) await appendJournal(services, manager, actor, { action: 'phone.enrolled', subjectId: id })
    else await updateRow(manager, SharedPhone, { farmId: actor.farmId, id }, { secretDigest: digestOfSecret(secret) })
    const [phone] = await presentPhones(manager, [stored])
    if (!phone) throw new Error('A phone that is there was not presented')
    return { made, phone, secret }
  })
}

/** Takes a phone away from the farm: nobody signs in on it by PIN any more, and who did is out. @throws {AppError} not-found. */
export async function revokePhone(services: Services, actor: FarmActor, id: string): Promise<void> {
  const { farmId } = actor
  await services.database.inFarm(actor, async (manager) => {
    if (!(await manager.existsBy(SharedPhone, { farmId, id }))) throw notFound()
    const revoked = await manager.update(SharedPhone, { farmId, id, revokedAt: IsNull() }, { revokedAt: services.clock.now() })
    if (revoked.affected !== 1) return
    await appendJournal(services, manager, actor, { action: 'phone.revoked', subjectId: id })
    await manager.query('DELETE FROM sessions WHERE shared_phone = $1', [phoneKey({ farmId, phoneId: id })])
  })
}
