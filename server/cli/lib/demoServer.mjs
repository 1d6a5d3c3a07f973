import { mkdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { OneLine } from './OneLine.mjs'
import { serverEntry } from './buildIfStale.mjs'
import { inCheckout } from './checkout.mjs'
import { freePort } from './freePort.mjs'
import { serverEnvironment } from './serverEnvironment.mjs'
import { leftServerFile, startServer } from './serverProcess.mjs'

const host = '127.0.0.1'

/**
 * A server with the demo farm on a throw-away database.
 * @param {{ folder: string, database: import('./ownDatabase.mjs').Database, lifecycle: import('./lifecycle.mjs').Lifecycle,
 *   env?: NodeJS.ProcessEnv, entry?: string }} wish folder: of the run; env: what differs from ours
 * @returns {Promise<{ url: string, password: string, stop: () => Promise<void> }>} when it serves
 * @throws {OneLine} where it does not come up
 */
export async function startDemoServer({ folder, database, lifecycle, env = {}, entry = inCheckout(serverEntry) }) {
  const data = join(folder, 'demo')
  mkdirSync(data, { recursive: true })
  const port = await freePort(host)
  const own = { ...process.env, PUBLIC_URL: undefined, LOG_FILE: undefined, ...env }
  const environment = serverEnvironment({ env: own, port, host, folder: data, database })
  const server = startServer({ entry, env: environment, pidFile: leftServerFile(data), lifecycle })
  if (await server.ready) return { url: `http://${host}:${port}`, password: database.demoPassword ?? '', stop: server.stop }
  throw new OneLine(`The demo server did not start (${await server.ended}). ${lastWords(environment.LOG_FILE)}`)
}

/** @param {string | undefined} logFile */
function lastWords(logFile) {
  try {
    return readFileSync(logFile ?? '', 'utf8').trim().split('\n').at(-1) ?? ''
  } catch {
    return ''
  }
}
