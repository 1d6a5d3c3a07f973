import type { FarmActor } from '../../database/actor.ts'
import type { Services } from '../services.ts'
import { readRegisterPage, type KeyedRow, type RegisterPlaceQuery } from './listRegister.ts'

const PAGE = 500

/**
 * Every row of a filter, one after the other, with whatever columns of the record `d` are wanted. Each page is a transaction of its own, so
 * that neither memory nor a connection waits for a slow reader.
 * @param limit how many rows at most; @param cursor where to begin; @param mayGoOn asked before each page, and ends it by throwing.
 */
export async function* readRegisterRows<Row extends KeyedRow>(
  services: Services,
  actor: FarmActor,
  place: RegisterPlaceQuery,
  { columns, cursor: start, limit = Number.POSITIVE_INFINITY, mayGoOn }: { columns: string; cursor?: string | undefined; limit?: number; mayGoOn?: (() => Promise<void>) | undefined },
): AsyncGenerator<Row> {
  let cursor = start
  let left = limit
  do {
    await mayGoOn?.()
    const size = Math.min(PAGE, left)
    const page = await services.database.inFarm(actor, (manager) => readRegisterPage<Row>(manager, actor, place, { limit: size, cursor, columns }))
    yield* page.items
    left -= page.items.length
    cursor = page.next ?? undefined
  } while (cursor !== undefined && left > 0)
}
