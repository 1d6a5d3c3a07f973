import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { buildRecord } from '../../server/demo/buildThings.ts'
import { FindInRegister1764602000000 } from '../../migrations/1764602000000-FindInRegister.ts'
import { FindUnreviewed1764646000000 } from '../../migrations/1764646000000-FindUnreviewed.ts'
import { createOwnerSource } from '../../server/database/dataSource.ts'
import type { RegisterRow } from '../../shared/contract/record.ts'
import { REGISTER_SORTS } from '../../shared/contract/register.ts'
import { wordsToFindBy } from '../../shared/register/foldWords.ts'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedAsOwner } from '../support/seedManyRecords.ts'
import type { SeedGround } from '../support/seedTemplates.ts'
import { seedThings } from '../support/seedThings.ts'

const RECORDS = 700

let house: TestHouse
let farm: TestFarm
let ground: SeedGround
let manager: Agent
let certifier: Agent
let everything: RegisterRow[]

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm({ seasons: [2024, 2025] })
  ground = await seedAsOwner(house.ownerUrl, { farmId: farm.id, count: RECORDS, from: '2023-02-01T00:00:00Z' })
  manager = await house.as(farm.accounts.manager)
  certifier = await house.as(farm.accounts.certifier)
  everything = await walk(manager, '')
}, 120_000)
afterAll(() => house.close())

async function walk(agent: Agent, query: string, limit = 200): Promise<RegisterRow[]> {
  const rows: RegisterRow[] = []
  let cursor = ''
  do {
    const { body } = await agent.get(`/api/farms/${farm.id}/records?limit=${limit}${query}${cursor}`).expect(200)
    rows.push(...body.items as RegisterRow[])
    cursor = body.next === null ? '' : `&cursor=${body.next as string}`
  } while (cursor !== '')
  return rows
}

const idsOf = (rows: readonly RegisterRow[]) => rows.map(({ id }) => id)
const first = (things: readonly { id: string }[], place: number) => things[place]?.id ?? ''
/** The season of the work, March to February, in the farm's zone eight hours behind. */
const seasonOfRow = (row: RegisterRow) => {
  const local = new Date(Date.parse(row.startedAt ?? '') - 8 * 3_600_000)
  return local.getUTCMonth() < 2 ? local.getUTCFullYear() - 1 : local.getUTCFullYear()
}
const nameOf = (things: readonly { id: string; name: string }[], place: number) => things[place]?.name ?? ''

interface Case { query: () => string; fits: (row: RegisterRow) => boolean }
const has = (row: RegisterRow, ...words: string[]) => {
  const written = [row.number ?? '', row.by, ...row.lots, ...row.preparations, ...row.blocks.flatMap(({ id, code }) => [code, ground.blocks.find((block) => block.id === id)?.name ?? ''])]
  const found = written.flatMap(wordsToFindBy)
  return words.every((word) => found.some((one) => one.startsWith(word)))
}
const CASES: Record<string, Case> = {
  block: { query: () => `&block=${first(ground.blocks, 3)}`, fits: (row) => row.blocks.some(({ id }) => id === first(ground.blocks, 3)) },
  material: { query: () => `&material=${first(ground.materials, 2)}`, fits: (row) => row.preparations.includes(nameOf(ground.materials, 2)) },
  person: { query: () => `&person=${first(ground.people, 1)}`, fits: (row) => row.by === nameOf(ground.people, 1) },
  method: { query: () => '&method=drench', fits: (row) => row.method === 'drench' },
  withdrawn: { query: () => '&state=withdrawn', fits: (row) => row.state === 'withdrawn' },
  'signed foliar': { query: () => '&state=signed&method=foliar', fits: (row) => row.state === 'signed' && row.method === 'foliar' },
  season: { query: () => '&season=2024', fits: (row) => seasonOfRow(row) === 2024 },
  'season and block': { query: () => `&season=2024&block=${first(ground.blocks, 3)}`, fits: (row) => seasonOfRow(row) === 2024 && row.blocks.some(({ id }) => id === first(ground.blocks, 3)) },
  'block and material': { query: () => `&block=${first(ground.blocks, 4)}&material=${first(ground.materials, 2)}`, fits: (row) => row.blocks.some(({ id }) => id === first(ground.blocks, 4)) && row.preparations.includes(nameOf(ground.materials, 2)) },
  'a lot by its beginning': { query: () => '&q=sl-7', fits: (row) => has(row, 'sl-7') },
  'two words': { query: () => `&q=${encodeURIComponent('BANK soap')}`, fits: (row) => has(row, 'bank', 'soap') },
  'a person without their accents': { query: () => '&q=pena', fits: (row) => has(row, 'pena') },
  'a person with them': { query: () => `&q=${encodeURIComponent('Inés')}`, fits: (row) => has(row, 'ines') },
  'a number': { query: () => '&q=2024-0017', fits: (row) => row.number === '2024-0017' },
  'one letter, which stands for many words': { query: () => '&q=s', fits: (row) => has(row, 's') },
  'a word nobody wrote': { query: () => '&q=zzz', fits: () => false },
}

