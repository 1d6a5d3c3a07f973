import type { DataSource } from 'typeorm'
import { createOwnerSource } from './dataSource.ts'
import { APP_FUNCTIONS, APP_RIGHTS } from './roles.ts'

/**
 * Brings the schema up to date and gives the app role exactly the rights of `APP_RIGHTS`.
 * @param ownerUrl address of the role that owns the tables; @param appRole name of the role that serves.
 */
export async function prepareDatabase(ownerUrl: string, appRole: string): Promise<void> {
  const source = createOwnerSource(ownerUrl)
  await source.initialize()
  try {
    await source.runMigrations()
    await grantRights(source, appRole)
  } finally {
    await source.destroy()
  }
}

async function grantRights(source: DataSource, appRole: string): Promise<void> {
  const role = `"${appRole.replaceAll('"', '""')}"`
  await source.transaction(async (manager) => {
    await manager.query(`REVOKE ALL ON ALL TABLES IN SCHEMA public FROM ${role}`)
    for (const [table, rights] of Object.entries(APP_RIGHTS)) {
      await manager.query(`GRANT ${rights} ON ${table} TO ${role}`)
    }
    for (const name of APP_FUNCTIONS) await manager.query(`GRANT EXECUTE ON FUNCTION ${name} TO ${role}`)
  })
}
