import { v7 as uuidV7 } from 'uuid'
import { createMaterialSchema } from '../../shared/contract/input.ts'
import { civilDateIn } from '../../shared/time/civilDate.ts'
import { fixedClock } from '../clock.ts'
import type { FarmActor } from '../database/actor.ts'
import { createMaterial } from '../services/inputs/createMaterial.ts'
import { receiveLot } from '../services/inputs/receiveLot.ts'
import type { Services } from '../services/services.ts'
import { buildLot } from './buildThings.ts'
import { DEMO_MATERIALS } from './demoInputs.ts'
import { DEMO_ZONE } from './demoZone.ts'

const DAY_MS = 86_400_000

export interface DemoLots {
  materialId: string
  /** Newest first. */
  lots: { id: string; receivedAt: Date }[]
}

/** The demo farm's materials and lots; days are counted back from now, so that something always runs out soon. */
export async function seedInputs(services: Services, actor: FarmActor): Promise<Map<string, DemoLots>> {
  const now = services.clock.now().getTime()
  const found = new Map<string, DemoLots>()
  for (const [name, { material, lots }] of Object.entries(DEMO_MATERIALS)) {
    const { material: made } = await createMaterial(services, actor, createMaterialSchema.parse({ id: uuidV7(), ...material }))
    const received: DemoLots['lots'] = []
    for (const { code, origin, amount, daysAgo, keepsDays, source } of lots) {
      const receivedAt = new Date(now - daysAgo * DAY_MS)
      const expiresOn = keepsDays === null ? null : civilDateIn(DEMO_ZONE, new Date(now + (keepsDays - daysAgo) * DAY_MS).toISOString())
      const then = { ...services, clock: fixedClock(receivedAt.toISOString()) }
      const { lot } = await receiveLot(then, actor, buildLot({
        materialId: made.id, code, origin, source, expiresOn, receivedOn: civilDateIn(DEMO_ZONE, receivedAt.toISOString()), quantity: { value: amount, unit: made.measuredIn === 'mass' ? 'kg' : 'L' },
      }))
      received.push({ id: lot.id, receivedAt })
    }
    found.set(name, { materialId: made.id, lots: received })
  }
  return found
}
