import { v7 as uuidV7 } from 'uuid'
import { updateFarmSchema } from '../../shared/contract/farmChanges.ts'
import { addDays } from '../../shared/time/calendar.ts'
import type { FarmActor } from '../database/actor.ts'
import { farmToday } from '../services/blocks/drawingDay.ts'
import { addCertificate } from '../services/farms/certificates.ts'
import { updateFarm } from '../services/farms/updateFarm.ts'
import { updateStart } from '../services/farms/startSteps.ts'
import type { Services } from '../services/services.ts'

/** Certificates, contact and rule sets of the demo farm; its first hour is long over. */
export async function seedFarm(services: Services, actor: FarmActor): Promise<void> {
  const today = farmToday(services, actor)
  for (const { number, from, until } of CERTIFICATES) {
    await addCertificate(services, actor, { id: uuidV7(), number, body: 'Oaklode Review', scope: 'Crops: orchard, vines, berries, herbs, vegetables', validFrom: addDays(today, from), validUntil: addDays(today, until) })
  }
  await updateFarm(services, actor, updateFarmSchema.parse({
    revision: 1,
    contact: { person: 'Hesper Quill', address: 'Wennick Hollow, Brook Lane', phone: '555 0142', email: 'owner@demo.test' },
    units: 'metric', ruleSets: ['usOrganic', 'usProduceSafety', 'usWorkerProtection'],
  }))
  await updateStart(services, actor, { away: true })
}

/** One a year; days before and after the day of seeding. */
const CERTIFICATES = [
  { number: 'OKL-2019-0288', from: -931, until: -567 },
  { number: 'OKL-2019-0356', from: -566, until: -202 },
  { number: 'OKL-2019-0417', from: -201, until: 164 },
]
