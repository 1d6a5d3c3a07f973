import type { EntityManager } from 'typeorm'
import { z } from 'zod'
import type { RegisterRow } from '../../../shared/contract/record.ts'
import type { RegisterFilter, RegisterSort } from '../../../shared/contract/register.ts'
import type { FarmActor } from '../../database/actor.ts'
import { cutPage, decodeCursor, encodeCursor } from '../cursor.ts'
import { digestOf } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { findTerms } from './findTerms.ts'
import { keyOfSort, pageStatement } from './registerQuery.ts'

/** Sort keys as this list writes them, no further than the database reads: anybody can write a cursor. */
const KEY_SCHEMAS = {
  when: z.iso.datetime({ precision: 3, abort: true }).refine((text) => /^(?:19|2\d)/.test(text)),
  number: z.string().regex(/^\d{1,16}$/),
  area: z.string().regex(/^\d{1,15}(\.\d{1,20})?(e-\d{1,2})?$/),
}

export interface RegisterPlaceQuery { filter: RegisterFilter; sort: RegisterSort }
export interface KeyedRow { record_id: string; key: Date | string | number }
interface ListedRow extends KeyedRow { state: RegisterRow['state']; register_row: Omit<RegisterRow, 'id' | 'state'> }

/** A page of the register. @throws {AppError} invalid-input for a cursor of another filter or order. */
export async function listRegister(
  services: Services,
  actor: FarmActor,
  { limit, cursor, sort, ...filter }: RegisterFilter & { limit: number; cursor?: string | undefined; sort: RegisterSort },
): Promise<{ items: RegisterRow[]; next: string | null }> {
  return services.database.inFarm(actor, async (manager) => {
    const page = await readRegisterPage<ListedRow>(manager, actor, { filter, sort }, { limit, cursor, columns: 'd.state, d.register_row' })
    return { items: page.items.map(({ record_id, state, register_row }) => ({ id: record_id, state, ...register_row })), next: page.next }
  })
}

/** Rows of a page of the register with whatever columns of the record `d` are wanted; everything that goes through the register reads here. */
export async function readRegisterPage<Row extends KeyedRow>(
  manager: EntityManager,
  actor: Pick<FarmActor, 'farmId' | 'seasons'>,
  { filter, sort }: RegisterPlaceQuery,
  { limit, cursor, columns, joins = '' }: { limit: number; cursor?: string | undefined; columns: string; joins?: string },
): Promise<{ items: Row[]; next: string | null }> {
  const list = nameOfList({ filter, sort })
  const after = decodeCursor(cursor, KEY_SCHEMAS[keyOfSort(sort)], list)
  const search = await findTerms(manager, actor, filter)
  if (search.isEmpty) return { items: [], next: null }
  const { sql, params } = pageStatement(actor.farmId, search, { sort, after, limit: limit + 1, columns, joins })
  const rows: Row[] = await manager.query(sql, params)
  return cutPage(rows, limit, (row) => row, (row) => placeOf(row, list))
}

/** The cursor with which the list goes on after a row of it. */
export function cursorAfter(place: RegisterPlaceQuery, row: KeyedRow): string {
  return encodeCursor(...placeOf(row, nameOfList(place)))
}

/** Tells the lists of this address apart, so that a cursor of one is none of another. */
const nameOfList = ({ filter, sort }: RegisterPlaceQuery): string => digestOf({ filter, sort }).slice(0, 16)
const placeOf = ({ key, record_id }: KeyedRow, list: string): [key: string, id: string, list: string] =>
  [key instanceof Date ? key.toISOString() : String(key), record_id, list]
