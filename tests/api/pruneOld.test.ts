import { v7 as uuidV7 } from 'uuid'
import { afterAll, beforeAll, beforeEach, expect, it } from 'vitest'
import { KEPT_DAYS, pruneOld } from '../../server/services/pruneOld.ts'
import { queueLetter } from '../../server/services/mail/queueLetter.ts'
import { sendDueLetters } from '../../server/services/mail/sendDueLetters.ts'
import { inviteOwner } from '../../server/services/welcome.ts'
import { NOW, openHouse, type TestFarm, type TestHouse } from '../support/openHouse.ts'

const MINUTE = 60_000
const DAY = 24 * 60 * MINUTE

let house: TestHouse
let farm: TestFarm

beforeAll(async () => { house = await openHouse() })
afterAll(() => house.close())
beforeEach(async () => {
  turnTo(0)
  farm = await house.makeFarm()
  await pruneAt(0)
})

function turnTo(ms: number): void {
  house.setNow(new Date(Date.parse(NOW) + ms).toISOString())
}
/** What is taken away so long after the tests' now. */
function pruneAt(ms: number): ReturnType<typeof pruneOld> {
  turnTo(ms)
  return pruneOld(house.services)
}
const write = (farmId: string | null, email: string): Promise<void> => {
  const work = (manager: Parameters<typeof queueLetter>[1]): Promise<void> => queueLetter(house.services, manager, {
    farmId, kind: 'invitation', language: 'en', to: { email, name: null }, params: { farm: 'F', by: 'B', role: 'manager', token: 'a secret of the link', untilOn: '2026-06-19' },
  })
  return farmId === null ? house.services.database.inHouse(work) : house.services.database.inFarm({ farmId, seasons: null }, work)
}
const lettersTo = (email: string): Promise<{ state: string; params: object }[]> =>
  house.services.database.inPost((manager) => manager.query('SELECT state, params FROM letters WHERE to_email = $1', [email]))

it('keeps a letter that is out for ninety days, of a farm and of the house, without the secret it carried', async () => {
  const [ofFarm, ofHouse] = [`a-${uuidV7()}@farm.example`, `b-${uuidV7()}@farm.example`]
  await write(farm.id, ofFarm)
  await write(null, ofHouse)
  await sendDueLetters(house.services)
  for (const email of [ofFarm, ofHouse]) {
    const [letter] = await lettersTo(email)
    expect(letter).toMatchObject({ state: 'sent', params: { farm: 'F' } })
    expect(JSON.stringify(letter)).not.toContain('secret')
  }
  expect(await pruneAt(KEPT_DAYS.letters * DAY - 1)).toMatchObject({ letters: 0 })
  expect(await pruneAt(KEPT_DAYS.letters * DAY)).toMatchObject({ letters: 2 })
  expect(await lettersTo(ofFarm)).toEqual([])
})

it('leaves a letter that still waits, however old', async () => {
  const email = `c-${uuidV7()}@farm.example`
  await write(farm.id, email)
  expect(await pruneAt(KEPT_DAYS.letters * DAY)).toMatchObject({ letters: 0 })
  expect(await lettersTo(email)).toMatchObject([{ state: 'waiting' }])
  await sendDueLetters(house.services)
  expect(await pruneAt(KEPT_DAYS.letters * DAY)).toMatchObject({ letters: 1 })
})

it('keeps nothing of a one-time link a month after it was spent or late', async () => {
  await inviteOwner(house.services, `d-${uuidV7()}@farm.example`)
  const late = 3 * DAY
  expect(await pruneAt(late + KEPT_DAYS.links * DAY - 1)).toMatchObject({ links: 0 })
  expect(await pruneAt(late + KEPT_DAYS.links * DAY)).toMatchObject({ links: 1 })
})

it('keeps no count of asked resets after a day', async () => {
  await house.services.database.inHouse((manager) => manager.query("INSERT INTO reset_asks (email_digest, asked, since) VALUES ('x', 5, $1)", [NOW]))
  expect(await pruneAt(DAY - 1)).toMatchObject({ resetAsks: 0 })
  expect(await pruneAt(DAY)).toMatchObject({ resetAsks: 1 })
})

it('keeps no session that a visit would find ended, and ends none that it would not', async () => {
  const [plain, withFactor] = [await house.as(farm.accounts.applicator), await house.as(farm.accounts.owner)]
  await house.services.database.inHouse((manager) => manager.query("UPDATE accounts SET totp_secret = 'sealed' WHERE id = $1", [farm.accounts.owner.id]))
  expect(await pruneAt(60 * MINUTE - 1)).toMatchObject({ sessions: 0 })
  expect(await pruneAt(60 * MINUTE)).toMatchObject({ sessions: 1 })
  turnTo(0)
  expect((await withFactor.get('/api/session')).status).toBe(401)
  expect((await plain.get('/api/session')).status).toBe(200)
  expect(await pruneAt(14 * DAY - 1)).toMatchObject({ sessions: 0 })
  expect(await pruneAt(14 * DAY)).toMatchObject({ sessions: 1 })
})
