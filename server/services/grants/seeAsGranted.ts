import type { FarmActor } from '../../database/actor.ts'
import { Grant } from '../../entities/Grant.ts'
import { JournalEntry } from '../../entities/JournalEntry.ts'
import { AppError, notFound } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import type { Services } from '../services.ts'

/** Looks within an hour are one look: whoever turns pages is not written down for each. */
const ONE_LOOK_MS = 3_600_000

/**
 * The certifier of a grant as their own next request would be let in, for the owner who wants to see what they see: read from the same place,
 * so with every season that is granted to them and under the same policies. Written into the journal as the owner's look.
 * @throws {AppError} not-found, `grant.ended` for one that opens nothing now.
 */
export async function seeAsGranted(services: Services, actor: FarmActor, id: string): Promise<FarmActor> {
  const { farmId, personId } = actor
  const grant = await services.database.inFarm(actor, (manager) => manager.findOneBy(Grant, { farmId, id }))
  if (!grant) throw notFound()
  const access = await services.database.listAccess(grant.accountId, services.clock.now())
  const reader = access.find((each) => each.farmId === farmId && each.role === 'certifier')
  if (grant.endedAt !== null || !reader) throw new AppError('conflict', 'grant.ended')
  await services.database.inFarm(actor, async (manager) => {
    const last = await manager.findOne(JournalEntry, { where: { farmId, subjectId: id, action: 'grant.viewed', personId: personId ?? '' }, order: { at: 'DESC' } })
    if (last && services.clock.now().getTime() - last.at.getTime() < ONE_LOOK_MS) return
    await appendJournal(services, manager, actor, { action: 'grant.viewed', subjectId: id, detail: { name: grant.organisation, seasons: reader.seasons ?? [] } })
  })
  return reader
}
