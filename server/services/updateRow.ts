import type { EntityManager, EntityTarget, FindOptionsWhere, ObjectLiteral } from 'typeorm'
import type { QueryDeepPartialEntity } from 'typeorm/query-builder/QueryPartialEntity.js'

/** Writes columns of one row, each of the type that its entity gives it; the library's own type takes JSON columns apart. */
export async function updateRow<Row extends ObjectLiteral>(
  manager: EntityManager, target: EntityTarget<Row>, key: FindOptionsWhere<Row>, changes: Partial<Row>,
): Promise<void> {
  await manager.update(target, key, changes as QueryDeepPartialEntity<Row>)
}