describe('the register', () => {
  it.each(Object.keys(CASES))('finds by %s what fits and nothing else, page by page', async (name) => {
    const { query, fits } = CASES[name] as Case
    const expected = idsOf(everything.filter(fits))
    const found = await walk(manager, query(), 37)
    // What stands only in purpose or notes is no column of a row; such words are tested below.
    if (name.startsWith('one letter')) expect(idsOf(found)).toEqual(expect.arrayContaining(expected))
    else expect(idsOf(found)).toEqual(expected)
  })

  it.each(REGISTER_SORTS)('goes through everything once in the order %s', async (sort) => {
    const key = (row: RegisterRow): number => {
      if (sort.endsWith('area')) return Number(row.areaHa)
      if (sort.endsWith('when')) return Date.parse(row.startedAt ?? '')
      const [season = '0', number = '0'] = (row.number ?? '9999-0').split('-')
      return Number(season) * 1e6 + Number(number)
    }
    const direction = sort.startsWith('-') ? -1 : 1
    const expected = [...everything].sort((one, other) => direction * (key(one) - key(other) || (one.id < other.id ? -1 : 1)))
    expect(idsOf(await walk(manager, `&sort=${sort}`, 90))).toEqual(idsOf(expected))
    const drenches = expected.filter(({ method }) => method === 'drench')
    expect(idsOf(await walk(manager, `&sort=${sort}&method=drench`, 90))).toEqual(idsOf(drenches))
  })

  it('shows a certifier the signed records of their seasons, by any filter', async () => {
    const open = everything.filter(({ season }) => season === 2024 || season === 2025)
    expect(idsOf(await walk(certifier, ''))).toEqual(idsOf(open))
    expect(idsOf(await walk(certifier, '&season=2023'))).toEqual([])
    expect(idsOf(await walk(certifier, '&sort=number&method=foliar'))).toEqual(idsOf(open.filter(({ method }) => method === 'foliar').sort((one, other) => ((one.number ?? '') < (other.number ?? '') ? -1 : 1))))
    expect(idsOf(await walk(certifier, '&q=bank'))).toEqual(idsOf(open.filter((row) => has(row, 'bank'))))
  })

  it('finds words of purpose and notes, as they were last written', async () => {
    const own = await house.makeFarm()
    const things = await seedThings(house, own)
    const agent = await house.as(own.accounts.applicator)
    const input = buildRecord({ ...things, purpose: 'Mehltau auf Blättern', notes: 'Ruhig.\nNebel im Tal' })
    await agent.post(`/api/farms/${own.id}/records`).send(input).expect(201)
    const find = async (q: string) => idsOf((await agent.get(`/api/farms/${own.id}/records?q=${encodeURIComponent(q)}`).expect(200)).body.items as RegisterRow[])
    for (const q of ['blattern', 'BLÄTTERN mehl', 'nebel tal', 'nettle', 'n-1 first', 'applicator']) expect(await find(q), q).toEqual([input.id])
    const { id: _id, deviceAt: _deviceAt, ...content } = input
    await agent.put(`/api/farms/${own.id}/records/${input.id}`).send({ ...content, purpose: 'Rost', revision: 1 }).expect(200)
    expect(await find('blattern')).toEqual([])
    expect(await find('rost')).toEqual([input.id])
    expect(await find('2026-0001')).toEqual([])
    await agent.post(`/api/farms/${own.id}/records/${input.id}/sign`).send({ password: PASSWORD }).expect(200)
    for (const q of ['2026-0001', '0001', '1', 'rost']) expect(await find(q), q).toEqual([input.id])
  })
})

