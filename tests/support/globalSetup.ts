import pg from 'pg'
import { prepareDatabase } from '../../server/database/prepareDatabase.ts'
import { databaseUrl, readTestCluster, TEMPLATE } from './testCluster.ts'

/** Builds the template database once; every test file works in a copy of it. */
export default async function setUp(): Promise<void> {
  const cluster = readTestCluster()
  const admin = new pg.Client({ connectionString: cluster.adminUrl })
  await admin.connect()
  await admin.query(`DROP DATABASE IF EXISTS ${TEMPLATE} WITH (FORCE)`)
  await admin.query(`CREATE DATABASE ${TEMPLATE} OWNER drenchleaf_owner`)
  await admin.end()
  await prepareDatabase(databaseUrl(cluster, 'owner', TEMPLATE), 'drenchleaf_app')
}
