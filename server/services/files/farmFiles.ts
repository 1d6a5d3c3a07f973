import type { EntityManager } from 'typeorm'
import { FileStoreFault, type FileKey } from '../../adapters/files/fileStore.ts'
import type { FarmActor } from '../../database/actor.ts'
import { AppError, invalid } from '../../errors.ts'
import type { Services } from '../services.ts'

/** One farm's files change one after another until the transaction ends: bytes and rows must not part. */
export async function lockFiles(manager: EntityManager, farmId: string): Promise<void> {
  await manager.query("SELECT pg_advisory_xact_lock(hashtextextended('files ' || $1, 0))", [farmId])
}

/** @throws {AppError} `quota` if so many bytes more would be above what the farm may keep. */
export async function assertRoom(services: Services, manager: EntityManager, farmId: string, bytes: number): Promise<void> {
  const [sum]: [{ kept: string }] = await manager.query(
    'SELECT coalesce(sum(bytes + coalesce(served_bytes, 0)), 0) AS kept FROM attachments WHERE farm_id = $1 AND removed_at IS NULL',
    [farmId],
  )
  const { quotaBytes } = services.config.files
  if (Number(sum.kept) + bytes > quotaBytes) throw invalid([{ path: 'file', code: 'quota', params: { megabytes: Math.round(quotaBytes / 1e6) } }])
}

/** Forgets the bytes that no photo or paper of the farm stands for any more. */
export async function forgetUnheld(services: Services, { farmId }: Pick<FarmActor, 'farmId'>, digests: string[]): Promise<void> {
  await services.database.inFarm({ farmId, seasons: null }, async (manager) => {
    await lockFiles(manager, farmId)
    for (const digest of digests) {
      const [held]: [{ held: boolean }] = await manager.query(
        'SELECT EXISTS (SELECT 1 FROM attachments WHERE farm_id = $1 AND removed_at IS NULL AND (digest = $2 OR served_digest = $2)) AS held',
        [farmId, digest],
      )
      if (!held.held) await services.files.remove({ farmId, digest })
    }
  })
}

/** Keeps bytes. @throws {AppError} unavailable, once logged, when the store is full or out of reach. */
export async function keepBytes(services: Services, key: FileKey, bytes: Buffer): Promise<void> {
  await orUnavailable(services, services.files.put(key, bytes))
}

/** The answer of the file store. @throws {AppError} unavailable, once logged, when it has none. */
export async function orUnavailable<T>(services: Services, work: Promise<T>): Promise<T> {
  return work.catch((cause: unknown) => {
    if (!(cause instanceof FileStoreFault)) throw cause
    services.logger.error({ err: cause }, 'file store failed')
    throw new AppError('unavailable', 'file_store')
  })
}
