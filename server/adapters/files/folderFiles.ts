import { randomUUID } from 'node:crypto'
import { access, constants, mkdir, open, readFile, rename, rm } from 'node:fs/promises'
import { join } from 'node:path'
import { atStore, type FileKey, type FileStore } from './fileStore.ts'

const OWNER_ONLY = 0o700
const FILE_MODE = 0o600

/** Files in a folder of this machine: FOLDER/farm/digest, written beside and renamed, so that no half file is ever seen. */
export function createFolderFiles(folder: string): FileStore {
  const placeOf = ({ farmId, digest }: FileKey): string => join(folder, farmId, digest)
  return {
    put: (key, bytes) => atStore('keep a file', () => write(join(folder, key.farmId), placeOf(key), bytes)),
    has: (key) => access(placeOf(key), constants.R_OK).then(() => true, () => false),
    read: (key) => atStore('read a file', () => readFile(placeOf(key))),
    remove: (key) => atStore('remove a file', () => rm(placeOf(key), { force: true })),
  }
}

async function write(farmFolder: string, place: string, bytes: Buffer): Promise<void> {
  await mkdir(farmFolder, { recursive: true, mode: OWNER_ONLY })
  const beside = `${place}.${randomUUID()}.part`
  try {
    const handle = await open(beside, 'wx', FILE_MODE)
    try {
      await handle.writeFile(bytes)
      await handle.sync()
    } finally {
      await handle.close()
    }
    await rename(beside, place)
  } catch (cause) {
    await rm(beside, { force: true })
    throw cause
  }
}
