import { chownSync, readdirSync, statSync } from 'node:fs'
import { join } from 'node:path'

/**
 * What root wrote into another user's data folder is given to that user, so that the next start, without root, can use it.
 * @param {string} folder of the data
 */
export function handOver(folder) {
  const { uid, gid } = statSync(folder)
  if (process.getuid?.() !== 0 || uid === 0) return
  for (const entry of readdirSync(folder, { withFileTypes: true })) {
    if (entry.isFile()) chownSync(join(folder, entry.name), uid, gid)
  }
}
