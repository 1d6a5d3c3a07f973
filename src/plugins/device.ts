import { openDB, type DBSchema, type IDBPDatabase, type StoreNames } from 'idb'
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

interface DeviceShape extends DBSchema {
  drafts: { key: string; value: Draft }
  outbox: { key: string; value: KeptCommand }
  reads: { key: string; value: KeptRead }
  files: { key: string; value: KeptFile }
}

/** The number of this layout on the devices that have it; each later layout takes ten more. */
const VERSION = 20
const KEYS = { drafts: 'id', outbox: 'key', reads: 'key', files: 'id' } as const

let opened: Promise<IDBPDatabase<DeviceShape>> | null = null

function open(): Promise<IDBPDatabase<DeviceShape>> {
  const forget = (): void => { opened = null }
  opened ??= openDB<DeviceShape>('drenchleaf', VERSION, {
    upgrade(database) {
      for (const name of ['drafts', 'outbox', 'reads', 'files'] as const) {
        if (!database.objectStoreNames.contains(name)) database.createObjectStore(name, { keyPath: KEYS[name] })
      }
    },
    // A newer page waits for this one to let go; and a browser may close a database for want of room. The next call opens it again.
    blocking(_current, _wanted, { target }) { if (target instanceof IDBDatabase) target.close(); forget() },
    terminated: forget,
  })
  opened.catch(forget)
  return opened
}

/** One table of the device; each call rejects where the device lends no room. */
function tableOf<Name extends StoreNames<DeviceShape>>(name: Name, changed: () => void = () => undefined) {
  type Row = DeviceShape[Name]['value']
  const told = async (work: Promise<unknown>): Promise<void> => { await work; changed() }
  return {
    get: async (key: string): Promise<Row | undefined> => (await open()).get(name, key),
    all: async (): Promise<Row[]> => (await open()).getAll(name),
    count: async (): Promise<number> => (await open()).count(name),
    put: async (row: Row): Promise<void> => told((await open()).put(name, row)),
    delete: async (key: string): Promise<void> => told((await open()).delete(name, key)),
    clear: async (): Promise<void> => told((await open()).clear(name)),
    /** Reads one row and writes what `turn` makes of it, with nobody between; undefined writes nothing. Gives the row as it is then. */
    async change(key: string, turn: (before: Row | undefined) => Row | undefined): Promise<Row | undefined> {
      const work = (await open()).transaction(name, 'readwrite')
      const before = await work.store.get(key)
      const after = turn(before)
      if (after !== undefined) await work.store.put(after)
      await work.done
      if (after !== undefined) changed()
      return after ?? before
    },
  }
}

const CHANNEL = 'drenchleaf-device'
const watchers = new Set<() => void>()

function tellOfDrafts(): void {
  for (const seen of watchers) seen()
  const channel = new BroadcastChannel(CHANNEL)
  channel.postMessage('drafts')
  channel.close()
}

/** What the device keeps: drafts, commands and files not yet sent, and the last reads. */
export const device = { drafts: tableOf('drafts', tellOfDrafts), outbox: tableOf('outbox'), reads: tableOf('reads'), files: tableOf('files') }

/** Calls back when drafts of this device changed, in this tab or another; returns how to stop. */
export function watchDrafts(seen: () => void): () => void {
  const channel = new BroadcastChannel(CHANNEL)
  channel.onmessage = seen
  watchers.add(seen)
  return () => { watchers.delete(seen); channel.close() }
}
