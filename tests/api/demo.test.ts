import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { seedDemo } from '../../server/demo/seedDemo.ts'
import { openHouse, type TestHouse } from '../support/openHouse.ts'

/** Evening at the farm while it is tomorrow in UTC, and the night the clocks go forward. */
const HOURS = ['2026-06-17T02:00:00.000Z', '2026-03-08T10:30:00.000Z']

describe.each(HOURS)('the demo farm made at %s', (instant) => {
  let house: TestHouse

  beforeAll(async () => {
    house = await openHouse()
    house.setNow(instant)
  })
  afterAll(() => house.close())

  it('is whole, and found again instead of made twice', async () => {
    const made = await seedDemo(house.services, 'a demo password')
    expect(await seedDemo(house.services, 'a demo password')).toEqual(made)
    const count = (table: string): Promise<{ count: string }[]> =>
      house.services.database.inFarm({ farmId: made.farmId, seasons: null }, (manager) => manager.query(`SELECT count(*) FROM ${table}`))
    expect(await count('blocks')).toEqual([{ count: '24' }])
    expect(await count("sites WHERE keep_clear_m > 0")).toEqual([{ count: '5' }])
    expect(await count('ground_features')).toEqual([{ count: '12' }])
    const [records] = await count("application_records WHERE state = 'signed'")
    expect(Number(records?.count)).toBeGreaterThan(60)
    const [begun] = await count("application_records WHERE state = 'started'")
    expect(begun?.count).toBe('1')
    const [stopped] = await count("application_records WHERE acknowledged <> '[]'")
    expect(Number(stopped?.count)).toBeGreaterThan(0)
    expect(await count("application_records WHERE state = 'withdrawn'")).toEqual([{ count: '1' }])
    expect(await count("record_versions WHERE entry = 'amended'")).toEqual([{ count: '1' }])
    const [reviews] = await count('record_reviews')
    expect(Number(reviews?.count)).toBeGreaterThan(20)
    const neighbours = await house.services.database.inFarm({ farmId: made.neighbourFarmId, seasons: null }, (manager) =>
      manager.query("SELECT count(*) FROM application_records WHERE state = 'signed'"))
    expect(neighbours).toEqual([{ count: '1' }])
    const files = await house.services.database.inFarm({ farmId: made.farmId, seasons: null }, (manager) =>
      manager.query('SELECT kind, signed_version FROM attachments ORDER BY uploaded_at, id'))
    expect(files).toEqual([
      { kind: 'photo', signed_version: 1 }, { kind: 'paper', signed_version: 1 }, { kind: 'photo', signed_version: null }, { kind: 'photo', signed_version: null },
    ])
    const theirs = await house.services.database.inFarm({ farmId: made.neighbourFarmId, seasons: null }, (manager) => manager.query('SELECT label FROM attachments'))
    expect(theirs).toEqual([{ label: 'Delivery note.pdf' }])
  }, 180_000)
})
