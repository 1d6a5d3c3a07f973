import { lchownSync, readdirSync, statSync } from 'node:fs'
import { join } from 'node:path'

/**
 * Gives a folder and all below it to the database's user, where root owns it (a checkout copied by root). The database
 * refuses a folder that is not its own.
 * @param {import('./databaseUser.mjs').DatabaseUser | undefined} user
 * @param {string} folder
 */
export function giveTo(user, folder) {
  if (user === undefined || statSync(folder).uid === user.uid) return
  const below = readdirSync(folder, { recursive: true, encoding: 'utf8' })
  for (const path of [...below.map((name) => join(folder, name)), folder]) lchownSync(path, user.uid, user.gid)
}
