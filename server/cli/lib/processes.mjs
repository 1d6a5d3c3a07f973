import { readFileSync, readdirSync, readlinkSync } from 'node:fs'
import { setTimeout as delay } from 'node:timers/promises'

/**
 * A process that cannot be mistaken for a later one with the same number.
 * @typedef {{ pid: number, startTime: string }} ProcessIdentity
 */

/**
 * When a live process started, in the kernel's ticks; undefined where there is none or only its unreaped remains.
 * @param {number} pid
 * @returns {string | undefined}
 * @source proc(5), /proc/[pid]/stat, fields 3 (state) and 22 (starttime)
 */
export function startTimeOf(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8')
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ')
    return fields[0] === 'Z' || fields[0] === 'X' ? undefined : fields[19]
  } catch {
    return undefined
  }
}

/** @param {number} pid @returns {ProcessIdentity} */
export function identityOf(pid) {
  return { pid, startTime: startTimeOf(pid) ?? '' }
}

/** @param {ProcessIdentity | undefined} process */
export function isAlive(process) {
  return process !== undefined && process.startTime !== '' && startTimeOf(process.pid) === process.startTime
}

/**
 * Live processes working in a folder (a database's processes all do), as far as this user may see them.
 * @param {string} folder absolute, without links
 * @returns {ProcessIdentity[]}
 */
export function processesIn(folder) {
  return readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name) && workingFolderOf(Number(name)) === folder)
    .map((name) => identityOf(Number(name)))
    .filter(isAlive)
}

/** @param {number} pid */
export function workingFolderOf(pid) {
  try {
    return readlinkSync(`/proc/${pid}/cwd`)
  } catch {
    return undefined
  }
}

/**
 * Sends each signal in turn until the process is gone, giving it the time written beside the signal.
 * @param {ProcessIdentity} process
 * @param {readonly (readonly [NodeJS.Signals, number])[]} steps signal and milliseconds to wait after it
 * @returns {Promise<boolean>} whether it is gone
 */
export async function endProcess(process, steps) {
  for (const [signal, waitMs] of steps) {
    sendSignal(process, signal)
    if (await waitUntil(() => !isAlive(process), waitMs)) return true
  }
  return !isAlive(process)
}

/** @param {ProcessIdentity} target @param {NodeJS.Signals} signal */
function sendSignal(target, signal) {
  if (!isAlive(target)) return
  try {
    process.kill(target.pid, signal)
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'ESRCH') throw error
  }
}

/**
 * @param {() => boolean} isTrue looked at every 40 ms
 * @param {number} limitMs
 * @returns {Promise<boolean>} false where the time ran out
 */
export async function waitUntil(isTrue, limitMs) {
  const until = performance.now() + limitMs
  while (!isTrue()) {
    if (performance.now() > until) return false
    await delay(40)
  }
  return true
}
