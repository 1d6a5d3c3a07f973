import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import pg from 'pg'
import { buildBlock, buildLot, buildMaterial, buildRecord, squareAt } from '../../server/demo/buildThings.ts'
import { Block } from '../../server/entities/Block.ts'
import { LotEntry } from '../../server/entities/LotEntry.ts'
import { SeasonCounter } from '../../server/entities/SeasonCounter.ts'
import { appendJournal } from '../../server/services/appendJournal.ts'
import { createBlock } from '../../server/services/blocks/createBlock.ts'
import { createMaterial } from '../../server/services/inputs/createMaterial.ts'
import { openHouse, PASSWORD, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'

let house: TestHouse
let mine: TestFarm
let theirs: TestFarm
let things: SeededThings
let theirThings: SeededThings

beforeAll(async () => {
  house = await openHouse()
  mine = await house.makeFarm()
  theirs = await house.makeFarm()
  things = await seedThings(house, mine)
  theirThings = await seedThings(house, theirs)
})
afterAll(() => house.close())

describe('row-level security', () => {
  it('shows no row of any farm outside inFarm', async () => {
    expect(await house.services.database.inHouse((manager) => manager.count(Block))).toBe(0)
  })

  it('shows only the farm that was named, even when no filter is written', async () => {
    const seen = await house.services.database.inFarm({ farmId: mine.id, seasons: null }, (manager) => manager.find(Block))
    expect(seen.map(({ id }) => id)).toEqual([things.blockId])
  })

  it('forgets the farm when its transaction fails', async () => {
    await expect(house.services.database.inFarm({ farmId: mine.id, seasons: null }, () => Promise.reject(new Error('on purpose')))).rejects.toThrow('on purpose')
    expect(await house.services.database.inHouse((manager) => manager.count(Block))).toBe(0)
  })

  it('refuses a row for another farm', async () => {
    const write = house.services.database.inFarm({ farmId: mine.id, seasons: null }, (manager) =>
      manager.query('INSERT INTO farm_heads (farm_id) VALUES ($1)', [theirs.id]))
    await expect(write).rejects.toMatchObject({ code: '42501' })
  })

  it('refuses every write while seasons are limited', async () => {
    const write = house.services.database.inFarm({ farmId: mine.id, seasons: [2026] }, (manager) =>
      manager.query("INSERT INTO season_counters (farm_id, season) VALUES ($1, 2031)", [mine.id]))
    await expect(write).rejects.toMatchObject({ code: '42501' })
  })
})

describe('evidence', () => {
  it.each(['record_versions', 'journal', 'lot_entries'])('%s keeps its rows from the app role and from the owner', async (table) => {
    const client = new pg.Client({ connectionString: house.ownerUrl })
    await client.connect()
    const asApp = house.services.database.inFarm({ farmId: mine.id, seasons: null }, (manager) => manager.query(`DELETE FROM ${table}`))
    await expect(asApp).rejects.toMatchObject({ code: '42501' })
    await expect(client.query(`TRUNCATE ${table} CASCADE`)).rejects.toMatchObject({ code: '42501' })
    await client.end()
  })
})

describe('a signed record', () => {
  it('cannot be unsigned or rewritten by the app role, nor its log wound back', async () => {
    const owner = await house.as(mine.accounts.owner)
    const input = buildRecord(things)
    await owner.post(`/api/farms/${mine.id}/records`).send(input).expect(201)
    await owner.post(`/api/farms/${mine.id}/records/${input.id}/sign`).send({ password: PASSWORD }).expect(200)
    const attempts = [
      "UPDATE application_records SET state = 'draft', season = NULL, number = NULL, seq = NULL, digest = NULL, signed_at = NULL, signed_by_id = NULL",
      "UPDATE application_records SET content = '{}'",
      "UPDATE application_records SET digest = repeat('0', 64)",
      'UPDATE farm_heads SET last_seq = 0',
    ]
    for (const attempt of attempts) {
      const change = house.services.database.inFarm({ farmId: mine.id, seasons: null }, (manager) => manager.query(`${attempt} WHERE farm_id = $1`, [mine.id]))
      await expect(change).rejects.toMatchObject({ code: '42501' })
    }
  })
})

describe('another farm', () => {
  it('answers like what does not exist, save the request id', async () => {
    const manager = await house.as(mine.accounts.manager)
    const foreign = await manager.get(`/api/farms/${theirs.id}/blocks/${theirThings.blockId}`)
    const unknown = await manager.get('/api/farms/00000000-0000-7000-8000-000000000000/blocks/00000000-0000-7000-8000-000000000000')
    expect(foreign.status).toBe(404)
    expect({ ...foreign.body, requestId: '' }).toEqual({ ...unknown.body, requestId: '' })
  })

  it('lends no block, material or lot to a record', async () => {
    const manager = await house.as(mine.accounts.manager)
    const response = await manager.post(`/api/farms/${mine.id}/records`).send(buildRecord(theirThings))
    expect(response.status).toBe(422)
    expect(response.body.errors.map(({ code }: { code: string }) => code)).toEqual(['block.unknown', 'material.unknown', 'lot.unknown'])
  })

  it('may hold a thing under the same id without anybody learning of it', async () => {
    const manager = await house.as(mine.accounts.manager)
    const input = buildRecord({ ...things, id: '01900000-0000-7000-8000-00000000aaaa' })
    const other = await house.as(theirs.accounts.manager)
    expect((await other.post(`/api/farms/${theirs.id}/records`).send(buildRecord({ ...theirThings, id: input.id }))).status).toBe(201)
    expect((await manager.post(`/api/farms/${mine.id}/records`).send(input)).status).toBe(201)
  })
})

describe('a certifier', () => {
  it('reads signed records of granted seasons and nothing unsigned, and is out the day after the end', async () => {
    const farm = await house.makeFarm({ seasons: [2026], endsOn: '2026-06-30' })
    const seeded = await seedThings(house, farm)
    const owner = await house.as(farm.accounts.owner)
    const signed = buildRecord(seeded)
    const older = buildRecord({ ...seeded, startedAt: '2026-02-20T13:00:00Z', endedAt: '2026-02-20T14:00:00Z' })
    for (const input of [signed, older]) {
      await owner.post(`/api/farms/${farm.id}/records`).send(input).expect(201)
      await owner.post(`/api/farms/${farm.id}/records/${input.id}/sign`)
        .send({ password: PASSWORD, acknowledged: [{ code: 'record.late', reason: 'Found in the notebook.' }] }).expect(200)
    }
    const draft = buildRecord(seeded)
    await owner.post(`/api/farms/${farm.id}/records`).send(draft).expect(201)
    const certifier = await house.as(farm.accounts.certifier)
    const list = await certifier.get(`/api/farms/${farm.id}/records`)
    expect(list.body.items.map(({ id }: { id: string }) => id)).toEqual([signed.id])
    for (const id of [older.id, draft.id]) {
      expect((await certifier.get(`/api/farms/${farm.id}/records/${id}`)).status).toBe(404)
      expect((await certifier.get(`/api/farms/${farm.id}/records/${id}/pdf`)).status).toBe(404)
      expect((await certifier.get(`/api/farms/${farm.id}/records/${id}/versions`)).status).toBe(404)
    }
    house.setNow('2026-07-01T07:30:00Z')
    const late = await (await house.as(farm.accounts.certifier)).get(`/api/farms/${farm.id}/records`)
    house.setNow('2026-06-16T14:00:00Z')
    expect(late.status).toBe(404)
  })

  it('sees the blocks, lots and ledgers that stand in granted records, and no others', async () => {
    const farm = await house.makeFarm({ seasons: [2026] })
    const used = await seedThings(house, farm)
    const owner = await house.as(farm.accounts.owner)
    const make = async (kind: string, body: { id: string }) => {
      await owner.post(`/api/farms/${farm.id}/${kind}`).send(body).expect(201)
      return body.id
    }
    const olderBlock = await make('blocks', buildBlock({ code: 'OLD', geometry: squareAt(2) }))
    const olderLot = await make('lots', buildLot({ materialId: used.materialId, code: 'OLD' }))
    await make('blocks', buildBlock({ code: 'NEVER', geometry: squareAt(4) }))
    await make('lots', buildLot({ materialId: used.materialId, code: 'NEVER' }))
    const draftedBlock = await make('blocks', buildBlock({ code: 'DRAFT', geometry: squareAt(6) }))
    await make('records', buildRecord({ ...used, blockId: draftedBlock }))
    const older = { ...used, blockId: olderBlock, lotId: olderLot, startedAt: '2026-02-20T13:00:00Z', endedAt: '2026-02-20T14:00:00Z' }
    for (const input of [buildRecord(used), buildRecord(older)]) {
      await make('records', input)
      await owner.post(`/api/farms/${farm.id}/records/${input.id}/sign`)
        .send({ password: PASSWORD, acknowledged: [{ code: 'record.late', reason: 'Found in the notebook.' }] }).expect(200)
    }
    const certifier = await house.as(farm.accounts.certifier)
    const codesOf = async (kind: string) => (await certifier.get(`/api/farms/${farm.id}/${kind}`).expect(200)).body.items.map(({ id }: { id: string }) => id)
    expect(await codesOf('blocks')).toEqual([used.blockId])
    expect(await codesOf('lots')).toEqual([used.lotId])
    expect(await codesOf('materials')).toEqual([used.materialId])
    expect((await certifier.get(`/api/farms/${farm.id}/blocks/${olderBlock}`)).status).toBe(404)
    const [ledger, counters] = await house.services.database.inFarm({ farmId: farm.id, seasons: [2026] }, async (manager) => [
      await manager.find(LotEntry, { select: { lotId: true } }),
      await manager.find(SeasonCounter, { select: { season: true } }),
    ] as const)
    expect([...new Set(ledger.map(({ lotId }) => lotId))]).toEqual([used.lotId])
    expect(counters.map(({ season }) => season)).toEqual([2026])
    const all = await owner.get(`/api/farms/${farm.id}/blocks`).expect(200)
    expect(all.body.items).toHaveLength(4)
  })
})

describe('a role that ended after its request was let in', () => {
  const change = (farm: TestFarm, sql: string) =>
    house.services.database.inFarm({ farmId: farm.id, seasons: null }, (manager) => manager.query(`UPDATE people SET ${sql} WHERE id = $1`, [farm.personIds.manager]))

  it.each([
    { what: 'the person is out', sql: 'active = false', refusal: 'not-found' },
    { what: 'the role is another', sql: "role = 'applicator'", refusal: 'forbidden' },
  ])('finishes nothing: $what', async ({ sql, refusal }) => {
    const farm = await house.makeFarm()
    const actor = await farm.actor('manager')
    await change(farm, sql)
    const input = { ...buildBlock(), crop: null, acknowledged: [] }
    await expect(createBlock(house.services, actor, input)).rejects.toMatchObject({ refusal })
    const blocks = await house.services.database.inFarm({ farmId: farm.id, seasons: null }, (manager) => manager.count(Block))
    expect(blocks).toBe(0)
  })

  it('finishes nothing: the account is closed', async () => {
    const farm = await house.makeFarm()
    const actor = await farm.actor('manager')
    await house.services.database.inHouse((manager) => manager.query('UPDATE accounts SET deactivated_at = now() WHERE id = $1', [actor.accountId]))
    await expect(createMaterial(house.services, actor, buildMaterial())).rejects.toMatchObject({ refusal: 'not-found' })
  })

  it('waits where the deed came first', async () => {
    const farm = await house.makeFarm()
    const actor = await farm.actor('manager')
    await house.services.database.inFarm(actor, async (manager) => {
      await appendJournal(house.services, manager, actor, { action: 'farm.created', subjectId: farm.id })
      const ending = house.services.database.inFarm({ farmId: farm.id, seasons: null }, async (other) => {
        await other.query("SET LOCAL lock_timeout = '200ms'")
        await other.query('UPDATE people SET active = false WHERE id = $1', [farm.personIds.manager])
      })
      await expect(ending).rejects.toMatchObject({ code: '55P03' })
    })
    await change(farm, 'active = false')
    expect(await house.services.database.listAccess(actor.accountId, new Date())).toEqual([])
  })
})
