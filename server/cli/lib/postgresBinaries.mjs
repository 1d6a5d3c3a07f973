import { existsSync, readFileSync, readdirSync } from 'node:fs'
import { join } from 'node:path'
import { OneLine } from './OneLine.mjs'

/** The oldest PostgreSQL that the database's statements are written for. */
const oldestMajor = 15

/**
 * The folder of PostgreSQL's programs as Debian lays them out: of the version that made the data, or else the newest.
 * @param {string} [dataFolder] of an existing or future cluster
 * @param {string} [root]
 * @returns {string | undefined} undefined where none is installed
 * @throws {OneLine} where the data need a version that is not installed
 */
export function findPostgres(dataFolder, root = '/usr/lib/postgresql') {
  const installed = existsSync(root) ? readdirSync(root).filter((name) => isWhole(root, name)) : []
  const versionFile = dataFolder === undefined ? undefined : join(dataFolder, 'PG_VERSION')
  if (versionFile !== undefined && existsSync(versionFile)) {
    const major = readFileSync(versionFile, 'utf8').trim()
    if (installed.includes(major)) return join(root, major, 'bin')
    throw new OneLine(`${dataFolder} was made by PostgreSQL ${major}, which is not installed: install postgresql-${major}, or move the folder away to begin anew.`)
  }
  const newest = installed.map(Number).filter((major) => major >= oldestMajor).sort((a, b) => b - a)[0]
  return newest === undefined ? undefined : join(root, String(newest), 'bin')
}

/** @param {string} root @param {string} major */
function isWhole(root, major) {
  return /^\d+$/.test(major) && ['initdb', 'postgres', 'psql'].every((name) => existsSync(join(root, major, 'bin', name)))
}
