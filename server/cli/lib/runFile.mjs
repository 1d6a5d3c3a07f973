import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { identityOf, isAlive } from './processes.mjs'

/**
 * What a running start leaves for other commands; it holds passwords and is open to its owner alone.
 * @typedef {{ url: string, databaseUrl: string, databaseOwnerUrl: string, pid: number, startTime: string }} RunFile
 */

/** @param {string} folder of the data */
const fileIn = (folder) => join(folder, 'run.json')

/**
 * @param {string} folder of the data
 * @param {{ url: string, databaseUrl: string, databaseOwnerUrl: string }} facts
 */
export function writeRunFile(folder, { url, databaseUrl, databaseOwnerUrl }) {
  const text = JSON.stringify({ url, databaseUrl, databaseOwnerUrl, ...identityOf(process.pid) }, null, 2)
  rmSync(fileIn(folder), { force: true })
  writeFileSync(fileIn(folder), `${text}\n`, { mode: 0o600 })
}

/** @param {string} folder of the data */
export function removeRunFile(folder) {
  rmSync(fileIn(folder), { force: true })
}

/**
 * @param {string} folder of the data
 * @returns {RunFile | undefined} undefined where none runs
 */
export function readRunFile(folder) {
  if (!existsSync(fileIn(folder))) return undefined
  const found = JSON.parse(readFileSync(fileIn(folder), 'utf8'))
  return isAlive(found) ? found : undefined
}
