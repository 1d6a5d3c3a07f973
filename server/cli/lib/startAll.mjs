import { join } from 'node:path'
import { OneLine } from './OneLine.mjs'
import { buildIfStale, serverEntry } from './buildIfStale.mjs'
import { inCheckout } from './checkout.mjs'
import { chosenPort } from './chosenPort.mjs'
import { openDataFolder } from './dataFolder.mjs'
import { givenDatabase } from './givenDatabase.mjs'
import { handOver } from './handOver.mjs'
import { holdDataPlace } from './holdDataPlace.mjs'
import { startOwnDatabase } from './ownDatabase.mjs'
import { ensurePackages } from './packages.mjs'
import { removeRunFile, writeRunFile } from './runFile.mjs'
import { say } from './say.mjs'
import { serverEnvironment } from './serverEnvironment.mjs'
import { leftServerFile, startServer, stopLeftServer } from './serverProcess.mjs'

/** The port that is tried first where PORT names none. */
const usualPort = 4310

/**
 * @typedef {{ lifecycle: import('./lifecycle.mjs').Lifecycle, env?: NodeJS.ProcessEnv,
 *   prepare?: (context: { lifecycle: import('./lifecycle.mjs').Lifecycle, say: import('./say.mjs').Say }) => Promise<void>,
 *   entry?: string }} StartWish
 *   prepare: makes what the server needs to run; entry: the server's first file
 */

/**
 * Starts everything and stays until one of the parts ends.
 * @param {StartWish} wish
 * @returns {Promise<number>} the exit code when a part has ended by itself
 * @throws {OneLine} where something is missing
 */
export async function startAll({ lifecycle, env = process.env, prepare = installAndBuild, entry = inCheckout(serverEntry) }) {
  const host = env.HOST || '127.0.0.1'
  const data = openDataFolder(env.DATA_DIR || inCheckout('.data'))
  if (data.note !== undefined) say('Data', data.note)
  const place = await holdDataPlace({ folder: data.folder, lifecycle })
  lifecycle.add(() => handOver(data.folder))
  const pidFile = leftServerFile(data.folder)
  if (await stopLeftServer(pidFile)) say('Server', 'one that an earlier start left behind was stopped')
  const port = await chosenPort({ asked: env.PORT, usual: usualPort, host })
  const [database] = await Promise.all([
    givenDatabase(env, data.folder) ?? startOwnDatabase({ data, lifecycle, say }),
    prepare({ lifecycle, say }),
  ])
  const url = env.PUBLIC_URL || `http://${host.includes(':') ? `[${host}]` : host}:${port}`
  lifecycle.add(() => removeRunFile(data.folder))
  writeRunFile(data.folder, { url, ...database })
  const environment = serverEnvironment({ env, port, host, folder: data.folder, database })
  say('Server', 'starting')
  handOver(data.folder)
  const server = startServer({ entry, env: environment, pidFile, lifecycle, onLine: (line) => process.stdout.write(`${line}\n`) })
  const isReady = await Promise.race([server.ready, database.ended?.then(() => false) ?? server.ready])
  if (isReady) place.nowRunsAt(url)
  return stayUntilOneEnds({ server, database, isReady, logFile: environment.LOG_FILE ?? '', folder: data.folder })
}

/** @type {NonNullable<StartWish['prepare']>} */
async function installAndBuild(context) {
  await ensurePackages(context)
  await buildIfStale(context)
}

/**
 * @param {{ server: import('./serverProcess.mjs').ServerProcess, database: import('./ownDatabase.mjs').Database,
 *   isReady: boolean, logFile: string, folder: string }} running
 * @returns {Promise<number>}
 */
async function stayUntilOneEnds({ server, database, isReady, logFile, folder }) {
  const databaseGone = database.ended?.then(() => `The database stopped by itself; its log is ${join(folder, 'postgres.log')}.`)
  // A server that ends with a code before it is ready has said itself why; one that a signal ended has not.
  const serverGone = server.ended.then((how) => (isReady || !how.startsWith('exit ') ? `The server stopped by itself (${how}); its log is ${logFile}.` : undefined))
  const line = await Promise.race([serverGone, ...(databaseGone ? [databaseGone] : [])])
  if (line !== undefined) throw new OneLine(line)
  return 1 // it said itself why it could not start
}
