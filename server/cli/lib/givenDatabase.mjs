import { OneLine } from './OneLine.mjs'
import { secretsOf } from './secrets.mjs'

/**
 * The database named in the environment, if one is; ours stays out of it and nothing is seeded.
 * @param {NodeJS.ProcessEnv} env
 * @param {string} folder of the data, where the session secret is kept unless SESSION_SECRET names it
 * @returns {import('./ownDatabase.mjs').Database | undefined}
 * @throws {OneLine} where only half of it is named
 */
export function givenDatabase(env, folder) {
  const { DATABASE_URL: app, DATABASE_OWNER_URL: owner, SESSION_SECRET: secret } = env
  if (!app && !owner) return undefined
  if (!app || !owner) {
    throw new OneLine(`${app ? 'DATABASE_OWNER_URL' : 'DATABASE_URL'} is missing: name both roles of the database, or neither to use a database of our own.`)
  }
  return { databaseUrl: app, databaseOwnerUrl: owner, sessionSecret: secret || secretsOf(folder).sessionSecret }
}
