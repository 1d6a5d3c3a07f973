import type { EntityManager, EntityTarget, FindOptionsWhere, ObjectLiteral } from 'typeorm'
import type { QueryDeepPartialEntity } from 'typeorm/query-builder/QueryPartialEntity.js'
import { canonicalText } from '../../shared/evidence/canonicalText.ts'
import { sha256Hex } from '../../shared/evidence/sha256Hex.ts'
import { AppError, invalid, type FieldError } from '../errors.ts'

interface Creatable extends ObjectLiteral {
  farmId: string
  id: string
  creationDigest: string
}

/** Digest of a command as it was sent; equal for a repeat. */
export function digestOf(command: unknown): string {
  return sha256Hex(canonicalText(command))
}

/**
 * The thing that the same command made before, or null for a new id. Asked first, so that a repeat is answered as it was
 * then, whatever has changed around it since.
 * @throws {AppError} `idempotency.mismatch` if the id holds other content.
 */
export async function findRepeat<Row extends Creatable>(
  manager: EntityManager,
  target: EntityTarget<Row>,
  command: Pick<Creatable, 'farmId' | 'id' | 'creationDigest'>,
): Promise<Row | null> {
  const { farmId, id, creationDigest } = command
  const present = await manager.findOneBy(target, { farmId, id } as FindOptionsWhere<Row>)
  if (present !== null && present.creationDigest !== creationDigest) throw invalid([{ path: 'id', code: 'idempotency.mismatch' }])
  return present
}

/**
 * Inserts a thing under the id its maker gave it.
 * @returns the thing as it is stored, and whether this call made it or the same command had been carried out already.
 * @throws {AppError} `idempotency.mismatch` if the id holds other content, `conflict` with `taken` if another thing
 *   of the farm has its code or name.
 */
export async function insertOnce<Row extends Creatable>(
  manager: EntityManager,
  target: EntityTarget<Row>,
  row: Row,
  taken: FieldError,
): Promise<{ made: boolean; stored: Row }> {
  const result = await manager.createQueryBuilder().insert().into(target).values(row as QueryDeepPartialEntity<Row>).orIgnore().returning('id').execute()
  if ((result.raw as unknown[]).length > 0) return { made: true, stored: row }
  const present = await findRepeat(manager, target, row)
  if (!present) throw new AppError('conflict', 'conflict', { errors: [taken] })
  return { made: false, stored: present }
}
