import { In } from 'typeorm'
import type { Page } from '../../../shared/contract/common.ts'
import type { Lot as LotAnswer, Material as MaterialAnswer } from '../../../shared/contract/input.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Lot } from '../../entities/Lot.ts'
import { Material } from '../../entities/Material.ts'
import { listByKey } from '../listByKey.ts'
import type { Services } from '../services.ts'
import { presentLot, presentMaterial } from './presentInputs.ts'

/** A page of the farm's materials by name. */
export function listMaterials(services: Services, actor: FarmActor, page: Page): Promise<{ items: MaterialAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, (manager) => listByKey(manager, Material, page, actor.farmId, { key: 'name', present: presentMaterial }))
}

/** A page of the farm's lots by code, of one material where asked. */
export function listLots(
  services: Services,
  actor: FarmActor,
  page: Page & { materialId?: string | undefined },
): Promise<{ items: LotAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, async (manager) => {
    const where = page.materialId === undefined ? {} : { materialId: page.materialId }
    const lots = await listByKey(manager, Lot, page, actor.farmId, { key: 'code', where, present: (lot) => lot })
    const ids = [...new Set(lots.items.map((lot) => lot.materialId))]
    const materials = await manager.find(Material, { select: { id: true, name: true }, where: { farmId: actor.farmId, id: In(ids) } })
    const names = new Map(materials.map(({ id, name }) => [id, name]))
    return { items: lots.items.map((lot) => presentLot(lot, names.get(lot.materialId) ?? '')), next: lots.next }
  })
}