describe('a query of the register', () => {
  const codes = async (query: string) => {
    const { status, body } = await manager.get(`/api/farms/${farm.id}/records?${query}`)
    return [status, ...(body.errors as { path: string; code: string }[]).map(({ path, code }) => `${path} ${code}`)]
  }

  it.each([
    'season=1&season=2', 'season[a]=1', 'season=20xx', 'season=1', 'season=9999', 'limit=0', 'limit=-1', 'limit=1e9', 'limit=201',
    'sort=password', 'sort=id;drop', 'sort=-when,number', 'sort=', 'block=b', 'material=', 'person=1', 'method=smoke', 'state=old',
    'q=', 'q=%20', 'q=--', 'q=a%00b', `q=${'a'.repeat(101)}`, 'q=a+b+c+d+e+f+g+h+i', 'qq=a', '__proto__[a]=1',
  ])('is refused as unreadable: %s', async (query) => {
    expect((await codes(query))[0]).toBe(422)
  })

  it('cannot go on in another order, another filter or another farm’s list with a cursor', async () => {
    const page = await manager.get(`/api/farms/${farm.id}/records?limit=3&method=drench&sort=number`).expect(200)
    const cursor = page.body.next as string
    for (const other of ['method=drench', 'method=foliar&sort=number', 'sort=number', 'method=drench&sort=-number', 'method=drench&sort=number&q=bank']) {
      expect(await codes(`${other}&cursor=${cursor}`)).toEqual([422, 'cursor cursor.invalid'])
    }
    await manager.get(`/api/farms/${farm.id}/records?limit=9&sort=number&method=drench&cursor=${cursor}`).expect(200)
    const [, id, list] = JSON.parse(Buffer.from(cursor, 'base64url').toString()) as string[]
    for (const key of ['', 'x', '99999999999999999999', '1e5', '-1', null]) {
      const forged = Buffer.from(JSON.stringify([key, id, list])).toString('base64url')
      expect(await codes(`method=drench&sort=number&cursor=${forged}`)).toEqual([422, 'cursor cursor.invalid'])
    }
  })
})

describe('records from before the register could be searched', () => {
  it('are given the same entries and terms by the migrations', async () => {
    const source = await createOwnerSource(house.ownerUrl).initialize()
    const runner = source.createQueryRunner()
    const read = async () => {
      await runner.query("SELECT set_config('app.farm_id', $1, true)", [farm.id])
      return [
        await runner.query('SELECT * FROM register_entries ORDER BY record_id'),
        await runner.query('SELECT * FROM record_terms ORDER BY record_id, term'),
      ]
    }
    await runner.startTransaction()
    const before = await read()
    const migrations = [new FindInRegister1764602000000(), new FindUnreviewed1764646000000()]
    for (const migration of migrations.toReversed()) await migration.down(runner)
    for (const migration of migrations) await migration.up(runner)
    const after = await read()
    await runner.rollbackTransaction()
    await source.destroy()
    expect((after[1] as unknown[]).length).toBeGreaterThan(RECORDS * 10)
    expect(after).toEqual(before)
  }, 120_000)
})
