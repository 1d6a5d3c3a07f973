import type { Page } from '../../../shared/contract/common.ts'
import type { Grant as GrantAnswer } from '../../../shared/contract/grant.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Grant } from '../../entities/Grant.ts'
import { listByKey } from '../listByKey.ts'
import type { Services } from '../services.ts'
import { presentGrants } from './presentGrants.ts'

/** A page of the farm's grants, those that ended included, in the order they were given. */
export async function listGrants(services: Services, actor: FarmActor, page: Page): Promise<{ items: GrantAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, async (manager) => {
    const { items, next } = await listByKey(manager, Grant, page, actor.farmId, { key: 'id', present: (grant) => grant })
    return { items: await presentGrants(services, manager, actor, items), next }
  })
}
