import { seasonOf } from '../../shared/time/seasonOf.ts'
import { civilDateIn } from '../../shared/time/civilDate.ts'
import type { FarmActor } from '../database/actor.ts'
import { queueLetter } from '../services/mail/queueLetter.ts'
import { mailJobsDue } from '../services/rounds/mailJobsDue.ts'
import type { Services } from '../services/services.ts'

interface Told { certifier: { email: string; name: string }; organisation: string; endsOn: string }

/** Letters of the farm, so that its page of mail shows some: what the certifier was granted, and what is due once the day has begun there. */
export async function seedLetters(services: Services, owner: FarmActor, { certifier, organisation, endsOn }: Told): Promise<void> {
  const { farmId, farmName: farm, personName, zone, seasonStart } = owner
  const season = seasonOf(civilDateIn(zone, services.clock.now().toISOString()), seasonStart)
  await services.database.inFarm(owner, (manager) => queueLetter(services, manager, {
    farmId, kind: 'grant', language: 'en', to: certifier,
    params: { farm, by: personName ?? '', organisation, seasons: String(season), endsOn, token: '', untilOn: '' },
  }))
  await mailJobsDue(services)
}
