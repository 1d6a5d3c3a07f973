import { z } from 'zod'
import type { EntityManager, EntityTarget, ObjectLiteral } from 'typeorm'
import type { Page } from '../../shared/contract/common.ts'
import { cutPage, decodeCursor } from './cursor.ts'

/** Names and codes as the database can compare them: whole characters, no NUL. */
const nameKey = z.string().max(200).refine((text) => text.isWellFormed() && !text.includes('\u0000'))

/**
 * A page of a farm's things in the order of one text column, or of their ids, which are in the order of their making.
 * Ids break ties. `where` takes columns as they must be, null for what must not be there.
 */
export async function listByKey<Row extends ObjectLiteral & { id: string }, Item>(
  manager: EntityManager,
  target: EntityTarget<Row>,
  page: Page,
  farmId: string,
  shape: { key: 'code' | 'name' | 'id'; where?: Partial<Record<string, string | null>>; present: (row: Row) => Item },
): Promise<{ items: Item[]; next: string | null }> {
  const after = decodeCursor(page.cursor, shape.key === 'id' ? z.guid() : nameKey)
  const query = manager.getRepository(target).createQueryBuilder('thing').where('thing.farmId = :farmId', { farmId })
  for (const [column, value] of Object.entries(shape.where ?? {})) {
    if (value === null) query.andWhere(`thing.${column} IS NULL`)
    else query.andWhere(`thing.${column} = :${column}`, { [column]: value })
  }
  if (after) query.andWhere(`(thing.${shape.key}, thing.id) > (:key, :id)`, { key: after.key, id: after.id })
  const rows = await query.orderBy(`thing.${shape.key}`).addOrderBy('thing.id').limit(page.limit + 1).getMany()
  return cutPage(rows, page.limit, shape.present, (row) => [String(row[shape.key]), row.id])
}
