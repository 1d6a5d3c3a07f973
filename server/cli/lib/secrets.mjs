import { randomBytes, randomInt } from 'node:crypto'
import { closeSync, existsSync, fsyncSync, openSync, readFileSync, renameSync, writeSync } from 'node:fs'
import { join } from 'node:path'
import { OneLine } from './OneLine.mjs'

/**
 * @typedef {{ superuserPassword: string, ownerPassword: string, appPassword: string, sessionSecret: string,
 *   demoPassword: string }} Secrets
 */

const names = /** @type {const} */ (['superuserPassword', 'ownerPassword', 'appPassword', 'sessionSecret', 'demoPassword'])

/** The letters and digits that are not mistaken for one another. */
const plainSigns = 'abcdefghjkmnpqrstuvwxyz23456789'

/** @returns {Secrets} */
export function makeSecrets() {
  const secret = () => randomBytes(24).toString('hex')
  return {
    superuserPassword: secret(),
    ownerPassword: secret(),
    appPassword: secret(),
    sessionSecret: randomBytes(32).toString('hex'),
    demoPassword: [4, 4, 4].map(plainWord).join('-'),
  }
}

/** @param {number} length */
function plainWord(length) {
  return Array.from({ length }, () => plainSigns[randomInt(plainSigns.length)]).join('')
}

/**
 * The secrets of a data folder, made at the first call and the same ever after; the file is open to its owner alone.
 * @param {string} folder
 * @returns {Secrets}
 * @throws {OneLine} where they are missing though a database is there, or cannot be read
 */
export function secretsOf(folder) {
  const file = join(folder, 'secrets.json')
  if (existsSync(file)) return readSecrets(file)
  if (existsSync(join(folder, 'postgres'))) {
    throw new OneLine(`${file} is missing though its database is there: put it back, or move ${folder} away to begin anew.`)
  }
  const secrets = makeSecrets()
  writeDurably(file, `${JSON.stringify(secrets, null, 2)}\n`)
  return secrets
}

/** @param {string} file @returns {Secrets} */
function readSecrets(file) {
  const unreadable = new OneLine(`${file} cannot be read: give this user the file, or put back the one that was there.`)
  try {
    const found = JSON.parse(readFileSync(file, 'utf8'))
    if (names.every((name) => typeof found[name] === 'string' && found[name] !== '')) return found
  } catch {
    throw unreadable
  }
  throw unreadable
}

/**
 * Whole or not at all: a half-written file would lock the database away.
 * @param {string} file @param {string} text
 */
function writeDurably(file, text) {
  const fresh = `${file}.new`
  const handle = openSync(fresh, 'w', 0o600)
  writeSync(handle, text)
  fsyncSync(handle)
  closeSync(handle)
  renameSync(fresh, file)
}
