import { In, type EntityManager } from 'typeorm'
import { civilDateSchema } from '../../../shared/contract/common.ts'
import { fittingSchema, type Calibration as CalibrationAnswer, type CalibrationQuery, type CreateCalibration } from '../../../shared/contract/calibration.ts'
import { calibrationSheet } from '../../../shared/mix/calibrationSheet.ts'
import { addDays } from '../../../shared/time/calendar.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { Calibration } from '../../entities/Calibration.ts'
import { Farm } from '../../entities/Farm.ts'
import { Person } from '../../entities/Person.ts'
import { Sprayer } from '../../entities/Sprayer.ts'
import { AppError, forbidden, invalid, notFound } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { farmToday } from '../blocks/drawingDay.ts'
import { cutPage, decodeCursor } from '../cursor.ts'
import { digestOf, findRepeat, insertOnce } from '../insertOnce.ts'
import type { Services } from '../services.ts'

/** A page of calibrations, newest day first, those taken back among them. */
export async function listCalibrations(services: Services, { farmId, ...actor }: FarmActor, { sprayerId, ...page }: CalibrationQuery): Promise<{ items: CalibrationAnswer[]; next: string | null }> {
  const after = decodeCursor(page.cursor, civilDateSchema)
  return services.database.inFarm({ farmId, ...actor }, async (manager) => {
    const query = manager.getRepository(Calibration).createQueryBuilder('done').where('done.farmId = :farmId', { farmId })
    if (sprayerId !== undefined) query.andWhere('done.sprayerId = :sprayerId', { sprayerId })
    if (after) query.andWhere('(done.onDay, done.id) < (:key, :id)', { key: after.key, id: after.id })
    const rows = await query.orderBy('done.onDay', 'DESC').addOrderBy('done.id', 'DESC').limit(page.limit + 1).getMany()
    const { items, next } = cutPage(rows, page.limit, (row) => row, ({ onDay, id }) => [onDay, id])
    return { items: await presentAll(manager, items), next }
  })
}

/**
 * Writes down what was measured on a sprayer; the next one is due after the farm's interval.
 * @returns it, and whether this call made it. @throws {AppError} `sprayer.unknown`, `sprayer.retired`, `time.future`, `calibration.fewer_nozzles`.
 */
export async function createCalibration(services: Services, actor: FarmActor, input: CreateCalibration): Promise<{ made: boolean; calibration: CalibrationAnswer }> {
  const { farmId } = actor
  const { id, sprayerId, on, doneBy, measured, note } = input
  return services.database.inFarm(actor, async (manager) => {
    const creationDigest = digestOf(input)
    const repeated = await findRepeat(manager, Calibration, { farmId, id, creationDigest })
    if (repeated) return { made: false, calibration: await presentOne(manager, repeated) }
    const sprayer = await manager.findOne(Sprayer, { where: { farmId, id: sprayerId }, lock: { mode: 'pessimistic_read' } })
    if (!sprayer) throw invalid([{ path: 'sprayerId', code: 'sprayer.unknown' }])
    if (sprayer.retiredOn !== null) throw invalid([{ path: 'sprayerId', code: 'sprayer.retired' }])
    if (on > farmToday(services, actor)) throw invalid([{ path: 'on', code: 'time.future' }])
    if (measured.kind === 'catch' && measured.nozzles < measured.catchesMl.length) throw invalid([{ path: 'measured.nozzles', code: 'calibration.fewer_nozzles' }])
    const { calibrationDays } = await manager.findOneByOrFail(Farm, { id: farmId })
    const row: Calibration = {
      farmId, id, sprayerId, onDay: on, dueOn: addDays(on, calibrationDays), doneBy, measured, fitting: sprayer.fitting ?? fittingSchema.parse({}), note,
      byId: personOf(actor), at: services.clock.now(), withdrawnAt: null, withdrawnById: null, withdrawnReason: null, creationDigest,
    }
    const { made, stored } = await insertOnce(manager, Calibration, row, { path: 'id', code: 'idempotency.mismatch' })
    if (made) await appendJournal(services, manager, actor, { action: 'calibration.created', subjectId: id, detail: { code: sprayer.code, on } })
    return { made, calibration: await presentOne(manager, stored) }
  })
}

/** Takes a calibration back, with the reason; it stays readable. Whoever wrote it may, and leaders. @throws {AppError} not-found, forbidden, `calibration.withdrawn`. */
export async function withdrawCalibration(services: Services, actor: FarmActor, id: string, { reason }: { reason: string }): Promise<CalibrationAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const found = await manager.findOne(Calibration, { where: { farmId: actor.farmId, id }, lock: { mode: 'pessimistic_write' } })
    if (!found) throw notFound()
    if (actor.role === 'applicator' && found.byId !== actor.personId) throw forbidden('calibration.not_yours')
    if (found.withdrawnAt !== null) {
      if (found.withdrawnReason === reason && found.withdrawnById === actor.personId) return presentOne(manager, found)
      throw new AppError('conflict', 'calibration.withdrawn', { current: await presentOne(manager, found) })
    }
    const changes = { withdrawnAt: services.clock.now(), withdrawnById: personOf(actor), withdrawnReason: reason }
    await manager.update(Calibration, { farmId: actor.farmId, id }, changes)
    await appendJournal(services, manager, actor, { action: 'calibration.withdrawn', subjectId: id, detail: { reason } })
    return presentOne(manager, { ...found, ...changes })
  })
}

async function presentOne(manager: EntityManager, row: Calibration): Promise<CalibrationAnswer> {
  const [answer] = await presentAll(manager, [row])
  if (!answer) throw new RangeError('A calibration was lost while it was shown')
  return answer
}

async function presentAll(manager: EntityManager, rows: readonly Calibration[]): Promise<CalibrationAnswer[]> {
  const [first] = rows
  if (!first) return []
  const ids = rows.flatMap(({ byId, withdrawnById }) => [byId, ...(withdrawnById === null ? [] : [withdrawnById])])
  const people = await manager.find(Person, { select: { id: true, name: true }, where: { farmId: first.farmId, id: In(ids) } })
  const person = (id: string) => ({ id, name: people.find((candidate) => candidate.id === id)?.name ?? '' })
  return rows.map(({ id, sprayerId, onDay, dueOn, doneBy, measured, fitting, note, byId, at, withdrawnAt, withdrawnById, withdrawnReason }) => ({
    id, sprayerId, on: onDay, doneBy, dueOn, measured, fitting, rateLPerHa: calibrationSheet(measured).rateLPerHa, note, by: person(byId), at: at.toISOString(),
    withdrawn: withdrawnAt === null ? null : { at: withdrawnAt.toISOString(), by: person(withdrawnById ?? ''), reason: withdrawnReason ?? '' },
  }))
}
