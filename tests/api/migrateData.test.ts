import { v7 as uuidV7 } from 'uuid'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { createOwnerSource } from '../../server/database/dataSource.ts'
import { prepareDatabase } from '../../server/database/prepareDatabase.ts'
import { buildRecord } from '../../server/demo/buildThings.ts'
import { openHouse, PASSWORD, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings } from '../support/seedThings.ts'

let house: TestHouse
const farms: TestFarm[] = []
beforeAll(async () => {
  house = await openHouse()
  for (let made = 0; made < 2; made += 1) farms.push(await house.makeFarm())
})
afterAll(() => house.close())

/** Takes migrations back until this one is undone, and runs all of them again. */
async function backAndForth(name: string): Promise<void> {
  const source = await createOwnerSource(house.ownerUrl).initialize()
  const names = source.migrations.map((migration) => migration.name ?? migration.constructor.name)
  const at = names.findIndex((each) => each.includes(name))
  expect(at, names.join(', ')).toBeGreaterThan(0)
  for (let undone = names.length; undone > at; undone -= 1) await source.undoLastMigration()
  await source.destroy()
  await prepareDatabase(house.ownerUrl, 'drenchleaf_app')
}

const rowsOf = (farm: TestFarm, sql: string): Promise<unknown[]> => house.services.database.inFarm({ farmId: farm.id, seasons: null }, (manager) => manager.query(sql))
const certificatesOf = (farm: TestFarm): Promise<unknown[]> => rowsOf(farm, 'SELECT number, body, scope, valid_from::text, valid_until::text FROM certificates')
const heldDaysOf = (farm: TestFarm): Promise<unknown[]> => rowsOf(farm, 'SELECT record_id, held_to::text FROM record_lines')

const countedOf = (farm: TestFarm): Promise<unknown[]> => rowsOf(farm, `SELECT r.id, round((r.register_row->>'totalL')::numeric, 6)::text AS litres, round(e.total_l, 6)::text AS counted,
  round((r.register_row->>'sprayLPerHa')::numeric, 6)::text AS rate, r.register_row->>'totalKg' AS kg, r.register_row->'sprayPerEach' AS each
  FROM application_records r JOIN register_entries e ON e.farm_id = r.farm_id AND e.record_id = r.id ORDER BY r.id`)

// The owner of the tables is bound by the policies too: a migration that forgets so moves nothing, and says nothing.
it('moves each farm’s certificate into rows, and back', async () => {
  for (const [index, farm] of farms.entries()) {
    const owner = await house.as(farm.accounts.owner)
    await owner.post(`/api/farms/${farm.id}/certificates`).send({ id: uuidV7(), number: `C-${index}`, body: 'Thornfield Review', scope: null, validFrom: '2026-02-01', validUntil: '2027-01-31' }).expect(201)
  }
  const before = await Promise.all(farms.map(certificatesOf))
  expect(before.map((rows) => rows.length)).toEqual([1, 1])
  await backAndForth('KeepCertificates')
  expect(await Promise.all(farms.map(certificatesOf))).toEqual(before)
})

it('finds the days on which each farm’s signed records hold their blocks', async () => {
  for (const farm of farms) {
    house.setNow('2026-06-16T14:00:00Z')
    const things = await seedThings(house, farm, {
      material: { label: { maxRate: null, minStrengthPct: null, maxStrengthPct: null, reEntryHours: '36', preHarvestDays: 6, source: 'label, part 2' } },
    })
    const owner = await house.as(farm.accounts.owner)
    const record = buildRecord({ ...things, startedAt: '2026-06-14T13:00:00Z', endedAt: '2026-06-14T13:40:00Z' })
    await owner.post(`/api/farms/${farm.id}/records`).send(record).expect(201)
    await owner.post(`/api/farms/${farm.id}/records/${record.id}/sign`).send({ password: PASSWORD }).expect(200)
  }
  const before = await Promise.all(farms.map(heldDaysOf))
  expect(before).toMatchObject([[{ held_to: '2026-06-19' }], [{ held_to: '2026-06-19' }]])
  await backAndForth('FindHolds')
  expect(await Promise.all(farms.map(heldDaysOf))).toEqual(before)
})

it('counts in each farm’s register what went on the land', async () => {
  const own = [await house.makeFarm(), await house.makeFarm()]
  for (const farm of own) {
    const things = await seedThings(house, farm)
    const owner = await house.as(farm.accounts.owner)
    // 420 L are mixed of 400 L of water and 20 L; of the second 52 US gallons went on the land.
    for (const amount of [null, { value: '52', unit: 'galUS', known: 'measured' }]) {
      const record = buildRecord({ ...things, startedAt: '2026-06-15T13:00:00Z', endedAt: '2026-06-15T13:40:00Z' })
      await owner.post(`/api/farms/${farm.id}/records`).send({ ...record, lines: record.lines.map((line) => ({ ...line, amount })) }).expect(201)
      await owner.post(`/api/farms/${farm.id}/records/${record.id}/sign`).send({ password: PASSWORD }).expect(200)
    }
  }
  const before = await Promise.all(own.map(countedOf))
  expect(before[0]).toContainEqual(expect.objectContaining({ litres: '420.000000', counted: '420.000000' }))
  // 52 × 3.785411784 L (NIST Handbook 44, appendix C)
  expect(before[0]).toContainEqual(expect.objectContaining({ litres: '196.841413', counted: '196.841413' }))
  await backAndForth('CountOnLand')
  expect(await Promise.all(own.map(countedOf))).toEqual(before)
})
