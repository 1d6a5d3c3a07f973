import { createHash } from 'node:crypto'

/** Where the bytes of a file are kept: by farm and by their own SHA-256. */
export interface FileKey {
  farmId: string
  digest: string
}

/** Keeps files, whole or not at all. Every fault of the store itself is a `FileStoreFault`. */
export interface FileStore {
  /** Keeps the bytes; keeping them again changes nothing. */
  put(key: FileKey, bytes: Buffer): Promise<void>
  has(key: FileKey): Promise<boolean>
  /** The bytes as they are kept. */
  read(key: FileKey): Promise<Buffer>
  /** Forgets the bytes; what is not there is forgotten already. */
  remove(key: FileKey): Promise<void>
}

/** The store did not do its work: full, not reachable, or without the file. */
export class FileStoreFault extends Error {
  constructor(doing: string, cause: unknown) {
    super(`The file store failed to ${doing}`, { cause })
  }
}

/** Runs one piece of work of a store. @throws {FileStoreFault} for whatever goes wrong in it. */
export async function atStore<T>(doing: string, work: () => Promise<T>): Promise<T> {
  try {
    return await work()
  } catch (cause) {
    throw new FileStoreFault(doing, cause)
  }
}

/** SHA-256 of a file, hex; the platform's own, since a photo is a thousand times the size of a record. */
export function digestOfFile(bytes: Buffer): string {
  return createHash('sha256').update(bytes).digest('hex')
}

/** The bytes of a file. @throws {FileStoreFault} if they are gone or are not those that were taken in. */
export async function readWhole(store: FileStore, key: FileKey): Promise<Buffer> {
  const bytes = await store.read(key)
  if (digestOfFile(bytes) !== key.digest) throw new FileStoreFault('give back what it took in', key.digest)
  return bytes
}
