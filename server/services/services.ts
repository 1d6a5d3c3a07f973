import type { Logger } from 'pino'
import type { Clock } from '../clock.ts'
import type { Config } from '../config.ts'
import type { Database } from '../database/database.ts'
import type { FileStore } from '../adapters/files/fileStore.ts'
import type { TileSource } from '../adapters/tiles/tileSource.ts'
import type { ReportProcess } from '../reports/reportProcess.ts'

/** What a use case may reach; made once at start, replaced piece by piece in tests. */
export interface Services {
  config: Config
  clock: Clock
  database: Database
  logger: Logger
  reports: ReportProcess
  files: FileStore
  /** Null where no map ground is set up. */
  tiles: TileSource | null
  /** Holds every answer against its schema before it is sent; on in tests. */
  checkAnswers: boolean
}
