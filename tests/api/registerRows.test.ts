import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { ApplicationRecord } from '../../server/entities/ApplicationRecord.ts'
import { storeProjections } from '../../server/services/records/storeProjections.ts'
import { findTerms } from '../../server/services/register/findTerms.ts'
import { pageStatement } from '../../server/services/register/registerQuery.ts'
import { REGISTER_SORTS, type RegisterFilter, type RegisterSort } from '../../shared/contract/register.ts'
import { rowsRead, type RowsRead } from '../support/explainRows.ts'
import { openHouse, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedAsOwner } from '../support/seedManyRecords.ts'
import type { SeedGround } from '../support/seedTemplates.ts'

const RECORDS = 100_000
/** What a page of 50 reads: 50 rows, and one to know whether it goes on. */
const PAGE = 51

let house: TestHouse
let farm: TestFarm
let ground: SeedGround

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm({ seasons: [2024] })
  await house.makeFarm()
  ground = await seedAsOwner(house.ownerUrl, { farmId: farm.id, count: RECORDS })
}, 600_000)
afterAll(() => house.close())

/** What a page reads, as the app role behind the policies. */
async function explain(filter: RegisterFilter, sort: RegisterSort = '-when', seasons: number[] | null = null): Promise<RowsRead> {
  const actor = { farmId: farm.id, seasons }
  return house.services.database.inFarm(actor, async (manager) => {
    const search = await findTerms(manager, actor, filter)
    const { sql, params } = pageStatement(farm.id, search, { sort, after: null, limit: PAGE, columns: 'd.state, d.register_row' })
    return rowsRead(await manager.query(`EXPLAIN (ANALYZE, TIMING OFF, FORMAT JSON) ${sql}`, params))
  })
}

const filters = (): Record<string, RegisterFilter> => ({
  block: { block: ground.blocks[3]?.id },
  material: { material: ground.materials[2]?.id },
  person: { person: ground.people[1]?.id },
  method: { method: 'drench' },
  signed: { state: 'signed' },
  started: { state: 'started' },
  withdrawn: { state: 'withdrawn' },
  'one word': { q: 'comfrey' },
  'the beginning of several words': { q: 'ne' },
  'a name of a person': { q: 'pena' },
  'a number': { q: '2024-0143' },
} as Record<string, RegisterFilter>)

describe('a page of the register of 100,000 records', () => {
  it.each(REGISTER_SORTS)('reads no more than the page in the order %s', async (sort) => {
    const read = await explain({}, sort)
    expect(read.rows, read.nodes.join('\n')).toBeLessThanOrEqual(2 * PAGE)
    expect(read.rows).toBeGreaterThanOrEqual(PAGE)
  })

  it.each(['block', 'material', 'person', 'method', 'signed', 'started', 'withdrawn', 'one word', 'the beginning of several words', 'a name of a person', 'a number'])(
    'reads no more than twice the page for %s, in one season or in all', async (name) => {
      const filter = filters()[name] ?? {}
      for (const season of [undefined, 2019]) {
        const read = await explain(season === undefined ? filter : { ...filter, season })
        // A list more is looked into at its first row for each word that a beginning stands for.
        const heads = name === 'the beginning of several words' ? read.nodes.length : 0
        expect(read.rows, read.nodes.join('\n')).toBeLessThanOrEqual(2 * PAGE + heads)
      }
    })

  it('reads no more than twice the page for a season, whoever looks', async () => {
    for (const seasons of [null, [2019], [2018, 2019]]) {
      const read = await explain({ season: 2019 }, '-when', seasons)
      expect(read.rows, read.nodes.join('\n')).toBeLessThanOrEqual(2 * PAGE)
    }
  })

  it('reads no more than twice the page for a certifier of one old season', async () => {
    const read = await explain({}, '-when', [2018])
    expect(read.rows, read.nodes.join('\n')).toBeLessThanOrEqual(2 * PAGE)
  })
})

describe('a seeded record', () => {
  it('is found by what the program itself would write for it', async () => {
    const actor = { farmId: farm.id, seasons: null }
    await house.services.database.inFarm(actor, async (manager) => {
      const projected = async (id: string) => [
        await manager.query('SELECT term, season, work_season, sort_at FROM record_terms WHERE farm_id = $1 AND record_id = $2 ORDER BY term', [farm.id, id]),
        await manager.query('SELECT * FROM register_entries WHERE farm_id = $1 AND record_id = $2', [farm.id, id]),
        await manager.query('SELECT * FROM record_lines WHERE farm_id = $1 AND record_id = $2 ORDER BY position', [farm.id, id]),
        await manager.query('SELECT * FROM record_components WHERE farm_id = $1 AND record_id = $2 ORDER BY position', [farm.id, id]),
      ]
      for (const state of ['signed', 'started', 'withdrawn'] as const) {
        const [record] = await manager.find(ApplicationRecord, { where: { farmId: farm.id, state }, order: { sortAt: 'DESC' }, skip: 11, take: 1 })
        if (!record) throw new Error(`no ${state} record`)
        const seeded = await projected(record.id)
        await storeProjections(manager, record, true)
        expect(await projected(record.id)).toEqual(seeded)
      }
    })
  })
})
