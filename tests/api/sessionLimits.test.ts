import { generate } from 'otplib'
import supertest from 'supertest'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { NOW, openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'

const MINUTE = 60_000
const DAY = 24 * 60 * MINUTE

let house: TestHouse
let farm: TestFarm

beforeAll(async () => { house = await openHouse() })
afterAll(() => house.close())
beforeEach(async () => {
  turnTo(0)
  farm = await house.makeFarm()
})

/** @param ms since the tests' now. */
function turnTo(ms: number): void {
  house.setNow(new Date(Date.parse(NOW) + ms).toISOString())
}
const statusAt = async (agent: Agent, ms: number): Promise<number> => {
  turnTo(ms)
  return (await agent.get('/api/session')).status
}
async function setUpFactor(agent: Agent): Promise<void> {
  const { body } = await agent.post('/api/me/second-factor').send({ password: PASSWORD }).expect(200)
  const code = await generate({ secret: body.secret as string, epoch: Math.floor(house.services.clock.now().getTime() / 1000) })
  await agent.put('/api/me/second-factor').send({ code }).expect(200)
}
const askFactor = (asked: boolean): Promise<unknown> => house.services.database.inFarm({ farmId: farm.id, seasons: null }, (manager) =>
  manager.query('UPDATE farms SET asks_second_factor = $1', [asked]))

describe('a session (7.3.1, 7.3.2)', () => {
  it('ends after thirty days, though it is used each week', async () => {
    const agent = await house.as(farm.accounts.applicator)
    for (const days of [7, 14, 21, 28]) expect(await statusAt(agent, days * DAY)).toBe(200)
    expect(await statusAt(agent, 30 * DAY - MINUTE)).toBe(200)
    expect(await statusAt(agent, 30 * DAY)).toBe(401)
  })

  it('ends after fourteen days without use, and does not stand again', async () => {
    const agent = await house.as(farm.accounts.owner)
    expect(await statusAt(agent, 14 * DAY - MINUTE)).toBe(200)
    expect(await statusAt(agent, 28 * DAY)).toBe(401)
    expect(await statusAt(agent, 28 * DAY - 2 * MINUTE)).toBe(401)
  })
})

describe('a session of whoever has a second factor', () => {
  it('ends after an hour without use', async () => {
    const agent = await house.as(farm.accounts.manager)
    await setUpFactor(agent)
    expect(await statusAt(agent, 59 * MINUTE)).toBe(200)
    expect(await statusAt(agent, 118 * MINUTE)).toBe(200)
    expect(await statusAt(agent, 178 * MINUTE)).toBe(401)
  })

  it('ends a day after it was opened, though it is used all the time', async () => {
    const agent = await house.as(farm.accounts.manager)
    await setUpFactor(agent)
    for (let minutes = 50; minutes < 24 * 60; minutes += 50) expect(await statusAt(agent, minutes * MINUTE)).toBe(200)
    expect(await statusAt(agent, DAY)).toBe(401)
  })

  it('goes on where the factor is set up in the third week of a session, and is told when it ends', async () => {
    const agent = await house.as(farm.accounts.manager)
    expect(await statusAt(agent, 13 * DAY)).toBe(200)
    expect(await statusAt(agent, 20 * DAY)).toBe(200)
    await setUpFactor(agent)
    expect(await statusAt(agent, 20 * DAY + 30 * MINUTE)).toBe(200)
    const { body } = await agent.get('/api/me/sessions').expect(200)
    expect(body.items).toMatchObject([{ isThis: true, endsAt: new Date(Date.parse(NOW) + 20 * DAY + 90 * MINUTE).toISOString() }])
  })
})

describe('a farm that asks a second factor', () => {
  it('shortens the sessions of who leads or certifies it, and not of who sprays', async () => {
    const [owner, certifier, worker] = [await house.as(farm.accounts.owner), await house.as(farm.accounts.certifier), await house.as(farm.accounts.applicator)]
    await askFactor(true)
    expect(await statusAt(worker, 61 * MINUTE)).toBe(200)
    expect(await statusAt(owner, 61 * MINUTE)).toBe(401)
    expect(await statusAt(certifier, 61 * MINUTE)).toBe(401)
  })

  it('brings no ended session back by asking none any more', async () => {
    const owner = await house.as(farm.accounts.owner)
    await askFactor(true)
    expect(await statusAt(owner, 61 * MINUTE)).toBe(401)
    await askFactor(false)
    expect(await statusAt(owner, 61 * MINUTE)).toBe(401)
  })

  it('shows no ended session in the list', async () => {
    await house.as(farm.accounts.owner)
    await askFactor(true)
    turnTo(61 * MINUTE)
    const owner = await house.as(farm.accounts.owner)
    expect((await owner.get('/api/me/sessions').expect(200)).body.items).toHaveLength(1)
  })
})

it('draws a session’s id anew each time, of at least 128 bits (7.2.2)', async () => {
  const ids = await Promise.all([1, 2, 3].map(async () => {
    const answer = await supertest(house.app).post('/api/session').set('X-Requested-With', 'drenchleaf').send({ email: farm.accounts.owner.email, password: PASSWORD })
    return /drenchleaf\.sid=s%3A([\w-]+)\./.exec(String(answer.headers['set-cookie']))?.[1] ?? ''
  }))
  expect(new Set(ids).size).toBe(3)
  // Each sign of base64url is six bits.
  for (const id of ids) expect(id.length * 6).toBeGreaterThanOrEqual(128)
})
