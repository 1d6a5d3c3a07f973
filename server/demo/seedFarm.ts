import { updateFarmSchema } from '../../shared/contract/farmProfile.ts'
import { addDays } from '../../shared/time/calendar.ts'
import type { FarmActor } from '../database/actor.ts'
import { farmToday } from '../services/blocks/drawingDay.ts'
import { updateFarm } from '../services/farms/updateFarm.ts'
import { updateStart } from '../services/farms/startSteps.ts'
import type { Services } from '../services/services.ts'

/** Certificate, contact and rule sets of the demo farm; its first hour is long over. */
export async function seedFarm(services: Services, actor: FarmActor): Promise<void> {
  const today = farmToday(services, actor)
  await updateFarm(services, actor, updateFarmSchema.parse({
    revision: 1,
    certificate: { number: 'OKL-2019-0417', body: 'Oaklode Review', scope: 'Crops: orchard, vines, berries, herbs, vegetables', issuedOn: addDays(today, -201), expiresOn: addDays(today, 164) },
    contact: { person: 'Hesper Quill', address: 'Wennick Hollow, Brook Lane', phone: '555 0142', email: 'owner@demo.test' },
    units: 'metric', ruleSets: ['usOrganic', 'usProduceSafety', 'usWorkerProtection'],
  }))
  await updateStart(services, actor, { away: true })
}
