import { randomBytes } from 'node:crypto'
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Express } from 'express'
import pg from 'pg'
import pino, { type Logger } from 'pino'
import supertest from 'supertest'
import { v7 as uuidV7 } from 'uuid'
import { createFolderFiles } from '../../server/adapters/files/folderFiles.ts'
import { openMail } from '../../server/adapters/mail/openMail.ts'
import type { KeptLetter } from '../../server/adapters/mail/keptMail.ts'
import { createApp } from '../../server/app.ts'
import { cookiesOf, type Config } from '../../server/config.ts'
import type { FarmActor } from '../../server/database/actor.ts'
import { openDatabase } from '../../server/database/database.ts'
import { makeAccount, makeGrant, makePerson } from '../../server/demo/makeAccount.ts'
import { createReportProcess } from '../../server/reports/reportProcess.ts'
import { createFarm } from '../../server/services/farms/createFarm.ts'
import { sendDueLetters } from '../../server/services/mail/sendDueLetters.ts'
import { hashPassword } from '../../server/services/passwords.ts'
import type { Services } from '../../server/services/services.ts'
import { databaseUrl, readTestCluster, TEMPLATE } from './testCluster.ts'

export const PASSWORD = 'a long enough password'
export const NOW = '2026-06-16T14:00:00.000Z'
type Member = 'owner' | 'manager' | 'applicator' | 'certifier'
export type Agent = ReturnType<typeof supertest.agent>

export interface TestFarm {
  id: string
  accounts: Record<Member, { id: string; email: string }>
  personIds: Record<Exclude<Member, 'certifier'>, string>
  /** What a service takes for this member. */
  actor(member: Member): Promise<FarmActor>
}

/** A server over its own copy of the template database, with a clock that tests turn. */
export interface TestHouse {
  app: Express
  services: Services
  /** Owner's address of this copy, for looking past the policies. */
  ownerUrl: string
  setNow(instant: string): void
  makeFarm(overrides?: { zone?: string; seasons?: number[]; endsOn?: string }): Promise<TestFarm>
  /** A signed-in browser of this account. */
  as(account: { email: string }): Promise<Agent>
  /** Carries out what waits in the outbox. @returns what this address has got so far, newest first. */
  mailTo(email: string): Promise<KeptLetter[]>
  close(): Promise<void>
}

let passwordHash: Promise<string> | undefined

/** Opens a house for one test file. */
export async function openHouse(changes: { config?: Partial<Config>; logger?: Logger } = {}): Promise<TestHouse> {
  const cluster = readTestCluster()
  const name = `test_${randomBytes(8).toString('hex')}`
  await onAdmin(cluster.adminUrl, `CREATE DATABASE ${name} TEMPLATE ${TEMPLATE} OWNER drenchleaf_owner`)
  let now = new Date(NOW)
  const folder = await mkdtemp(join(tmpdir(), 'drenchleaf-files-'))
  const config: Config = {
    port: 4310, host: '127.0.0.1', databasePool: 5, logFile: null, demo: null, fixedClock: null, publicUrl: null,
    databaseUrl: databaseUrl(cluster, 'app', name), databaseOwnerUrl: databaseUrl(cluster, 'owner', name),
    farmsPerAccount: 20, files: { folder, bucket: null, quotaBytes: 100_000_000 }, tiles: null, mail: { smtpUrl: null, from: { name: 'Drenchleaf', address: 'register@farm.example' }, keptFile: null }, sessionSecret: 'a secret that only tests know, 32+',
    factorSecret: 'a secret that only tests know, 32+', sessionsPerAccount: 50, ...changes.config,
    cookies: cookiesOf(changes.config?.publicUrl ?? null),
  }
  const services: Services = {
    config,
    clock: { now: () => new Date(now) },
    logger: changes.logger ?? pino({ level: 'error' }, pino.destination(2)),
    database: await openDatabase(config.databaseUrl, config.databasePool, () => undefined),
    reports: createReportProcess(),
    files: createFolderFiles(config.files.folder),
    ...(await openMail(config.mail)),
    tiles: null,
    checkAnswers: true,
  }
  const { app, close } = createApp(services, null)
  return {
    app,
    services,
    ownerUrl: config.databaseOwnerUrl,
    setNow: (instant) => { now = new Date(instant) },
    makeFarm: (overrides) => makeFarm(services, overrides),
    as: (account) => signInAs(app, account.email),
    mailTo: async (email) => {
      await sendDueLetters(services)
      return (services.keptMail?.list() ?? []).filter(({ to }) => to.includes(email))
    },
    close: async () => {
      close()
      await services.mailer.close()
      await services.reports.close()
      await services.database.close()
      await rm(folder, { recursive: true, force: true })
      await onAdmin(cluster.adminUrl, `DROP DATABASE ${name} WITH (FORCE)`)
    },
  }
}

async function onAdmin(url: string, statement: string): Promise<void> {
  const client = new pg.Client({ connectionString: url })
  await client.connect()
  try {
    await client.query(statement)
  } finally {
    await client.end()
  }
}

async function makeFarm(services: Services, { zone = 'America/Los_Angeles', seasons = [2026], endsOn = '2026-12-31' } = {}): Promise<TestFarm> {
  const createdAt = services.clock.now()
  passwordHash ??= hashPassword(PASSWORD)
  const hash = await passwordHash
  const tag = randomBytes(4).toString('hex')
  const accounts = {} as TestFarm['accounts']
  for (const member of ['owner', 'manager', 'applicator', 'certifier'] as const) {
    const email = `${member}-${tag}@farm.example`
    accounts[member] = { email, id: await services.database.inHouse((manager) => makeAccount(manager, { email, name: `${member} ${tag}`, passwordHash: hash, createdAt })) }
  }
  const { farm } = await createFarm(services, accounts.owner.id, { id: uuidV7(), name: `Farm ${tag}`, zone, seasonStart: '03-01' })
  await services.database.inFarm({ farmId: farm.id, seasons: null }, async (manager) => {
    for (const role of ['manager', 'applicator'] as const) {
      await makePerson(manager, { farmId: farm.id, name: `${role} ${tag}`, role, accountId: accounts[role].id, createdAt })
    }
    await makeGrant(manager, { farmId: farm.id, accountId: accounts.certifier.id, seasons, endsOn, createdAt })
  })
  const actor = async (member: Member): Promise<FarmActor> => {
    const [access] = await services.database.listAccess(accounts[member].id, services.clock.now())
    if (!access) throw new Error(`${member} has no way into the farm`)
    return access
  }
  const idOf = async (member: Exclude<Member, 'certifier'>) => (await actor(member)).personId ?? ''
  const personIds = { owner: await idOf('owner'), manager: await idOf('manager'), applicator: await idOf('applicator') }
  return { id: farm.id, accounts, personIds, actor }
}

async function signInAs(app: Express, email: string): Promise<Agent> {
  const agent = supertest.agent(app)
  void agent.set('X-Requested-With', 'drenchleaf')
  const response = await agent.post('/api/session').send({ email, password: PASSWORD })
  if (response.status !== 200) throw new Error(`Sign-in of ${email} failed: ${response.status}`)
  return agent
}
