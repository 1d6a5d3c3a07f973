import { existsSync, mkdirSync, rmSync, writeFileSync } from 'node:fs'
import { OneLine } from './OneLine.mjs'
import { cleanEnvironment } from './cleanEnvironment.mjs'
import { findChromium } from './chromium.mjs'
import { findPostgres } from './postgresBinaries.mjs'
import { runCommand } from './runCommand.mjs'
import { secondsSince } from './say.mjs'

/**
 * @typedef {'postgresql' | 'chromium-headless-shell' | 'qpdf' | 'poppler-utils' | 'gdal-bin' | 'fonts-noto-core'} SystemPackage
 * @typedef {{ lifecycle: import('./lifecycle.mjs').Lifecycle, say: import('./say.mjs').Say }} Context
 */

/** @type {Record<SystemPackage, () => boolean>} */
const isThere = {
  postgresql: () => findPostgres() !== undefined,
  'chromium-headless-shell': () => findChromium() !== undefined,
  qpdf: () => existsSync('/usr/bin/qpdf'),
  'poppler-utils': () => existsSync('/usr/bin/pdftotext'),
  'gdal-bin': () => existsSync('/usr/bin/ogrinfo'),
  'fonts-noto-core': () => existsSync('/usr/share/fonts/truetype/noto/NotoSans-Regular.ttf'),
}

/**
 * Installs Debian packages where they are missing and this is root.
 * @param {readonly SystemPackage[]} names
 * @param {Context} context
 * @throws {OneLine} the one line to run, where this is not root; why, where the installation fails
 */
export async function ensureSystemPackages(names, context) {
  const missing = names.filter((name) => !isThere[name]())
  if (missing.length === 0) return
  const command = `apt-get update && apt-get install -y --no-install-recommends ${missing.join(' ')}`
  if (!existsSync('/usr/bin/apt-get')) throw new OneLine(`Missing on this machine: ${missing.join(', ')}. Install them as this system does it.`)
  if (process.getuid?.() !== 0) throw new OneLine(`Missing on this machine: ${missing.join(', ')}. As root, run: ${command}`)
  const startedAt = performance.now()
  context.say('System packages', `installing ${missing.join(', ')}`)
  await withoutMainCluster(() => install(missing, context))
  const still = missing.filter((name) => !isThere[name]())
  if (still.length > 0) throw new OneLine(`Still missing after ${command}: ${still.join(', ')}.`)
  context.say('System packages', `ready in ${secondsSince(startedAt)}`)
}

/** @param {readonly string[]} names @param {Context} context */
async function install(names, { lifecycle }) {
  const options = { cwd: '/', env: { ...cleanEnvironment(), DEBIAN_FRONTEND: 'noninteractive' }, lifecycle }
  const wait = ['-o', 'DPkg::Lock::Timeout=300']
  await runCommand('apt-get', ['update', ...wait], options) // where it fails, the lists that are there may still do
  const done = await runCommand('apt-get', ['install', '-y', '--no-install-recommends', ...wait, ...names], options)
  if (done.code === 0) return
  const why = done.output.split('\n').find((line) => line.startsWith('E: ')) ?? `apt-get ended with ${done.code}`
  throw new OneLine(`${names.join(', ')} could not be installed: ${why.replace('E: ', '')}`)
}

/**
 * Debian's package makes and starts a cluster of its own on 5432 unless told not to; ours stands in the data folder.
 * @param {() => Promise<void>} act
 */
async function withoutMainCluster(act) {
  const folder = '/etc/postgresql-common/createcluster.d'
  const file = `${folder}/drenchleaf-no-main.conf`
  mkdirSync(folder, { recursive: true })
  writeFileSync(file, 'create_main_cluster = false\n')
  try {
    await act()
  } finally {
    rmSync(file, { force: true })
  }
}
