import { createHash } from 'node:crypto'
import { readFileSync, readdirSync, statSync } from 'node:fs'
import { join } from 'node:path'

const folders = ['src', 'server', 'shared', 'migrations', 'public']
const files = /^(index\.html|vite\.config\.ts|tsconfig.*\.json|package-lock\.json)$/

/**
 * A digest of everything the build reads, names and contents; the commands themselves (.mjs) are not built.
 * @param {string} checkout
 * @returns {string} hexadecimal
 */
export function sourceStamp(checkout) {
  const hash = createHash('sha256')
  const names = readdirSync(checkout)
  const found = [...names.filter((name) => files.test(name)), ...folders.filter((name) => names.includes(name)).flatMap((name) => filesBelow(checkout, name))]
  for (const name of found.sort()) {
    const content = readFileSync(join(checkout, name))
    hash.update(`${name}\0${content.length}\0`).update(content)
  }
  return hash.digest('hex')
}

/** @param {string} checkout @param {string} folder @returns {string[]} */
function filesBelow(checkout, folder) {
  return readdirSync(join(checkout, folder), { recursive: true, encoding: 'utf8' })
    .map((name) => join(folder, name))
    .filter((name) => !name.endsWith('.mjs') && statSync(join(checkout, name)).isFile())
}
