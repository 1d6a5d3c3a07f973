import { spawnSync } from 'node:child_process'
import { readFileSync, statSync } from 'node:fs'
import { OneLine } from './OneLine.mjs'

/**
 * The unprivileged user that a database started by root runs as.
 * @typedef {{ uid: number, gid: number }} DatabaseUser
 */

/**
 * Who the database runs as: undefined = as whoever runs this. PostgreSQL refuses root, so root steps down to the owner of
 * the first of these folders that belongs to another, or else to the user `postgres`, or else `nobody`.
 * @param {readonly string[]} folders
 * @returns {DatabaseUser | undefined}
 */
export function databaseUser(folders) {
  if (process.getuid?.() !== 0) return undefined
  for (const folder of folders) {
    const found = statSync(folder, { throwIfNoEntry: false })
    if (found !== undefined && found.uid !== 0) return { uid: found.uid, gid: found.gid }
  }
  const user = namedUser('postgres') ?? namedUser('nobody')
  if (user === undefined) throw new OneLine('PostgreSQL does not run as root and there is no user postgres or nobody: start as an ordinary user.')
  return user
}

/** @param {string} name @returns {DatabaseUser | undefined} */
function namedUser(name) {
  const line = readFileSync('/etc/passwd', 'utf8').split('\n').find((entry) => entry.startsWith(`${name}:`))
  const [, , uid, gid] = line?.split(':') ?? []
  return uid === undefined || gid === undefined ? undefined : { uid: Number(uid), gid: Number(gid) }
}

/**
 * Whether that user can get into the folder; tried, not worked out from the modes.
 * @param {DatabaseUser | undefined} user @param {string} folder
 */
export function canEnter(user, folder) {
  return spawnSync('/bin/sh', ['-c', 'cd -- "$1"', 'sh', folder], { ...user, cwd: '/', stdio: 'ignore' }).status === 0
}
