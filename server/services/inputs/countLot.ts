import type { CountLot, Lot as LotAnswer } from '../../../shared/contract/input.ts'
import { convertQuantity } from '../../../shared/units/convertQuantity.ts'
import { dimensionOf } from '../../../shared/units/dimensionOf.ts'
import { subtractDecimals } from '../../../shared/units/subtractDecimals.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { Lot } from '../../entities/Lot.ts'
import { LotEntry } from '../../entities/LotEntry.ts'
import { Material } from '../../entities/Material.ts'
import { invalid, notFound, stale } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import type { Services } from '../services.ts'
import { presentLot } from './presentInputs.ts'

/**
 * Sets what is left of a lot to what was counted, with the reason; the difference stands in its ledger.
 * A repeat under the same id changes nothing.
 * @throws {AppError} not-found, `stale` if the lot changed since it was read, `lot.dimension` for a unit that does not fit.
 */
export async function countLot(services: Services, actor: FarmActor, lotId: string, input: CountLot): Promise<LotAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const lot = await manager.findOne(Lot, { where: { farmId: actor.farmId, id: lotId }, lock: { mode: 'pessimistic_write' } })
    if (!lot) throw notFound()
    const material = await manager.findOneByOrFail(Material, { farmId: actor.farmId, id: lot.materialId })
    const repeated = await manager.findOneBy(LotEntry, { farmId: actor.farmId, id: input.id })
    if (repeated) {
      if (!isSameCount(repeated, lot, input)) throw invalid([{ path: 'id', code: 'idempotency.mismatch' }])
      return presentLot(lot, material.name)
    }
    if (lot.revision !== input.revision) throw stale(presentLot(lot, material.name))
    if (dimensionOf(input.left.unit) !== dimensionOf(lot.unit)) {
      throw invalid([{ path: 'left.unit', code: 'lot.dimension', params: { code: lot.code, unit: lot.unit } }])
    }
    const left = convertQuantity(input.left, lot.unit)
    await manager.insert(LotEntry, {
      farmId: actor.farmId, id: input.id, lotId, kind: 'counted', amount: subtractDecimals(left, lot.leftQuantity), leftAfter: left,
      recordId: null, reason: input.reason, personId: personOf(actor), at: services.clock.now(),
    })
    const counted = { ...lot, leftQuantity: left, revision: lot.revision + 1 }
    await manager.update(Lot, { farmId: actor.farmId, id: lotId }, { leftQuantity: left, revision: counted.revision })
    await appendJournal(services, manager, actor, { action: 'lot.counted', subjectId: lotId, detail: { code: lot.code, left } })
    return presentLot(counted, material.name)
  })
}

function isSameCount(entry: LotEntry, lot: Lot, { left, reason }: CountLot): boolean {
  if (entry.lotId !== lot.id || entry.kind !== 'counted' || entry.reason !== reason) return false
  return dimensionOf(left.unit) === dimensionOf(lot.unit) && Number(entry.leftAfter) === Number(convertQuantity(left, lot.unit))
}
