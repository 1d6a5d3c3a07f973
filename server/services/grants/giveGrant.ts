import type { EntityManager } from 'typeorm'
import type { GiveGrant, Grant as GrantAnswer } from '../../../shared/contract/grant.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { Grant } from '../../entities/Grant.ts'
import { Person } from '../../entities/Person.ts'
import { invalid } from '../../errors.ts'
import { accountOf } from '../accountOf.ts'
import { appendJournal } from '../appendJournal.ts'
import { assertPassword } from '../assertPassword.ts'
import { digestOf, findRepeat, insertOnce } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { assertLastDay } from './assertLastDay.ts'
import { presentGrant } from './presentGrants.ts'
import { tellOfGrant } from './tellOfGrant.ts'

/**
 * Lets a certifier read seasons of the farm until a day, and tells them by letter; somebody unknown is invited with it.
 * @param language what the letter to somebody unknown is written in.
 * @returns the grant, and whether this call made it.
 * @throws {AppError} `session.wrong_password`, `grant.own_person`, `grant.past`, `grant.too_long`, `idempotency.mismatch`.
 */
export async function giveGrant(
  services: Services, actor: FarmActor, { password, ...command }: GiveGrant, language: Language,
): Promise<{ made: boolean; grant: GrantAnswer }> {
  await assertPassword(services, actor, password)
  const { certifierEmail, ...given } = command
  const createdAt = services.clock.now()
  return services.database.inFarm(actor, async (manager) => {
    const row = { ...given, farmId: actor.farmId, creationDigest: digestOf(command), endedAt: null, givenById: personOf(actor), revision: 1, createdAt }
    const repeat = await findRepeat(manager, Grant, row)
    if (repeat) return { made: false, grant: await presentGrant(services, manager, actor, repeat) }
    assertLastDay(services, actor, given.endsOn)
    const account = await accountOf(services, manager, { email: certifierEmail, name: certifierEmail, language })
    await assertOutsider(manager, actor, account.id)
    const { made, stored } = await insertOnce(manager, Grant, { ...row, accountId: account.id }, { path: 'id', code: 'idempotency.mismatch' })
    if (made) {
      const { organisation, seasons, endsOn } = stored
      await appendJournal(services, manager, actor, { action: 'grant.given', subjectId: given.id, detail: { name: organisation, seasons, endsOn, accountId: account.id } })
      await tellOfGrant(services, manager, actor, { account, email: certifierEmail, grant: stored })
    }
    return { made, grant: await presentGrant(services, manager, actor, stored) }
  })
}

/** Who works on the farm sees it whole, and would not be narrowed by a grant. */
async function assertOutsider(manager: EntityManager, { farmId }: FarmActor, accountId: string): Promise<void> {
  if (await manager.existsBy(Person, { farmId, accountId, active: true })) throw invalid([{ path: 'certifierEmail', code: 'grant.own_person' }])
}
