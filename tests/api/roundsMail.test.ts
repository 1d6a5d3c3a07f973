import { afterAll, beforeAll, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { mailJobsDue } from '../../server/services/rounds/mailJobsDue.ts'
import { openHouse, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'

let house: TestHouse
let farm: TestFarm
let things: SeededThings

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  things = await seedThings(house, farm)
  const owner = await house.as(farm.accounts.owner)
  const step = { id: uuidV7(), method: 'drench', materialId: things.materialId, basis: { kind: 'ratio', parts: '20' }, blockIds: [things.blockId], everyDays: 14, firstOn: '2026-06-17', lastOn: '2026-07-15', lateDays: 1 }
  await owner.post(`/api/farms/${farm.id}/season-plans`).send({ id: uuidV7(), name: 'Nettle', steps: [step] }).expect(201)
})
afterAll(() => house.close())

const letters = (): Promise<{ to_email: string; params: Record<string, unknown> }[]> =>
  house.services.database.inFarm({ farmId: farm.id, seasons: null }, (tx) => tx.query("SELECT to_email, params FROM letters WHERE kind = 'jobsDue' ORDER BY created_at, to_email"))
const at = async (instant: string): Promise<{ farms: number; letters: number }> => {
  house.setNow(instant)
  return mailJobsDue(house.services)
}

it('tells those who lead of a day once, from five in the morning on the farm, and of no day without a job', async () => {
  // Seven in the morning on the 16th: nothing is due.
  expect(await at('2026-06-16T14:00:00Z')).toEqual({ farms: 0, letters: 0 })
  expect(await at('2026-06-17T11:59:00Z')).toEqual({ farms: 0, letters: 0 })
  expect(await at('2026-06-17T12:00:00Z')).toEqual({ farms: 1, letters: 2 })
  expect((await letters()).map(({ to_email }) => to_email)).toEqual([farm.accounts.manager.email, farm.accounts.owner.email])
  expect((await letters())[0]?.params).toMatchObject({ todayOn: '2026-06-17', dueCount: 1, lateCount: 0, due: [{ preparation: 'Nettle ferment', blocks: 'B1' }], late: [] })
  expect(await at('2026-06-17T12:10:00Z')).toEqual({ farms: 0, letters: 0 })
  expect(await at('2026-06-19T12:00:00Z')).toEqual({ farms: 1, letters: 2 })
  expect((await letters()).at(-1)?.params).toMatchObject({ dueCount: 0, lateCount: 1, late: [{ preparation: 'Nettle ferment', blocks: 'B1' }] })
})

it('writes to nobody who chose on their own page to be left alone, and says in the letter where', async () => {
  const owner = await house.as(farm.accounts.owner)
  const choose = async (jobsByMail: 'on' | 'off') => {
    const { body } = await owner.get('/api/session').expect(200)
    await owner.patch('/api/me').send({ revision: body.user.revision, preferences: { jobsByMail } }).expect(200)
  }
  await choose('off')
  expect(await at('2026-06-21T12:00:00Z')).toEqual({ farms: 1, letters: 1 })
  expect((await letters()).at(-1)?.to_email).toBe(farm.accounts.manager.email)
  const [letter] = (await house.mailTo(farm.accounts.manager.email)).filter(({ subject }) => subject.includes('late'))
  expect(letter?.text).toContain('http://127.0.0.1:4310/me')
  await choose('on')
  expect(await at('2026-06-22T12:00:00Z')).toEqual({ farms: 1, letters: 2 })
  await owner.patch('/api/me').send({ revision: 3, preferences: { jobsByMail: 'sometimes' } }).expect(422)
})

it('tells of a day once, though two processes look at the same time', async () => {
  house.setNow('2026-06-23T13:00:00Z')
  const both = await Promise.all([mailJobsDue(house.services), mailJobsDue(house.services)])
  expect(both.map((counts) => counts.letters).sort()).toEqual([0, 2])
})

it('tells of no farm to practise on', async () => {
  const practise = (practice: boolean) => house.services.database.inFarm({ farmId: farm.id, seasons: null }, (tx) => tx.query('UPDATE farms SET practice = $2 WHERE id = $1', [farm.id, practice]))
  await practise(true)
  expect(await at('2026-06-24T12:00:00Z')).toEqual({ farms: 0, letters: 0 })
  await practise(false)
  expect(await at('2026-06-24T12:00:00Z')).toEqual({ farms: 1, letters: 2 })
})
