import type { FarmActor } from '../../database/actor.ts'
import { forbidden, notFound } from '../../errors.ts'
import type { Services } from '../services.ts'

/** Asks once more, in the middle of something long, whether the reader still has the role and the season. @throws {AppError} not-found, forbidden. */
export async function assertStillMay(services: Pick<Services, 'clock' | 'database'>, actor: FarmActor, season: number): Promise<void> {
  const access = await services.database.listAccess(actor.accountId, services.clock.now())
  const now = access.find(({ farmId }) => farmId === actor.farmId)
  if (now === undefined || (now.seasons !== null && !now.seasons.includes(season))) throw notFound()
  if (now.role !== actor.role) throw forbidden()
}
