import { v7 as uuidV7 } from 'uuid'
import { civilDateIn } from '../../shared/time/civilDate.ts'
import type { FarmActor } from '../database/actor.ts'
import { Person } from '../entities/Person.ts'
import { addPaper } from '../services/people/papers.ts'
import { givePin } from '../services/people/setPin.ts'
import type { Services } from '../services/services.ts'
import { DEMO_ZONE } from './demoZone.ts'

const DAY_MS = 86_400_000
/** Opens nothing by itself: somebody who leads the farm must have made a phone the farm's first. */
const RUANS_PIN = '418263'

/** Gives Ruan a PIN, and people their training and licences: one that runs out soon, one that has. */
export async function seedPeople(services: Services, manager: FarmActor, { applicatorId, ruanId }: { applicatorId: string; ruanId: string }): Promise<void> {
  await services.database.inFarm(manager, async (tx) => {
    await givePin(services, tx, await tx.findOneByOrFail(Person, { farmId: manager.farmId, id: ruanId }), RUANS_PIN)
  })
  const day = (days: number): string => civilDateIn(DEMO_ZONE, new Date(services.clock.now().getTime() + days * DAY_MS).toISOString())
  const papers = [
    { personId: applicatorId, kind: 'licence' as const, title: 'Applicator licence', number: 'WH-2207', issuedOn: day(-710), expiresOn: day(19) },
    { personId: applicatorId, kind: 'training' as const, title: 'First aid', number: null, issuedOn: day(-200), expiresOn: day(530) },
    { personId: ruanId, kind: 'training' as const, title: 'Worker protection', number: null, issuedOn: day(-380), expiresOn: day(-15) },
  ]
  for (const paper of papers) await addPaper(services, manager, { id: uuidV7(), ...paper })
}
