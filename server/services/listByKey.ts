import { z } from 'zod'
import type { EntityManager, EntityTarget, ObjectLiteral } from 'typeorm'
import type { Page } from '../../shared/contract/common.ts'
import { cutPage, decodeCursor } from './cursor.ts'

/** Names and codes as the database can compare them: whole characters, no NUL. */
const nameKey = z.string().max(200).refine((text) => text.isWellFormed() && !text.includes('\u0000'))

/** A page of a farm's things in the order of one text column; ids break ties. */
export async function listByKey<Row extends ObjectLiteral & { id: string }, Item>(
  manager: EntityManager,
  target: EntityTarget<Row>,
  page: Page,
  farmId: string,
  shape: { key: 'code' | 'name'; where?: Partial<Record<string, string>>; present: (row: Row) => Item },
): Promise<{ items: Item[]; next: string | null }> {
  const after = decodeCursor(page.cursor, nameKey)
  const query = manager.getRepository(target).createQueryBuilder('thing').where('thing.farmId = :farmId', { farmId })
  for (const [column, value] of Object.entries(shape.where ?? {})) {
    query.andWhere(`thing.${column} = :${column}`, { [column]: value })
  }
  if (after) query.andWhere(`(thing.${shape.key}, thing.id) > (:key, :id)`, { key: after.key, id: after.id })
  const rows = await query.orderBy(`thing.${shape.key}`).addOrderBy('thing.id').limit(page.limit + 1).getMany()
  return cutPage(rows, page.limit, shape.present, (row) => [String(row[shape.key]), row.id])
}
