import { spawn } from 'node:child_process'
import { checkoutFolder, inCheckout } from './checkout.mjs'
import { chosenPort } from './chosenPort.mjs'
import { holdDataPlace } from './holdDataPlace.mjs'
import { openDataFolder } from './dataFolder.mjs'
import { OneLine } from './OneLine.mjs'
import { givenDatabase } from './givenDatabase.mjs'
import { startOwnDatabase } from './ownDatabase.mjs'
import { ensurePackages } from './packages.mjs'
import { endProcess, identityOf } from './processes.mjs'
import { removeRunFile, writeRunFile } from './runFile.mjs'
import { say } from './say.mjs'
import { serverEnvironment } from './serverEnvironment.mjs'
import { followParent, leftServerFile, stopLeftServer } from './serverProcess.mjs'

const usualApiPort = 4310
const usualClientPort = 5173
const host = '127.0.0.1'

/**
 * Server and client with reloading, on the database of the data folder; stays until one of them ends.
 * @param {{ lifecycle: import('./lifecycle.mjs').Lifecycle, env?: NodeJS.ProcessEnv }} wish
 * @returns {Promise<number>} exit code
 */
export async function startDevelopment({ lifecycle, env = process.env }) {
  const data = openDataFolder(env.DATA_DIR || inCheckout('.data'))
  if (data.note !== undefined) say('Data', data.note)
  const place = await holdDataPlace({ folder: data.folder, lifecycle })
  await stopLeftServer(leftServerFile(data.folder))
  const [database] = await Promise.all([
    givenDatabase(env, data.folder) ?? startOwnDatabase({ data, lifecycle, say }),
    ensurePackages({ lifecycle, say }),
  ])
  const port = await chosenPort({ asked: env.PORT, usual: usualApiPort, host })
  const clientPort = await chosenPort({ asked: undefined, usual: usualClientPort, host })
  const apiUrl = `http://${host}:${port}`
  const clientUrl = `http://${host}:${clientPort}`
  lifecycle.add(() => removeRunFile(data.folder))
  writeRunFile(data.folder, { url: clientUrl, ...database })
  place.nowRunsAt(clientUrl)
  const environment = { ...serverEnvironment({ env, port, host, folder: data.folder, database }), NODE_ENV: 'development' }
  say('Server', apiUrl)
  say('Client', clientUrl)
  const parts = [
    runPart('The server', [inCheckout('node_modules/tsx/dist/cli.mjs'), 'watch', '--clear-screen=false', 'server/main.ts'], environment, lifecycle),
    runPart('The client', [inCheckout('node_modules/vite/bin/vite.js'), '--host', host, '--port', String(clientPort), '--strictPort', '--clearScreen', 'false'], { ...env, API_URL: apiUrl }, lifecycle),
  ]
  throw new OneLine(`${await Promise.race([...parts, ...(database.ended ? [database.ended.then(() => 'The database')] : [])])} stopped by itself.`)
}

/**
 * @param {string} name @param {string[]} args @param {NodeJS.ProcessEnv} env
 * @param {import('./lifecycle.mjs').Lifecycle} lifecycle
 * @returns {Promise<string>} its name, when it has ended
 */
function runPart(name, args, env, lifecycle) {
  lifecycle.assertGoing()
  const child = spawn(process.execPath, [...followParent, ...args], { cwd: checkoutFolder, env, detached: true, stdio: ['ignore', 'inherit', 'inherit'] })
  const self = identityOf(child.pid ?? 0)
  lifecycle.add(async () => void (await endProcess(self, [['SIGTERM', 10_000], ['SIGKILL', 5000]])))
  return new Promise((resolve, reject) => {
    child.once('error', reject)
    child.once('exit', () => resolve(name))
  })
}
