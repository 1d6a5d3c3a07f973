import { randomBytes } from 'node:crypto'
import { chmodSync, chownSync, existsSync, mkdirSync, readFileSync, realpathSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { basename, dirname, join, resolve } from 'node:path'
import { OneLine, fileProblem } from './OneLine.mjs'
import { canEnter, databaseUser } from './databaseUser.mjs'

/**
 * Where a running Drenchleaf keeps what is its own.
 * @typedef {{ folder: string, user: import('./databaseUser.mjs').DatabaseUser | undefined, note?: string }} DataFolder
 *   folder: absolute, without links; user: whom the database runs as; note: a line to tell, where it is not the wanted one
 */

/**
 * Makes the data folder and makes sure that it can be written. Where a folder above it is closed to the user that the
 * database must run as (as /root is), the data stand under `elsewhere` instead, and a pointer to them in the wanted folder.
 * @param {string} wanted
 * @param {string} [elsewhere]
 * @returns {DataFolder}
 * @throws {OneLine} where it cannot be written
 */
export function openDataFolder(wanted, elsewhere = '/var/lib/drenchleaf') {
  const folder = makeWritable(resolve(wanted))
  const user = databaseUser([join(folder, 'postgres'), folder])
  if (user === undefined) return { folder, user }
  openDoor(folder)
  if (canEnter(user, folder)) return { folder, user }
  const other = makeWritable(otherFolder(folder, elsewhere))
  openDoor(other)
  if (!canEnter(user, other)) throw new OneLine(`${other} is closed to the user the database runs as: open the folders above it or choose another with DATA_DIR.`)
  return {
    folder: other,
    user: databaseUser([join(other, 'postgres')]),
    note: `in ${other}, for a folder above ${folder} is closed to the user the database runs as`,
  }
}

/** @param {string} folder @returns {string} the same without links */
function makeWritable(folder) {
  try {
    makeForItsOwner(folder)
    const probe = join(folder, `.write-${process.pid}`)
    writeFileSync(probe, 'x')
    rmSync(probe)
    return realpathSync(folder)
  } catch (error) {
    const code = /** @type {NodeJS.ErrnoException} */ (error).code
    // Node.js says ENOENT where a folder above is on a read-only disk
    if (code === 'ENOENT') throw new OneLine(`${folder} cannot be made: the folder above it takes no new ones. Choose another folder with DATA_DIR.`)
    if (code === 'EEXIST' || code === 'ENOTDIR') throw new OneLine(`${folder} cannot be made: a file stands in its way. Choose another folder with DATA_DIR.`)
    const line = fileProblem(Object.assign(new Error(), { code, path: folder }))
    throw line === undefined ? error : new OneLine(line)
  }
}

/** Root makes a folder in another user's checkout for that user. @param {string} folder */
function makeForItsOwner(folder) {
  if (existsSync(folder)) return
  mkdirSync(dirname(folder), { recursive: true })
  mkdirSync(folder, { mode: 0o700 })
  if (process.getuid?.() !== 0) return
  const { uid, gid } = statSync(dirname(folder))
  if (uid !== 0) chownSync(folder, uid, gid)
}

/** Lets the database's user through to its own folder; what stands beside it keeps its own mode. @param {string} folder */
function openDoor(folder) {
  const { mode, uid } = statSync(folder)
  if (uid === 0 && (mode & 0o001) === 0) chmodSync(folder, (mode & 0o777) | 0o011)
}

/** @param {string} folder @param {string} elsewhere */
function otherFolder(folder, elsewhere) {
  const pointer = join(folder, 'elsewhere')
  if (existsSync(pointer)) return readFileSync(pointer, 'utf8').trim()
  mkdirSync(elsewhere, { recursive: true, mode: 0o755 })
  const other = join(elsewhere, `${basename(dirname(folder)) || 'data'}-${randomBytes(4).toString('hex')}`)
  writeFileSync(pointer, `${other}\n`)
  return other
}
