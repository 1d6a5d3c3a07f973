import type { EntityManager } from 'typeorm'
import type { z } from 'zod'
import { fittingSchema } from '../../../shared/contract/calibration.ts'
import type { Page } from '../../../shared/contract/common.ts'
import type { createSprayerSchema, Sprayer as SprayerAnswer, UpdateSprayer } from '../../../shared/contract/farm.ts'
import type { JournalAction } from '../../../shared/journal/journalActions.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Sprayer } from '../../entities/Sprayer.ts'
import { AppError, notFound, stale } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { farmToday } from '../blocks/drawingDay.ts'
import { digestOf, insertOnce } from '../insertOnce.ts'
import { listByKey } from '../listByKey.ts'
import { saidParts } from '../saidParts.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'
import { listInForce } from './calibrationInForce.ts'

/** A page of the farm's sprayers and drenchers by code, each with the calibration it goes by. */
export function listSprayers(services: Services, actor: FarmActor, page: Page): Promise<{ items: SprayerAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, async (manager) => {
    const { items, next } = await listByKey(manager, Sprayer, page, actor.farmId, { key: 'code', present: (row) => row })
    return { items: await presentAll(manager, items), next }
  })
}

/** Takes a sprayer into the farm's list. @returns the sprayer, and whether this call made it. */
export async function createSprayer(services: Services, actor: FarmActor, input: z.output<typeof createSprayerSchema>): Promise<{ made: boolean; sprayer: SprayerAnswer }> {
  return services.database.inFarm(actor, async (manager) => {
    const row: Sprayer = {
      ...input, fitting: input.fitting ?? null, farmId: actor.farmId, retiredOn: null, retiredReason: null,
      revision: 1, creationDigest: digestOf(input), createdAt: services.clock.now(),
    }
    const { made, stored } = await insertOnce(manager, Sprayer, row, takenCode(input.code))
    if (made) await appendJournal(services, manager, actor, { action: 'sprayer.created', subjectId: input.id, detail: { code: input.code } })
    return { made, sprayer: await presentOne(manager, stored) }
  })
}

/** Changes a sprayer; calibrations keep what was fitted when they were made. @throws {AppError} not-found, `stale`, `code.taken`, `sprayer.retired`. */
export async function updateSprayer(services: Services, actor: FarmActor, id: string, { revision, ...sent }: UpdateSprayer): Promise<SprayerAnswer> {
  const wanted = saidParts(sent)
  return changeSprayer(services, actor, { id, revision }, async (manager, sprayer) => {
    const { code } = wanted
    if (code !== undefined && (await isTaken(manager, sprayer, code))) throw new AppError('conflict', 'conflict', { errors: [takenCode(code)] })
    const before = Object.fromEntries(Object.keys(wanted).map((key) => [key, sprayer[key as keyof typeof wanted]]))
    return { changes: wanted, action: 'sprayer.updated', detail: { before, after: wanted } }
  })
}

/** Puts a sprayer out of use, with the reason; what was recorded with it stays. @throws {AppError} not-found, `stale`, `sprayer.retired`. */
export async function retireSprayer(services: Services, actor: FarmActor, id: string, { revision, reason }: { revision: number; reason: string }): Promise<SprayerAnswer> {
  return changeSprayer(services, actor, { id, revision }, async () =>
    Promise.resolve({ changes: { retiredOn: farmToday(services, actor), retiredReason: reason }, action: 'sprayer.retired', detail: { reason } }))
}

interface Change { changes: Partial<Sprayer>; action: JournalAction; detail: object }

async function changeSprayer(
  services: Services, actor: FarmActor, { id, revision }: { id: string; revision: number }, plan: (manager: EntityManager, sprayer: Sprayer) => Promise<Change>,
): Promise<SprayerAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const sprayer = await manager.findOne(Sprayer, { where: { farmId: actor.farmId, id }, lock: { mode: 'pessimistic_write' } })
    if (!sprayer) throw notFound()
    if (sprayer.revision !== revision) throw stale(await presentOne(manager, sprayer))
    if (sprayer.retiredOn !== null) throw new AppError('conflict', 'sprayer.retired', { current: await presentOne(manager, sprayer) })
    const { changes, action, detail } = await plan(manager, sprayer)
    const written = { ...changes, revision: revision + 1 }
    await updateRow(manager, Sprayer, { farmId: actor.farmId, id }, written)
    await appendJournal(services, manager, actor, { action, subjectId: id, detail: { code: sprayer.code, ...detail } })
    return presentOne(manager, { ...sprayer, ...written })
  })
}

const takenCode = (code: string) => ({ path: 'code', code: 'code.taken', params: { code } })

function isTaken(manager: EntityManager, { farmId, id }: Sprayer, code: string): Promise<boolean> {
  return manager.createQueryBuilder(Sprayer, 'sprayer').where('sprayer.farmId = :farmId AND sprayer.id <> :id AND lower(sprayer.code) = lower(:code)', { farmId, id, code }).getExists()
}

async function presentOne(manager: EntityManager, sprayer: Sprayer): Promise<SprayerAnswer> {
  const [answer] = await presentAll(manager, [sprayer])
  if (!answer) throw new RangeError('A sprayer was lost while it was shown')
  return answer
}

async function presentAll(manager: EntityManager, sprayers: readonly Sprayer[]): Promise<SprayerAnswer[]> {
  const inForce = await listInForce(manager, sprayers)
  return sprayers.map(({ id, code, name, tankL, flowLPerMin, fitting, retiredOn, retiredReason, revision }) => ({
    id, code, name, tankL, flowLPerMin, fitting: fitting ?? fittingSchema.parse({}), calibration: inForce.get(id) ?? null,
    retired: retiredOn === null ? null : { on: retiredOn, reason: retiredReason ?? '' }, revision,
  }))
}
