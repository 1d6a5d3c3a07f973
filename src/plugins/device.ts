import Dexie, { type Table } from 'dexie'
import type { Draft } from '../stores/draftTypes.ts'
import type { KeptCommand } from '../stores/keptCommand.ts'
import type { KeptFile } from '../stores/keptFile.ts'

/** The last answer of one read, so that a form opens without signal. */
interface KeptRead {
  /** `${farmId}/${name}`, or a name alone for what belongs to no farm. */
  key: string
  accountId: string
  answer: unknown
  readAt: string
}

/** What the device keeps: drafts, commands and files not yet sent, and the last reads. */
class DeviceDatabase extends Dexie {
  drafts!: Table<Draft, string>
  outbox!: Table<KeptCommand, string>
  reads!: Table<KeptRead, string>
  files!: Table<KeptFile, string>

  constructor() {
    super('drenchleaf')
    this.version(1).stores({
      drafts: 'id, [accountId+farmId], updatedAt',
      outbox: 'key, accountId, keptAt',
      reads: 'key, accountId',
    })
    this.version(2).stores({ files: 'id, recordId, accountId, keptAt' })
  }
}

/** The one database of this device. */
export const device = new DeviceDatabase()
