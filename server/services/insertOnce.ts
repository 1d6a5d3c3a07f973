import type { EntityManager, EntityTarget, ObjectLiteral } from 'typeorm'
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
 * Inserts a thing under the id its maker gave it.
 * @returns true when it is new, false when the same command was already carried out.
 * @throws {AppError} `idempotency.mismatch` if the id holds other content, `conflict` with `taken` if another thing
 *   of the farm has its code or name.
 */
export async function insertOnce<Row extends Creatable>(
  manager: EntityManager,
  target: EntityTarget<Row>,
  row: Row,
  taken: FieldError,
): Promise<boolean> {
  const result = await manager.createQueryBuilder().insert().into(target).values(row as never).orIgnore().returning('id').execute()
  if ((result.raw as unknown[]).length > 0) return true
  const [present] = await manager.getRepository(target).createQueryBuilder('thing')
    .where('thing.farmId = :farmId AND thing.id = :id', { farmId: row.farmId, id: row.id })
    .getMany()
  if (!present) throw new AppError('conflict', 'conflict', { errors: [taken] })
  if (present.creationDigest !== row.creationDigest) throw invalid([{ path: 'id', code: 'idempotency.mismatch' }])
  return false
}
