import { createFolderFiles } from './adapters/files/folderFiles.ts'
import type { FileStore } from './adapters/files/fileStore.ts'
import { openMail } from './adapters/mail/openMail.ts'
import { createProxyTiles } from './adapters/tiles/proxyTiles.ts'
import { fixedClock, systemClock } from './clock.ts'
import type { Config, FilesConfig } from './config.ts'
import { clearHalfSeeded } from './database/clearHalfSeeded.ts'
import { openDatabase } from './database/database.ts'
import { prepareDatabase } from './database/prepareDatabase.ts'
import { createLogger } from './logger.ts'
import { createReportProcess } from './reports/reportProcess.ts'
import type { Services } from './services/services.ts'

/** Brings the database up to date and makes everything that use cases reach. */
export async function startServices(config: Config): Promise<Services> {
  const logger = createLogger(config.logFile)
  if (config.demo !== null) await clearHalfSeeded(config.databaseOwnerUrl)
  await prepareDatabase(config.databaseOwnerUrl, decodeURIComponent(new URL(config.databaseUrl).username))
  return {
    config,
    logger,
    clock: config.fixedClock === null ? systemClock : fixedClock(config.fixedClock),
    database: await openDatabase(config.databaseUrl, config.databasePool, (error) => logger.warn({ err: error }, 'idle database connection broke')),
    reports: createReportProcess(),
    files: await openFiles(config.files),
    ...(await openMail(config.mail)),
    tiles: config.tiles === null ? null : createProxyTiles(config.tiles),
    checkAnswers: false,
  }
}

/** The client of the bucket is loaded only where there is one. */
async function openFiles({ folder, bucket }: FilesConfig): Promise<FileStore> {
  if (bucket === null) return createFolderFiles(folder)
  const { createBucketFiles } = await import('./adapters/files/bucketFiles.ts')
  return createBucketFiles(bucket)
}
