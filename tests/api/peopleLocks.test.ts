import pg from 'pg'
import type supertest from 'supertest'
import { v7 as uuidV7 } from 'uuid'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'

let house: TestHouse
let farm: TestFarm
let first: Agent
let second: Agent
let gate: pg.Client
/** Looks from outside: a transaction sees who is connected as at its first look. */
let eye: pg.Client

beforeAll(async () => {
  house = await openHouse()
  gate = new pg.Client({ connectionString: house.ownerUrl })
  eye = new pg.Client({ connectionString: house.ownerUrl })
  await Promise.all([gate.connect(), eye.connect()])
})
afterAll(async () => {
  await Promise.all([gate.end(), eye.end()])
  await house.close()
})
beforeEach(async () => {
  farm = await house.makeFarm()
  first = await house.as(farm.accounts.owner)
  await first.patch(person('manager')).send({ revision: 1, role: 'owner', password: PASSWORD }).expect(200)
  second = await house.as(farm.accounts.manager)
})

const person = (member: 'owner' | 'manager') => `/api/farms/${farm.id}/people/${farm.personIds[member]}`
const statusOf = async (request: supertest.Test): Promise<number> => (await request).status

/** Holds every journal entry back until so many wait, so that the deeds before it are all half done at one moment. */
async function atOneMoment(deeds: (() => Promise<number>)[]): Promise<number[]> {
  await gate.query('BEGIN')
  await gate.query('LOCK TABLE journal IN SHARE ROW EXCLUSIVE MODE')
  const running: Promise<number>[] = []
  try {
    for (const deed of deeds) {
      running.push(deed())
      await expect.poll(countWaiting, { timeout: 10_000 }).toBe(running.length)
    }
  } finally {
    await gate.query('COMMIT')
  }
  return Promise.all(running)
}

async function countWaiting(): Promise<number> {
  const { rows } = await eye.query<{ waiting: number }>(
    `SELECT count(DISTINCT l.pid)::integer AS waiting FROM pg_locks l JOIN pg_stat_activity a ON a.pid = l.pid
      WHERE NOT l.granted AND a.datname = current_database()`)
  return rows[0]?.waiting ?? 0
}

const endRole = (by: Agent, whose: 'owner' | 'manager', revision: number) => () =>
  statusOf(by.patch(person(whose)).send({ revision, role: 'applicator', password: PASSWORD }))

describe('two owners who act at one moment', () => {
  it('end each other’s role: one does, the other is refused, nobody is broken off', async () => {
    expect((await atOneMoment([endRole(first, 'manager', 2), endRole(second, 'owner', 1)])).sort()).toEqual([200, 422])
  })

  it('one writes down a licence of the other, who ends their role', async () => {
    const paper = { id: uuidV7(), personId: farm.personIds.manager, kind: 'licence', title: 'Licence', number: 'A-1', issuedOn: '2026-01-01', expiresOn: '2028-01-01' }
    const deeds = [() => statusOf(first.post(`/api/farms/${farm.id}/person-papers`).send(paper)), endRole(second, 'owner', 1)]
    expect(await atOneMoment(deeds)).toEqual([403, 200])
  })

  it('one changes the farm, and the other ends their role', async () => {
    const { body } = await first.get(`/api/farms/${farm.id}`).expect(200)
    const deeds = [() => statusOf(first.patch(`/api/farms/${farm.id}`).send({ revision: body.revision, name: 'Other Name' })), endRole(second, 'owner', 1)]
    expect(await atOneMoment(deeds)).toEqual([403, 200])
  })

  it('one passes a step of the first hour over, and the other ends their role', async () => {
    const deeds = [() => statusOf(first.patch(`/api/farms/${farm.id}/start`).send({ skipped: ['person'] })), endRole(second, 'owner', 1)]
    expect(await atOneMoment(deeds)).toEqual([403, 200])
  })
})
