import { existsSync, readFileSync } from 'node:fs'
import { basename } from 'node:path'
import { OneLine } from './OneLine.mjs'
import { checkoutFolder, inCheckout } from './checkout.mjs'
import { runCommand } from './runCommand.mjs'
import { secondsSince } from './say.mjs'

/**
 * @typedef {{ version?: string, integrity?: string, optional?: boolean, os?: string[], cpu?: string[], libc?: string[] }} LockEntry
 * @typedef {{ packages?: Record<string, LockEntry> }} LockFile
 */

/**
 * Whether what is installed is what the lock file names. Compares what they say, not their dates, so that a copied or
 * freshly checked out folder is not installed anew.
 * @param {LockFile} wanted package-lock.json
 * @param {LockFile} installed the list that npm leaves in node_modules when it has finished
 */
export function arePackagesCurrent(wanted, installed) {
  const have = installed.packages ?? {}
  const want = wanted.packages ?? {}
  const isSame = (/** @type {string} */ path) => {
    const entry = want[path]
    const found = have[path]
    if (entry === undefined) return false
    if (found === undefined) return Boolean(entry.optional ?? entry.os ?? entry.cpu ?? entry.libc)
    return found.version === entry.version && found.integrity === entry.integrity
  }
  return [...Object.keys(want).filter((path) => path !== ''), ...Object.keys(have)].every(isSame)
}

/** @returns {boolean} */
function isInstalled() {
  const installed = inCheckout('node_modules', '.package-lock.json')
  if (!existsSync(installed)) return false
  const read = (/** @type {string} */ file) => JSON.parse(readFileSync(file, 'utf8'))
  return arePackagesCurrent(read(inCheckout('package-lock.json')), read(installed))
}

/**
 * Installs the packages of the lock file where they are not there. Two commands at once share one installation: npm runs
 * under a lock on the lock file itself, which even a killed command's npm still holds.
 * @param {{ lifecycle: import('./lifecycle.mjs').Lifecycle, say: import('./say.mjs').Say }} context
 * @throws {OneLine} where they cannot be fetched or written
 */
export async function ensurePackages({ lifecycle, say }) {
  if (isInstalled()) return
  const startedAt = performance.now()
  say('Packages', 'installing, a minute or two')
  const problem = await networkProblem(lifecycle)
  for (;;) {
    const done = await underLock([...npmCommand(), 'ci', '--include=dev', '--no-audit', '--no-fund', ...quickRetries, ...(problem ? ['--offline'] : [])], lifecycle)
    if (done.code === 0) break
    if (done.code !== lockTaken) throw new OneLine(explainNpm(problem ?? done.output))
    say('Packages', 'another command is installing them, waiting for it')
    await runCommand('flock', [inCheckout('package-lock.json'), 'true'], { lifecycle })
    if (isInstalled()) break
  }
  say('Packages', `ready in ${secondsSince(startedAt)}`)
}

const lockTaken = 75
const quickRetries = ['--loglevel=error', '--fetch-retry-mintimeout=1000', '--fetch-retry-maxtimeout=10000']
const networkCodes = /ENOTFOUND|EAI_AGAIN|ECONNREFUSED|ECONNRESET|ETIMEDOUT|ENETUNREACH|EHOSTUNREACH|ERR_SOCKET_TIMEOUT/

/**
 * Without a network npm tries every package for minutes; one question tells beforehand. What npm has kept from earlier
 * may then still be enough.
 * @param {import('./lifecycle.mjs').Lifecycle} lifecycle
 * @returns {Promise<string | undefined>} what npm said, where the network does not answer
 */
async function networkProblem(lifecycle) {
  const [command = 'npm', ...args] = [...npmCommand(), 'ping', ...quickRetries, '--fetch-timeout=20000']
  const asked = await runCommand(command, args, { cwd: checkoutFolder, env: npmEnvironment(), lifecycle })
  return asked.code !== 0 && networkCodes.test(asked.output) ? asked.output : undefined
}

/** @param {readonly string[]} command @param {import('./lifecycle.mjs').Lifecycle} lifecycle */
function underLock(command, lifecycle) {
  const args = ['--nonblock', '--conflict-exit-code', String(lockTaken), inCheckout('package-lock.json'), ...command]
  return runCommand('flock', args, { cwd: checkoutFolder, env: npmEnvironment(), lifecycle })
}

/** The npm that runs this command, or else the one on the path. */
function npmCommand() {
  const running = process.env.npm_execpath
  return running !== undefined && basename(running) === 'npm-cli.js' ? [process.execPath, running] : ['npm']
}

/** Without what would leave out packages that the build needs. */
function npmEnvironment() {
  const kept = Object.entries(process.env).filter(([name]) => !/^(NODE_ENV|npm_config_(omit|only|production|loglevel|dry_run))$/i.test(name))
  return Object.fromEntries(kept)
}

/** @param {string} output */
function explainNpm(output) {
  if (/ENOSPC|EDQUOT|no space left/i.test(output)) return 'Packages: the disk is full: free some space.'
  if (/EACCES|EPERM|EROFS/.test(output)) return `Packages: this user may not write in ${checkoutFolder}: give it the folder, or install them with npm ci as its owner.`
  const network = networkCodes.exec(output)
  if (network !== null) return `Packages could not be fetched (${network[0]}): connect this machine to the network and start again.`
  const first = output.split('\n').find((line) => /\S/.test(line)) ?? 'npm said nothing.'
  return `Packages could not be installed: ${first.trim()} Run npm ci to see all of it.`
}
