import { fixedClock } from '../clock.ts'
import type { FarmActor } from '../database/actor.ts'
import { asReaderOf } from '../services/season/asReaderOf.ts'
import { describeSeason } from '../services/season/describeSeason.ts'
import { takeAway } from '../services/season/takeAway.ts'
import type { Services } from '../services/services.ts'

const DAY_MS = 86_400_000

/** The certifier took the season's report yesterday, so that there is a head to compare with and an outsider in the journal. */
export async function seedTaken(services: Services, certifier: FarmActor): Promise<void> {
  const [season] = certifier.seasons ?? []
  if (season === undefined) throw new Error('The demo certifier reads no season')
  const { head } = await describeSeason(services, asReaderOf(certifier, season), season)
  const yesterday = { ...services, clock: fixedClock(new Date(services.clock.now().getTime() - DAY_MS).toISOString()) }
  await takeAway(yesterday, { ...certifier, origin: { network: '203.0.113.0/24', device: 'Firefox, Windows' } }, { season, format: 'pdf', volume: null, head })
}
