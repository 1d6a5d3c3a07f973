import { existsSync, mkdirSync, readFileSync, readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { OneLine } from './OneLine.mjs'
import { checkoutFolder, inCheckout } from './checkout.mjs'
import { takeInstanceLock } from './instanceLock.mjs'
import { runCommand } from './runCommand.mjs'
import { secondsSince } from './say.mjs'
import { sourceStamp } from './sourceStamp.mjs'

/** @typedef {{ lifecycle: import('./lifecycle.mjs').Lifecycle, say: import('./say.mjs').Say }} Context */

/** The server's first file once built, relative to the checkout. */
export const serverEntry = join('dist', 'server', 'server', 'main.js')

const dist = inCheckout('dist')
const stampFile = join(dist, '.stamp')

/** Whether what stands in dist/ was built from the sources as they are. */
export function isBuildFresh() {
  const isWhole = [stampFile, inCheckout(serverEntry), join(dist, 'client', 'index.html')].every((file) => existsSync(file))
  return isWhole && readFileSync(stampFile, 'utf8') === sourceStamp(checkoutFolder)
}

/**
 * Builds server and client where the sources have changed since, both at once, and puts them in place when both are
 * whole. Needs the packages.
 * @param {Context & { force?: boolean }} context
 * @throws {OneLine} where one of them does not build, after its output
 */
export async function buildIfStale({ lifecycle, say, force = false }) {
  if (!force && isBuildFresh()) return
  const place = await onlyBuild(say)
  try {
    if (force || !isBuildFresh()) await build({ lifecycle, say })
  } finally {
    place.release()
  }
}

/** @param {import('./say.mjs').Say} say */
async function onlyBuild(say) {
  for (let told = false; ; told = true) {
    const place = await takeInstanceLock(`build ${checkoutFolder}`)
    if ('lock' in place) return place.lock
    if (!told) say('Build', 'another command is building, waiting for it')
  }
}

/** @param {Context} context */
async function build({ lifecycle, say }) {
  const startedAt = performance.now()
  const fresh = join(dist, '.new')
  const stamp = sourceStamp(checkoutFolder)
  rmSync(fresh, { recursive: true, force: true, maxRetries: 5 })
  mkdirSync(fresh, { recursive: true })
  say('Build', 'server and client')
  const run = (/** @type {string} */ what, /** @type {string[]} */ args) => buildPart({ what, args, lifecycle, say, startedAt })
  await Promise.all([
    run('server', [inCheckout('node_modules/typescript/bin/tsc'), '-p', 'tsconfig.build.json', '--incremental', 'false', '--outDir', join(fresh, 'server')]),
    run('client', [inCheckout('node_modules/vite/bin/vite.js'), 'build', '--logLevel', 'warn', '--outDir', join(fresh, 'client')]),
  ])
  rmSync(stampFile, { force: true })
  for (const part of readdirSync(fresh)) replaceFolder(join(fresh, part), join(dist, part))
  rmSync(fresh, { recursive: true, force: true })
  writeFileSync(stampFile, stamp)
}

/** @param {{ what: string, args: string[], startedAt: number } & Context} part */
async function buildPart({ what, args, lifecycle, say, startedAt }) {
  const env = { ...process.env, NODE_ENV: 'production' }
  const done = await runCommand(process.execPath, args, { cwd: checkoutFolder, env, lifecycle })
  if (/ENOSPC|EDQUOT/.test(done.output)) throw new OneLine(`${dist}: the disk is full: free some space.`)
  if (done.code !== 0 && !lifecycle.stopping) {
    process.stderr.write(done.output)
    throw new OneLine(`The ${what} does not build: the reasons stand above.`)
  }
  say('Build', `${what} ready in ${secondsSince(startedAt)}`)
}

/** @param {string} fresh @param {string} place */
function replaceFolder(fresh, place) {
  const old = `${fresh}-old`
  if (existsSync(place)) renameSync(place, old)
  renameSync(fresh, place)
}
