import { join } from 'node:path'
import supertest from 'supertest'
import { v7 as uuidV7 } from 'uuid'
import { buildBlock, buildLot, buildMaterial, buildRecord } from '../../server/demo/buildThings.ts'
import { createBlock } from '../../server/services/blocks/createBlock.ts'
import { createMaterial } from '../../server/services/inputs/createMaterial.ts'
import { receiveLot } from '../../server/services/inputs/receiveLot.ts'
import type { CreateRecord } from '../../shared/contract/recordChanges.ts'
import setUp from '../support/globalSetup.ts'
import { NOW, openHouse, PASSWORD, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedAsOwner } from '../support/seedManyRecords.ts'
import { startChild, type Child } from './startChild.ts'

/** Records of the farm that lists and writes are measured on, and of a small one beside it. */
const MANY = 100_000
const FEW = 1_000

/** What the figures are measured on: two farms in one database, and the built server over it. */
export interface Field {
  house: TestHouse
  farm: TestFarm
  smallFarm: TestFarm
  server: Child
  /** Settings of every server over this database. */
  env: NodeJS.ProcessEnv
  /** Signed in as the manager of the farm, and of the small one. */
  cookies: { farm: string; small: string }
  /** Ids that every record here names. */
  known: string[]
  /** A new draft of five components. */
  buildDraft(): CreateRecord
  close(): Promise<void>
}

/** Fills a database and starts the server over it. @param many whether a figure needs the large farm. */
export async function openField({ many }: { many: boolean }): Promise<Field> {
  await setUp()
  const house = await openHouse()
  house.services.checkAnswers = false
  const [farm, smallFarm] = [await house.makeFarm(), await house.makeFarm()]
  await seedAsOwner(house.ownerUrl, { farmId: farm.id, count: many ? MANY : FEW })
  await seedAsOwner(house.ownerUrl, { farmId: smallFarm.id, count: FEW })
  const things = await makeThings(house, farm)
  const { databaseUrl, sessionSecret } = house.services.config
  const env = {
    DATABASE_URL: databaseUrl, DATABASE_OWNER_URL: house.ownerUrl, SESSION_SECRET: sessionSecret, FIXED_CLOCK: NOW,
    PORT: '0', DATA_DIR: process.env['BENCH_FOLDER'], LOG_FILE: join(process.env['BENCH_FOLDER'] ?? '', 'bench.log'),
  }
  const server = await startChild([process.env['BENCH_SERVER'] ?? ''], { ...env, PORT: String(await freePort()) })
  return {
    house, farm, smallFarm, server, env,
    cookies: { farm: await signIn(server.url, farm.accounts.manager.email), small: await signIn(server.url, smallFarm.accounts.manager.email) },
    known: [farm.id, farm.accounts.manager.id, farm.personIds.manager, things.blockId, ...things.parts.flatMap(({ materialId, lotId }) => [materialId, lotId])],
    buildDraft: () => buildRecord({
      ...things.parts[0] ?? { materialId: '', lotId: '' }, blockId: things.blockId,
      components: things.parts.map((part, index) => ({ ...part, basis: { kind: 'ratio', parts: String(20 * (index + 1)) } })),
    }),
    close: async () => {
      await server.stop()
      await house.close()
    },
  }
}

async function freePort(): Promise<number> {
  const { freePort: find } = await import('../../server/cli/lib/freePort.mjs')
  return find('127.0.0.1')
}

async function signIn(url: string, email: string): Promise<string> {
  const response = await supertest(url).post('/api/session').set('X-Requested-With', 'drenchleaf').send({ email, password: PASSWORD })
  const cookies: unknown = response.headers['set-cookie']
  const session = Array.isArray(cookies) ? cookies.map(String).find((cookie) => cookie.startsWith('drenchleaf.sid=')) : undefined
  if (session === undefined) throw new Error(`sign-in answered ${response.status}`)
  return session.split(';')[0] ?? ''
}

/** A block, and five materials with a lot each that no run empties. */
async function makeThings({ services }: TestHouse, farm: TestFarm): Promise<{ blockId: string; parts: { materialId: string; lotId: string }[] }> {
  const actor = await farm.actor('owner')
  const { block } = await createBlock(services, actor, buildBlock({ code: 'BENCH', name: 'Measured' }))
  const parts = []
  for (const name of ['One', 'Two', 'Three', 'Four', 'Five']) {
    const { material } = await createMaterial(services, actor, buildMaterial({ id: uuidV7(), name: `Measured ${name}` }))
    const { lot } = await receiveLot(services, actor, buildLot({ materialId: material.id, code: `M-${name}`, quantity: { value: '9999999', unit: 'L' } }))
    parts.push({ materialId: material.id, lotId: lot.id })
  }
  return { blockId: block.id, parts }
}
