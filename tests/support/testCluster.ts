export const TEMPLATE = 'drenchleaf_template'

export interface TestCluster {
  adminUrl: string
  appPassword: string
  ownerPassword: string
}

/** The throw-away cluster that the test command started. @throws {Error} when the tests are run without it. */
export function readTestCluster(): TestCluster {
  const { TEST_DATABASE_ADMIN_URL: adminUrl, TEST_APP_PASSWORD: appPassword, TEST_OWNER_PASSWORD: ownerPassword } = process.env
  if (!adminUrl || !appPassword || !ownerPassword) throw new Error('These tests need the throw-away cluster: npm test -- --only api')
  return { adminUrl, appPassword, ownerPassword }
}

/** The address of a database of the cluster for one of the two roles. */
export function databaseUrl(cluster: TestCluster, role: 'app' | 'owner', database: string): string {
  const url = new URL(cluster.adminUrl)
  url.username = `drenchleaf_${role}`
  url.password = role === 'app' ? cluster.appPassword : cluster.ownerPassword
  url.pathname = `/${database}`
  return url.href
}
