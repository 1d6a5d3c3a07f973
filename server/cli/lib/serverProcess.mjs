import { spawn } from 'node:child_process'
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { createInterface } from 'node:readline'
import { checkoutFolder } from './checkout.mjs'
import { endProcess, identityOf, isAlive } from './processes.mjs'

/**
 * @typedef {{ entry: string, env: NodeJS.ProcessEnv, pidFile: string, lifecycle: import('./lifecycle.mjs').Lifecycle,
 *   onLine?: (line: string) => void }} ServerWish
 *   entry: the built server; onLine: each line of its stdout
 * @typedef {{ ready: Promise<boolean>, ended: Promise<string>, stop: () => Promise<void> }} ServerProcess
 *   ready: true when it serves, false when it ended before; ended: how it ended, in words
 */

const stopSteps = /** @type {const} */ ([['SIGTERM', 15_000], ['SIGKILL', 5000]])
/** What makes a Node.js process close when this one is gone. */
export const followParent = ['--import', new URL('./stopWithParent.mjs', import.meta.url).href]

/**
 * Starts the server. Its stdout comes line by line; its stderr, where it says in one line why it cannot start, is ours.
 * @param {ServerWish} wish
 * @returns {ServerProcess}
 */
export function startServer({ entry, env, pidFile, lifecycle, onLine }) {
  lifecycle.assertGoing()
  const child = spawn(process.execPath, [...followParent, entry], { cwd: checkoutFolder, env, detached: true, stdio: ['ignore', 'pipe', 'inherit'] })
  const self = identityOf(child.pid ?? 0)
  writeFileSync(pidFile, JSON.stringify(self), { mode: 0o600 })
  const ended = new Promise((/** @type {(how: string) => void} */ resolve) => {
    child.once('error', (error) => resolve(error.message))
    child.once('exit', (code, signal) => resolve(signal === null ? `exit ${code}` : signal))
  })
  const ready = new Promise((/** @type {(isReady: boolean) => void} */ resolve) => {
    createInterface({ input: child.stdout }).on('line', (line) => {
      onLine?.(line)
      if (line.startsWith('READY ')) resolve(true)
    })
    void ended.then(() => resolve(false))
  })
  const stop = async () => {
    await endProcess(self, stopSteps)
    await ended
    killGroup(self.pid)
    rmSync(pidFile, { force: true })
  }
  lifecycle.add(stop)
  return { ready, ended, stop }
}

/** What the server itself started (a child that makes a PDF). @param {number} pid */
function killGroup(pid) {
  try {
    process.kill(-pid, 'SIGKILL')
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'ESRCH') throw error
  }
}

/**
 * Where the running server is written down.
 * @param {string} folder of the data
 */
export const leftServerFile = (folder) => join(folder, 'server.pid')

/**
 * Stops the server that an earlier, killed run left behind.
 * @param {string} pidFile
 * @returns {Promise<boolean>} whether there was one
 */
export async function stopLeftServer(pidFile) {
  if (!existsSync(pidFile)) return false
  const text = readFileSync(pidFile, 'utf8')
  rmSync(pidFile, { force: true })
  const left = parseIdentity(text)
  if (left === undefined) return false
  if (!isAlive(left)) return false
  await endProcess(left, stopSteps)
  return true
}

/** @param {string} text @returns {import('./processes.mjs').ProcessIdentity | undefined} undefined where it was cut short */
function parseIdentity(text) {
  try {
    const { pid, startTime } = JSON.parse(text)
    return typeof pid === 'number' && typeof startTime === 'string' ? { pid, startTime } : undefined
  } catch {
    return undefined
  }
}
