import type { CreateMaterial, Material as MaterialAnswer } from '../../../shared/contract/input.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Material } from '../../entities/Material.ts'
import { appendJournal } from '../appendJournal.ts'
import { digestOf, insertOnce } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { presentMaterial } from './presentInputs.ts'

/** Takes a material into the farm's list. @returns the material, and whether this call made it. */
export async function createMaterial(services: Services, actor: FarmActor, input: CreateMaterial): Promise<{ made: boolean; material: MaterialAnswer }> {
  return services.database.inFarm(actor, async (manager) => {
    const row: Material = {
      ...input,
      farmId: actor.farmId,
      revision: 1,
      creationDigest: digestOf(input),
      createdAt: services.clock.now(),
    }
    const { made, stored } = await insertOnce(manager, Material, row, { path: 'name', code: 'name.taken', params: { name: input.name } })
    if (made) await appendJournal(services, manager, actor, { action: 'material.created', subjectId: input.id, detail: { name: input.name } })
    return { made, material: presentMaterial(stored) }
  })
}
