import { OneLine } from './OneLine.mjs'
import { buildIfStale } from './buildIfStale.mjs'
import { inCheckout } from './checkout.mjs'
import { openDataFolder } from './dataFolder.mjs'
import { ensurePackages } from './packages.mjs'
import { readRunFile } from './runFile.mjs'
import { runThrough } from './runThrough.mjs'
import { sayAside } from './say.mjs'

const usage = 'Say whose link it is: npm run owner -- mail@example.org'

/**
 * Prints a one-time link for the first owner of a database: the one named in the environment, or that of a running start.
 * @param {{ lifecycle: import('./lifecycle.mjs').Lifecycle, mail: string | undefined, env?: NodeJS.ProcessEnv }} wish
 * @returns {Promise<number>} exit code
 * @throws {OneLine} where there is no address, or no database to make it in
 */
export async function makeOwner({ lifecycle, mail, env = process.env }) {
  if (mail === undefined || !mail.includes('@')) throw new OneLine(usage)
  const database = databaseFacts(env)
  await ensurePackages({ lifecycle, say: sayAside })
  await buildIfStale({ lifecycle, say: sayAside })
  const program = inCheckout('dist/server/server/cli/owner.js')
  return runThrough([program, mail], { lifecycle, env: { ...env, ...database } })
}

/** @param {NodeJS.ProcessEnv} env @returns {NodeJS.ProcessEnv} */
function databaseFacts(env) {
  if (env.DATABASE_URL && env.DATABASE_OWNER_URL) return {}
  const { folder } = openDataFolder(env.DATA_DIR || inCheckout('.data'))
  const running = readRunFile(folder)
  if (running === undefined) {
    throw new OneLine('No database: name it in DATABASE_URL and DATABASE_OWNER_URL, or leave npm start running beside this.')
  }
  return { DATABASE_URL: running.databaseUrl, DATABASE_OWNER_URL: running.databaseOwnerUrl, PUBLIC_URL: env.PUBLIC_URL || running.url }
}
