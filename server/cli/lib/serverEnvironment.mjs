import { join } from 'node:path'

/**
 * The environment of the server process.
 * @param {{ env: NodeJS.ProcessEnv, port: number, host: string, folder: string, database: import('./ownDatabase.mjs').Database }} from
 *   folder: of the data
 * @returns {NodeJS.ProcessEnv}
 */
export function serverEnvironment({ env, port, host, folder, database }) {
  const isOwn = database.demoPassword !== undefined
  // PGHOST and its like in this shell have nothing to do with a database of our own
  const kept = Object.entries(env).filter(([name]) => !/^(SEED_DEMO|DEMO_PASSWORD)$/.test(name) && !(isOwn && name.startsWith('PG')))
  return {
    NODE_ENV: 'production',
    ...Object.fromEntries(kept),
    PORT: String(port),
    HOST: host,
    DATA_DIR: folder,
    LOG_FILE: env.LOG_FILE || join(folder, 'server.log'),
    DATABASE_URL: database.databaseUrl,
    DATABASE_OWNER_URL: database.databaseOwnerUrl,
    SESSION_SECRET: database.sessionSecret,
    ...(isOwn && { DEMO_PASSWORD: database.demoPassword, SEED_DEMO: '1' }),
  }
}
