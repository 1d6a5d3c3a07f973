import type { EntityManager } from 'typeorm'
import type { ChangeGrant, EndGrant, Grant as GrantAnswer } from '../../../shared/contract/grant.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Grant } from '../../entities/Grant.ts'
import { AppError, notFound, stale } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { assertPassword } from '../assertPassword.ts'
import type { Services } from '../services.ts'
import { assertLastDay } from './assertLastDay.ts'
import { presentGrant } from './presentGrants.ts'

/**
 * Changes what a grant opens and until when; it acts on the certifier's next request.
 * @throws {AppError} `session.wrong_password`, not-found, `stale`, `grant.ended`, `grant.past`, `grant.too_long`.
 */
export function changeGrant(services: Services, actor: FarmActor, id: string, { password, revision, ...wanted }: ChangeGrant): Promise<GrantAnswer> {
  return onGrant(services, actor, { id, password, revision }, async (manager, grant) => {
    if (wanted.endsOn !== undefined) assertLastDay(services, actor, wanted.endsOn)
    const { organisation = grant.organisation, seasons = grant.seasons, endsOn = grant.endsOn } = wanted
    await appendJournal(services, manager, actor, {
      action: 'grant.changed', subjectId: id,
      detail: { name: organisation, seasons, endsOn, before: { name: grant.organisation, seasons: grant.seasons, endsOn: grant.endsOn } },
    })
    return { organisation, seasons, endsOn }
  })
}

/** Ends a grant now. @throws {AppError} `session.wrong_password`, not-found, `stale`, `grant.ended`. */
export function endGrant(services: Services, actor: FarmActor, id: string, proof: EndGrant): Promise<GrantAnswer> {
  return onGrant(services, actor, { id, ...proof }, async (manager, { organisation, seasons }) => {
    await appendJournal(services, manager, actor, { action: 'grant.ended', subjectId: id, detail: { name: organisation, seasons } })
    return { endedAt: services.clock.now() }
  })
}

interface Wanted { id: string; password: string; revision: number }

async function onGrant(
  services: Services, actor: FarmActor, { id, password, revision }: Wanted, deed: (manager: EntityManager, grant: Grant) => Promise<Partial<Grant>>,
): Promise<GrantAnswer> {
  const key = { farmId: actor.farmId, id }
  // What is not there is not there, whatever the password.
  if (!(await services.database.inFarm(actor, (manager) => manager.existsBy(Grant, key)))) throw notFound()
  await assertPassword(services, actor, password)
  return services.database.inFarm(actor, async (manager) => {
    const grant = await manager.findOne(Grant, { where: key, lock: { mode: 'pessimistic_write' } })
    if (!grant) throw notFound()
    if (grant.revision !== revision) throw stale(await presentGrant(services, manager, actor, grant))
    if (grant.endedAt !== null) throw new AppError('conflict', 'grant.ended')
    const changes = { ...(await deed(manager, grant)), revision: revision + 1 }
    await manager.update(Grant, key, changes)
    return presentGrant(services, manager, actor, { ...grant, ...changes })
  })
}
