import type { FarmActor } from '../../database/actor.ts'
import { notFound } from '../../errors.ts'

/**
 * Whoever asks, narrowed to what a grant of one season opens: signed and withdrawn records of it and what stands in them. A report
 * so says the same to the farm and to its certifier. @throws {AppError} not-found for a season that is not open to them.
 */
export function asReaderOf(actor: FarmActor, season: number): FarmActor {
  if (actor.seasons !== null && !actor.seasons.includes(season)) throw notFound()
  return { ...actor, seasons: [season] }
}
