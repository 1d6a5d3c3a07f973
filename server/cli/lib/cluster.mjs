import { spawn } from 'node:child_process'
import { chownSync, closeSync, existsSync, mkdirSync, openSync, readFileSync, readdirSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { basename, dirname, join } from 'node:path'
import { OneLine } from './OneLine.mjs'
import { cleanEnvironment } from './cleanEnvironment.mjs'
import { freePort } from './freePort.mjs'
import { giveTo } from './giveTo.mjs'
import { stopLeftCluster, stopSteps } from './leftCluster.mjs'
import { endProcess, identityOf, waitUntil } from './processes.mjs'
import { runCommand } from './runCommand.mjs'

/**
 * @typedef {{ bin: string, folder: string, user: import('./databaseUser.mjs').DatabaseUser | undefined,
 *   superuserPassword: string, lifecycle: import('./lifecycle.mjs').Lifecycle }} ClusterWish
 *   bin: PostgreSQL's programs; folder: absolute, without links; its log is written beside it
 * @typedef {{ port: number, pid: number, ended: Promise<void>, stop: () => Promise<void> }} Cluster
 *   ended: settles when the postmaster is gone, for whatever reason
 */

const readyLimitMs = 300_000
const largestLog = 10_000_000

/**
 * Starts the cluster in a folder on loopback and a free port, making it first where there is none, and after having
 * stopped what an earlier run left of it.
 * @param {ClusterWish} wish
 * @returns {Promise<Cluster>} when it takes connections
 * @throws {OneLine} where it cannot be made or does not start
 */
export async function startCluster(wish) {
  if (!existsSync(join(wish.folder, 'PG_VERSION'))) await makeCluster(wish)
  await stopLeftCluster(wish.folder)
  giveTo(wish.user, wish.folder)
  for (let left = 3; ; left--) {
    const cluster = await tryStart(wish, await freePort())
    if (typeof cluster === 'object') return cluster
    const portWasTaken = cluster === 'port taken' // between the look and the start, by someone else
    if (!portWasTaken || left === 1) throw new OneLine(`PostgreSQL did not start; ${logOf(wish.folder)} says why.`)
  }
}

/** Made in a folder of another name and renamed when whole: a killed start leaves none half made. @param {ClusterWish} wish */
async function makeCluster({ bin, folder, user, superuserPassword, lifecycle }) {
  const fresh = `${folder}.new-${process.pid}`
  const passwordFile = `${folder}.password`
  removeHalfMade(folder)
  mkdirSync(fresh, { mode: 0o700 })
  writeFileSync(passwordFile, superuserPassword, { mode: 0o600 })
  if (user !== undefined) for (const path of [fresh, passwordFile]) chownSync(path, user.uid, user.gid)
  const args = ['-D', fresh, '-U', 'postgres', `--pwfile=${passwordFile}`, '--auth=scram-sha-256', '--encoding=UTF8', '--locale=C.UTF-8', '--data-checksums']
  const made = await runCommand(join(bin, 'initdb'), args, { ...user, cwd: '/', env: cleanEnvironment(), lifecycle })
  rmSync(passwordFile, { force: true })
  if (made.code === 0) return renameSync(fresh, folder)
  rmSync(fresh, { recursive: true, force: true })
  if (/no space left|disk quota/i.test(made.output)) throw new OneLine(`${dirname(folder)}: the disk is full: free some space.`)
  throw new OneLine(`PostgreSQL could not make ${folder}: ${lastLine(made.output)}`)
}

/** What killed starts left beside the folder. @param {string} folder */
function removeHalfMade(folder) {
  for (const name of readdirSync(dirname(folder))) {
    if (!name.startsWith(`${basename(folder)}.new-`)) continue
    rmSync(join(dirname(folder), name), { recursive: true, force: true, maxRetries: 5 })
  }
}

/** @param {ClusterWish} wish @param {number} port @returns {Promise<Cluster | 'port taken' | 'failed'>} */
async function tryStart({ bin, folder, user, lifecycle }, port) {
  const settings = ['listen_addresses=127.0.0.1', `port=${port}`, 'unix_socket_directories=', 'timezone=UTC', 'log_timezone=UTC', 'logging_collector=off', 'log_destination=stderr']
  lifecycle.assertGoing()
  const logStart = prepareLog(folder)
  const log = openSync(logOf(folder), 'a', 0o600)
  const args = ['-D', folder, ...settings.flatMap((setting) => ['-c', setting])]
  // detached: a Ctrl-C at the terminal reaches this process alone, which stops the rest in order
  const child = spawn(join(bin, 'postgres'), args, { ...user, cwd: '/', env: cleanEnvironment(), detached: true, stdio: ['ignore', log, log] })
  closeSync(log)
  let gone = false
  const ended = new Promise((/** @type {(value: void) => void} */ resolve) => {
    for (const event of ['exit', 'error']) child.once(event, () => resolve(void (gone = true)))
  })
  const pid = child.pid ?? 0
  const self = identityOf(pid)
  const stop = async () => void (gone || (await endProcess(self, stopSteps), await ended))
  const forget = lifecycle.add(stop)
  await waitUntil(() => gone || isReady(folder, pid), readyLimitMs)
  if (!gone && isReady(folder, pid)) return { port, pid, ended, stop }
  await stop()
  forget()
  const said = readFileSync(logOf(folder)).subarray(logStart).toString()
  if (/no space left|disk quota/i.test(said)) throw new OneLine(`${dirname(folder)}: the disk is full: free some space.`)
  return /address already in use/i.test(said) ? 'port taken' : 'failed'
}

/**
 * @param {string} folder @param {number} pid
 * @source PostgreSQL, src/include/utils/pidfile.h: line 1 is the pid, line 8 the status, "ready   " when it takes connections
 */
function isReady(folder, pid) {
  const file = join(folder, 'postmaster.pid')
  const lines = existsSync(file) ? readFileSync(file, 'utf8').split('\n') : []
  return Number(lines[0]) === pid && lines[7]?.trim() === 'ready'
}

/** @param {string} folder */
const logOf = (folder) => `${folder}.log`

/** Puts a long log aside. @param {string} folder @returns {number} where the next run's part begins, in bytes */
function prepareLog(folder) {
  const log = logOf(folder)
  const found = statSync(log, { throwIfNoEntry: false })
  if (found === undefined) return 0
  if (found.size <= largestLog) return found.size
  renameSync(log, `${log}.1`)
  return 0
}

/** @param {string} text */
const lastLine = (text) => text.trim().split('\n').filter((line) => line.trim() !== '').at(-1) ?? 'it said nothing.'
