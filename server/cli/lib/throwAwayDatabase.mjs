import { join } from 'node:path'
import { OneLine } from './OneLine.mjs'
import { startCluster } from './cluster.mjs'
import { databaseUrl, ensureRoles } from './databaseRoles.mjs'
import { databaseUser } from './databaseUser.mjs'
import { findPostgres } from './postgresBinaries.mjs'
import { makeSecrets } from './secrets.mjs'
import { secondsSince } from './say.mjs'

/**
 * @typedef {{ adminUrl: string, database: import('./ownDatabase.mjs').Database, secrets: import('./secrets.mjs').Secrets }} ThrowAwayDatabase
 *   adminUrl: as superuser, for making databases; database: an empty one with both roles
 */

/**
 * A database for one run, in a folder that goes with it.
 * @param {{ folder: string, lifecycle: import('./lifecycle.mjs').Lifecycle, say: import('./say.mjs').Say }} context
 * @returns {Promise<ThrowAwayDatabase>}
 */
export async function startThrowAwayDatabase({ folder, lifecycle, say }) {
  const startedAt = performance.now()
  const bin = findPostgres()
  if (bin === undefined) throw new OneLine('PostgreSQL 15 or later is missing: install the package postgresql.')
  const secrets = makeSecrets()
  const cluster = await startCluster({ bin, folder: join(folder, 'postgres'), user: databaseUser([]), superuserPassword: secrets.superuserPassword, lifecycle })
  const { port } = cluster
  await ensureRoles({ bin, port, passwords: secrets, lifecycle })
  say('Database', `ready in ${secondsSince(startedAt)}, in ${folder}`)
  return {
    adminUrl: databaseUrl({ role: 'postgres', password: secrets.superuserPassword, port, database: 'postgres' }),
    database: {
      databaseUrl: databaseUrl({ role: 'drenchleaf_app', password: secrets.appPassword, port }),
      databaseOwnerUrl: databaseUrl({ role: 'drenchleaf_owner', password: secrets.ownerPassword, port }),
      sessionSecret: secrets.sessionSecret,
      demoPassword: secrets.demoPassword,
      ended: cluster.ended,
    },
    secrets,
  }
}
