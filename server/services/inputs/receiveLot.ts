import { v7 as uuidV7 } from 'uuid'
import type { EntityManager } from 'typeorm'
import type { CreateLot, Lot as LotAnswer } from '../../../shared/contract/input.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { dimensionOf } from '../../../shared/units/dimensionOf.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { Lot } from '../../entities/Lot.ts'
import { LotEntry } from '../../entities/LotEntry.ts'
import { Material } from '../../entities/Material.ts'
import { invalid } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { digestOf, insertOnce } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { presentLot } from './presentInputs.ts'

/**
 * Receives a lot of a material; its first ledger entry says how much. @returns the lot, and whether this call made it.
 * @throws {AppError} `time.future` for a day that has not come on the farm, `material.unknown`, a unit that does not fit.
 */
export async function receiveLot(services: Services, actor: FarmActor, input: CreateLot): Promise<{ made: boolean; lot: LotAnswer }> {
  return services.database.inFarm(actor, async (manager) => {
    assertArrived(services, actor, input)
    const material = await findFittingMaterial(manager, actor, input)
    const { quantity, ...facts } = input
    const row: Lot = {
      ...facts,
      farmId: actor.farmId,
      quantity: quantity.value,
      unit: quantity.unit,
      leftQuantity: quantity.value,
      revision: 1,
      creationDigest: digestOf(input),
      createdAt: services.clock.now(),
    }
    const { made, stored } = await insertOnce(manager, Lot, row, { path: 'code', code: 'code.taken', params: { code: input.code } })
    if (made) {
      await manager.insert(LotEntry, {
        farmId: actor.farmId, id: uuidV7(), lotId: input.id, kind: 'received', amount: quantity.value, leftAfter: quantity.value,
        recordId: null, reason: null, personId: personOf(actor), at: services.clock.now(),
      })
      await appendJournal(services, manager, actor, { action: 'lot.received', subjectId: input.id, detail: { code: input.code } })
    }
    return { made, lot: presentLot(stored, material.name) }
  })
}

function assertArrived({ clock }: Services, { zone }: FarmActor, { receivedOn }: CreateLot): void {
  const today = civilDateIn(zone, clock.now().toISOString())
  if (receivedOn > today) throw invalid([{ path: 'receivedOn', code: 'time.future' }])
}

async function findFittingMaterial(manager: EntityManager, actor: FarmActor, input: CreateLot): Promise<Material> {
  const material = await manager.findOneBy(Material, { farmId: actor.farmId, id: input.materialId })
  if (!material) throw invalid([{ path: 'materialId', code: 'material.unknown' }])
  if (dimensionOf(input.quantity.unit) !== material.measuredIn) {
    throw invalid([{ path: 'quantity.unit', code: `unit.needs_${material.measuredIn}` }])
  }
  if (input.expiresOn !== null && input.expiresOn < input.receivedOn) {
    throw invalid([{ path: 'expiresOn', code: 'lot.expires_before' }])
  }
  return material
}
