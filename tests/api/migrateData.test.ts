import { v7 as uuidV7 } from 'uuid'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { createOwnerSource } from '../../server/database/dataSource.ts'
import { prepareDatabase } from '../../server/database/prepareDatabase.ts'
import { openHouse, type TestFarm, type TestHouse } from '../support/openHouse.ts'

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

const certificatesOf = (farm: TestFarm): Promise<unknown[]> => house.services.database.inFarm({ farmId: farm.id, seasons: null }, (manager) =>
  manager.query('SELECT number, body, scope, valid_from::text, valid_until::text FROM certificates'))

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
