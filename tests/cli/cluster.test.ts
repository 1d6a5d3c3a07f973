import { chmodSync, existsSync } from 'node:fs'
import { join } from 'node:path'
import pg from 'pg'
import { afterEach, describe, expect, it } from 'vitest'
import { startCluster } from '../../server/cli/lib/cluster.mjs'
import { databaseUrl, ensureRoles } from '../../server/cli/lib/databaseRoles.mjs'
import { databaseUser } from '../../server/cli/lib/databaseUser.mjs'
import { createLifecycle } from '../../server/cli/lib/lifecycle.mjs'
import { findPostgres } from '../../server/cli/lib/postgresBinaries.mjs'
import { processesIn } from '../../server/cli/lib/processes.mjs'
import { makeSecrets } from '../../server/cli/lib/secrets.mjs'
import { temporaryFolder } from './temporaryFolder.ts'

const parent = temporaryFolder()
const folder = join(parent, 'postgres')
const bin = findPostgres() ?? ''
const secrets = makeSecrets()
const user = databaseUser([])
if (user === undefined) chmodSync(parent, 0o700)

let lifecycle = createLifecycle()
const start = async (): Promise<Awaited<ReturnType<typeof startCluster>>> => {
  const cluster = await startCluster({ bin, folder, user, superuserPassword: secrets.superuserPassword, lifecycle })
  await ensureRoles({ bin, port: cluster.port, passwords: secrets })
  return cluster
}

const passwords = { drenchleaf_app: secrets.appPassword, drenchleaf_owner: secrets.ownerPassword, postgres: secrets.superuserPassword }

async function ask<Row>(role: keyof typeof passwords, port: number, statement: string): Promise<Row[]> {
  const database = role === 'postgres' ? 'postgres' : 'drenchleaf'
  const client = new pg.Client({ connectionString: databaseUrl({ role, password: passwords[role], port, database }) })
  await client.connect()
  try {
    return (await client.query(statement)).rows as Row[]
  } finally {
    await client.end()
  }
}

afterEach(async () => {
  await lifecycle.stop()
  lifecycle = createLifecycle()
})

describe('a cluster in a folder', () => {
  it('starts with two roles of few rights and stops without a trace', async () => {
    const { port, stop, ended } = await start()
    const roles = await ask('drenchleaf_app', port, `SELECT rolname, rolsuper OR rolbypassrls OR rolcreatedb OR rolcreaterole AS strong,
      EXISTS (SELECT FROM pg_database WHERE datdba = pg_roles.oid) AS owns FROM pg_roles WHERE rolname LIKE 'drenchleaf%' ORDER BY 1`)
    expect(roles).toEqual([
      { rolname: 'drenchleaf_app', strong: false, owns: false },
      { rolname: 'drenchleaf_owner', strong: false, owns: true },
    ])
    await stop()
    await ended
    expect(processesIn(folder)).toEqual([])
  })

  it('listens on loopback with a password and no file socket', async () => {
    const { port } = await start()
    const shown = await ask('postgres', port, `SELECT current_setting('listen_addresses') AS hosts, current_setting('unix_socket_directories') AS sockets,
      current_setting('fsync') AS fsync, current_setting('server_encoding') AS encoding`)
    expect(shown).toEqual([{ hosts: '127.0.0.1', sockets: '', fsync: 'on', encoding: 'UTF8' }])
    const wrong = new pg.Client({ connectionString: databaseUrl({ role: 'drenchleaf_app', password: 'wrong', port }) })
    await expect(wrong.connect()).rejects.toMatchObject({ code: '28P01' })
  })

  it('keeps what was committed when every process of it is killed', async () => {
    const first = await start()
    await ask('drenchleaf_owner', first.port, 'CREATE TABLE kept (n integer); INSERT INTO kept VALUES (7)')
    for (const { pid } of processesIn(folder)) process.kill(pid, 'SIGKILL')
    await first.ended
    expect(existsSync(join(folder, 'postmaster.pid'))).toBe(true)
    const second = await start()
    expect(await ask('drenchleaf_owner', second.port, 'SELECT n FROM kept')).toEqual([{ n: 7 }])
  })

  it('stops one that an earlier run left running', async () => {
    const first = await start()
    const second = await start()
    await first.ended
    expect(await ask('drenchleaf_app', second.port, 'SELECT 1 AS one')).toEqual([{ one: 1 }])
    expect(processesIn(folder).map(({ pid }) => pid)).not.toContain(first.pid)
  })
})
