import { In, IsNull, LessThanOrEqual, type EntityManager } from 'typeorm'
import type { CalibrationInForce } from '../../../shared/contract/calibration.ts'
import { calibrationSheet } from '../../../shared/mix/calibrationSheet.ts'
import { Calibration } from '../../entities/Calibration.ts'

/**
 * The calibration each sprayer goes by: the newest that was not taken back; sprayers nobody measured are not in the answer.
 * @param until civil day; later ones are left out.
 */
export async function listInForce(manager: EntityManager, sprayers: readonly { farmId: string; id: string }[], until?: string): Promise<Map<string, CalibrationInForce>> {
  const [first] = sprayers
  if (!first) return new Map()
  const rows = await manager.find(Calibration, {
    where: { farmId: first.farmId, sprayerId: In(sprayers.map(({ id }) => id)), withdrawnAt: IsNull(), ...(until !== undefined && { onDay: LessThanOrEqual(until) }) },
    order: { onDay: 'ASC', at: 'ASC', id: 'ASC' },
  })
  // Oldest first: of each sprayer the last one written stays.
  return new Map(rows.map(({ id, sprayerId, onDay, dueOn, measured }) => [sprayerId, { id, on: onDay, dueOn, rateLPerHa: calibrationSheet(measured).rateLPerHa }]))
}
