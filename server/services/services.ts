import type { Logger } from 'pino'
import type { Clock } from '../clock.ts'
import type { Config } from '../config.ts'
import type { Database } from '../database/database.ts'
import type { FileStore } from '../adapters/files/fileStore.ts'
import type { KeptMail } from '../adapters/mail/keptMail.ts'
import type { Mailer } from '../adapters/mail/mailer.ts'
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
  mailer: Mailer
  /** What would have gone out, where no mail server is named; null where one is. */
  keptMail: KeptMail | null
  /** Holds every answer against its schema before it is sent; on in tests. */
  checkAnswers: boolean
}
