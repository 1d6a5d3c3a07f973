import type { Page } from '../../../shared/contract/common.ts'
import { savedQuerySchema, type CreateSavedFilter, type SavedFilter as SavedAnswer } from '../../../shared/contract/savedFilter.ts'
import type { FarmActor } from '../../database/actor.ts'
import { SavedFilter } from '../../entities/SavedFilter.ts'
import { AppError, notFound } from '../../errors.ts'
import { digestOf, insertOnce } from '../insertOnce.ts'
import { listByKey } from '../listByKey.ts'
import type { Services } from '../services.ts'

/** So many filters one account keeps on one farm. */
const MOST_FILTERS = 50

/** The filters that the caller keeps on this farm, by name; nobody sees another's. */
export async function listSavedFilters(services: Services, actor: FarmActor, page: Page): Promise<{ items: SavedAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, (manager) =>
    listByKey(manager, SavedFilter, page, actor.farmId, { key: 'name', where: { accountId: actor.accountId }, present: presentFilter }))
}

/** Keeps a filter under a name. @returns it, and whether this call made it. @throws {AppError} `filters.full`. */
export async function saveFilter(services: Services, actor: FarmActor, input: CreateSavedFilter): Promise<{ made: boolean; filter: SavedAnswer }> {
  const { farmId, accountId } = actor
  return services.database.inFarm(actor, async (manager) => {
    const kept = await manager.countBy(SavedFilter, { farmId, accountId })
    if (kept >= MOST_FILTERS) throw new AppError('conflict', 'conflict', { errors: [{ path: 'id', code: 'filters.full', params: { maximum: MOST_FILTERS } }] })
    const row: SavedFilter = { ...input, farmId, accountId, creationDigest: digestOf({ ...input, accountId }), createdAt: services.clock.now() }
    const { made, stored } = await insertOnce(manager, SavedFilter, row, { path: 'id', code: 'idempotency.mismatch' })
    return { made, filter: presentFilter(stored) }
  })
}

/** Forgets a filter of the caller's own. @throws {AppError} not-found. */
export async function forgetFilter(services: Services, actor: FarmActor, id: string): Promise<void> {
  const { farmId, accountId } = actor
  const { affected } = await services.database.inFarm(actor, (manager) => manager.delete(SavedFilter, { farmId, id, accountId }))
  if (affected === 0) throw notFound()
}

function presentFilter({ id, name, query, createdAt }: SavedFilter): SavedAnswer {
  return { id, name, query: savedQuerySchema.parse(query), createdAt: createdAt.toISOString() }
}
