import type { FarmActor } from '../../database/actor.ts'
import { Account } from '../../entities/Account.ts'
import { Farm } from '../../entities/Farm.ts'
import { invalid } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { assertPassword } from '../assertPassword.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'

/**
 * Asks a second factor of owner, manager and certifier, or no longer; who has none sets one up before the farm opens again.
 * @throws {AppError} `session.wrong_password`, `factor.own_first` from an owner who has none.
 */
export async function askFactor(services: Services, actor: FarmActor, { asked, password }: { asked: boolean; password: string }): Promise<{ asked: boolean }> {
  await assertPassword(services, actor, password)
  return services.database.inFarm(actor, async (manager) => {
    const own = await manager.findOneByOrFail(Account, { id: actor.accountId })
    if (asked && own.totpSecret === null) throw invalid([{ path: 'asked', code: 'factor.own_first' }])
    const farm = await manager.findOneOrFail(Farm, { where: { id: actor.farmId }, lock: { mode: 'for_no_key_update' } })
    if (farm.asksSecondFactor === asked) return { asked }
    await updateRow(manager, Farm, { id: actor.farmId }, { asksSecondFactor: asked, revision: farm.revision + 1 })
    await appendJournal(services, manager, actor, { action: asked ? 'farm.factor_asked' : 'farm.factor_not_asked', subjectId: actor.farmId })
    return { asked }
  })
}

/** Whether the farm asks a second factor. */
export async function isFactorAsked(services: Services, actor: FarmActor): Promise<{ asked: boolean }> {
  return services.database.inFarm(actor, async (manager) => ({ asked: (await manager.findOneByOrFail(Farm, { id: actor.farmId })).asksSecondFactor }))
}
