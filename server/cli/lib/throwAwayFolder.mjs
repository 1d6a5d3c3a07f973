import { accessSync, chmodSync, constants, lstatSync, mkdtempSync, readFileSync, readdirSync, realpathSync, rmSync, statfsSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { stopLeftCluster } from './leftCluster.mjs'
import { identityOf, isAlive } from './processes.mjs'

const prefix = 'drenchleaf-once-'
const neededBytes = 1_500_000_000

/** In memory where there is room for it (a container may have 64 MB there), or else where temporary files stand. */
function bases() {
  return ['/dev/shm', tmpdir()].filter((base) => isWritable(base))
}

/** @param {string} base */
function isWritable(base) {
  try {
    accessSync(base, constants.W_OK | constants.X_OK)
    return true
  } catch {
    return false
  }
}

/** @param {string} base */
function hasRoom(base) {
  const { bavail, bsize } = statfsSync(base)
  return bavail * bsize >= neededBytes
}

/**
 * A folder for one run, gone with it. What killed runs left, their databases included, is cleared first.
 * @param {import('./lifecycle.mjs').Lifecycle} lifecycle
 * @returns {Promise<string>} absolute, without links
 */
export async function makeThrowAwayFolder(lifecycle) {
  for (const base of bases()) await clearLeftFolders(base)
  const base = bases().find(hasRoom) ?? tmpdir()
  const folder = realpathSync(mkdtempSync(join(base, prefix)))
  lifecycle.add(() => removeFolder(folder))
  chmodSync(folder, 0o711) // the database's user passes through to its own folder
  writeFileSync(join(folder, 'run.json'), JSON.stringify(identityOf(process.pid)))
  return folder
}

/**
 * @param {string} base
 * @returns {Promise<void>}
 */
export async function clearLeftFolders(base) {
  for (const name of readdirSync(base)) {
    const folder = join(base, name)
    if (!name.startsWith(prefix) || !isLeft(folder)) continue
    await stopLeftCluster(join(folder, 'postgres'))
    removeFolder(folder)
  }
}

/** Whether its run is over, as far as this user may know. @param {string} folder */
function isLeft(folder) {
  if (lstatSync(folder).uid !== process.getuid?.()) return false
  try {
    return !isAlive(JSON.parse(readFileSync(join(folder, 'run.json'), 'utf8')))
  } catch {
    return false // just being made, or another user's
  }
}

/** @param {string} folder */
function removeFolder(folder) {
  rmSync(folder, { recursive: true, force: true, maxRetries: 10, retryDelay: 100 })
}
