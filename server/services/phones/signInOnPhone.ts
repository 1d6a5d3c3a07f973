import { IsNull, type EntityManager } from 'typeorm'
import type { PhoneHere } from '../../../shared/contract/sharedPhone.ts'
import { Account } from '../../entities/Account.ts'
import { Farm } from '../../entities/Farm.ts'
import { SharedPhone } from '../../entities/SharedPhone.ts'
import { AppError } from '../../errors.ts'
import { verifyPassword } from '../passwords.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'
import { isSecretOf, type PhoneMark } from './phoneCookie.ts'

interface PinRow {
  id: string
  name: string
  account_id: string
}

/** Whose phone this is and who signs in on it by PIN; null for a phone that is no farm's, or no longer. */
export async function readPhoneHere(services: Services, mark: PhoneMark | null): Promise<PhoneHere['phone']> {
  if (mark === null) return null
  return services.database.inFarm({ farmId: mark.farmId, seasons: null }, async (manager) => {
    const phone = await findPhone(manager, mark)
    if (phone === null) return null
    const farm = await manager.findOneByOrFail(Farm, { id: mark.farmId })
    return { name: phone.name, farmName: farm.name, people: (await listPinPeople(manager, mark.farmId)).map(({ id, name }) => ({ id, name })) }
  })
}

/**
 * Judges a PIN on a shared phone. The same work is done for somebody who has none.
 * @returns the account that it opens.
 * @throws {AppError} `pin.not_here` on a phone that is no farm's, `pin.wrong`, which counts as a guess.
 */
export async function signInOnPhone(services: Services, mark: PhoneMark | null, { personId, pin }: { personId: string; pin: string }): Promise<string> {
  const farm = mark && { farmId: mark.farmId, seasons: null }
  const account = farm && mark && (await services.database.inFarm(farm, (manager) => findAccount(manager, mark, personId)))
  if (!farm || !account) throw new AppError('unauthenticated', 'pin.not_here')
  if (!(await verifyPassword(account.passwordHash, pin)) || account.id === null) throw new AppError('unauthenticated', 'pin.wrong', { countsAsGuess: true })
  await services.database.inFarm(farm, (manager) => updateRow(manager, SharedPhone, { farmId: mark.farmId, id: mark.phoneId }, { lastUsedAt: services.clock.now() }))
  return account.id
}

/** The account of somebody with a PIN, empty where there is none; null on a phone that is no farm's. */
async function findAccount(manager: EntityManager, mark: PhoneMark, personId: string): Promise<{ id: string | null; passwordHash: string | null } | null> {
  if ((await findPhone(manager, mark)) === null) return null
  const person = (await listPinPeople(manager, mark.farmId)).find(({ id }) => id === personId)
  if (!person) return { id: null, passwordHash: null }
  const { id, passwordHash } = await manager.findOneByOrFail(Account, { id: person.account_id })
  return { id, passwordHash }
}

async function findPhone(manager: EntityManager, { farmId, phoneId, secret }: PhoneMark): Promise<SharedPhone | null> {
  const phone = await manager.findOneBy(SharedPhone, { farmId, id: phoneId, revokedAt: IsNull() })
  return phone !== null && isSecretOf(phone.secretDigest, secret) ? phone : null
}

function listPinPeople(manager: EntityManager, farmId: string): Promise<PinRow[]> {
  return manager.query(
    `SELECT p.id, p.name, p.account_id FROM people p JOIN accounts a ON a.id = p.account_id
      WHERE p.farm_id = $1 AND p.active AND a.kind = 'pin' AND a.deactivated_at IS NULL ORDER BY p.name, p.id`,
    [farmId],
  )
}
