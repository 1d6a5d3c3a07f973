import { join } from 'node:path'
import { OneLine } from './OneLine.mjs'
import { startCluster } from './cluster.mjs'
import { databaseUrl, ensureRoles } from './databaseRoles.mjs'
import { findPostgres } from './postgresBinaries.mjs'
import { secondsSince } from './say.mjs'
import { secretsOf } from './secrets.mjs'
import { ensureSystemPackages } from './systemPackages.mjs'

/**
 * What the server is told about its database. `seeds` is whether the demo farm may be put into it when empty.
 * @typedef {{ databaseUrl: string, databaseOwnerUrl: string, sessionSecret: string, demoPassword?: string,
 *   ended?: Promise<void> }} Database
 *   demoPassword: only with a database of our own; ended: settles when that database is gone
 */

/**
 * The database of a data folder: installed, made and started as needed, with both roles.
 * @param {{ data: import('./dataFolder.mjs').DataFolder, lifecycle: import('./lifecycle.mjs').Lifecycle,
 *   say: import('./say.mjs').Say }} context
 * @returns {Promise<Database>}
 */
export async function startOwnDatabase({ data, lifecycle, say }) {
  const startedAt = performance.now()
  const folder = join(data.folder, 'postgres')
  if (findPostgres(folder) === undefined) await ensureSystemPackages(['postgresql'], { lifecycle, say })
  const bin = findPostgres(folder)
  if (bin === undefined) throw new OneLine('PostgreSQL 15 or later is missing: install the package postgresql.')
  const secrets = secretsOf(data.folder)
  const { superuserPassword } = secrets
  const cluster = await startCluster({ bin, folder, user: data.user, superuserPassword, lifecycle })
  await ensureRoles({ bin, port: cluster.port, passwords: secrets, lifecycle })
  say('Database', `ready in ${secondsSince(startedAt)}, port ${cluster.port}`)
  return {
    databaseUrl: databaseUrl({ role: 'drenchleaf_app', password: secrets.appPassword, port: cluster.port }),
    databaseOwnerUrl: databaseUrl({ role: 'drenchleaf_owner', password: secrets.ownerPassword, port: cluster.port }),
    sessionSecret: secrets.sessionSecret,
    demoPassword: secrets.demoPassword,
    ended: cluster.ended,
  }
}
