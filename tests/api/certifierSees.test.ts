import { afterAll, beforeAll, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { buildGround, buildRecord, buildSite } from '../../server/demo/buildThings.ts'
import { ROUTES } from '../../server/routes/routes.ts'
import { createGround } from '../../server/services/ground/groundFeatures.ts'
import { createSite } from '../../server/services/ground/sites.ts'
import { buildPicture } from '../support/buildFiles.ts'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'

/** No phone or e-mail of anybody, no price, no account, no other farm. The contact that a farm writes on its own cover is not written in this one. */
const ALLOWED = `
  about acknowledged air amount areaHa at band basis bbch beds blockId blockIds blocks by byMethod bytes calibration calibrationDays canonicalText
  caution certificates changes checks clockSkewMinutes code components computed contact content coordinates count counts createdAt crop currentSeason
  deviceAt digest doneBy doneById drawnOn drench dueOn ediblePart endedAt endedBy endedOn enteredBy entry eppo expiresOn farm figure files fitting
  flowLPerMin found fromIds fromNumber geometry harvests height home id intoIds isRunning items keepClearM kgPerHa kind known label land late lateHours
  left lengthM licence lines loads lot lotId lots material materialId materialName materials measured measuredIn method name next note notes nozzle
  nozzles number on organicStatus origin params part parts people perimeterM pickFrom place plantedOn plants practice preparations pressureBar
  protection purpose quantity query rateLPerHa reEntryUntil reading reason receivedAt receivedOn record recordId records removedAt removedOn replaces
  report rest rests retired reviews revision rowM rows ruleSets schemaVersion screenMesh season seasonStart seq served shareKg shareL sheets signed
  signedAt signedBy signedVersion signedWith sizedFrom soilContact source speedKmH sprayLPerHa sprayPerEach sprayer sprayerId stage startedAt state
  statusBasis stop swathM taken takenAt tally tankL text times title toNumber totalKg totalL type unit units unknown unsigned uploadedAt uploadedBy used
  value variety verdict version volumeL volumes water waterL weather width widthM withdrawn workedInOn zone
`.trim().split(/\s+/)

let house: TestHouse
let farm: TestFarm
let things: SeededThings
let recordId: string
let certifier: Agent

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  things = await seedThings(house, farm)
  const worker = await house.as(farm.accounts.applicator)
  const owner = await house.as(farm.accounts.owner)
  const post = (path: string, body: object, by = owner) => by.post(`/api/farms/${farm.id}${path}`).send(body).expect(201)
  const actor = await farm.actor('owner')
  await createSite(house.services, actor, buildSite())
  await createGround(house.services, actor, buildGround())
  const sprayerId = uuidV7()
  await post('/sprayers', { id: sprayerId, code: 'M1', name: 'Mister', tankL: '400' })
  await post('/calibrations', { id: uuidV7(), sprayerId, on: '2026-06-15', doneBy: 'Ada Rook', measured: { kind: 'plot', volumeL: '1', areaM2: '20' } })
  await post('/plantings', { id: uuidV7(), blockId: things.blockId, crop: 'Apple' })
  await post('/beds', { id: uuidV7(), blockId: things.blockId, kind: 'row', fromNumber: 1, toNumber: 4, count: 4 })
  await post('/farm-events', { id: uuidV7(), kind: 'mown', blockIds: [things.blockId], on: '2026-06-15' })
  const record = buildRecord(things)
  recordId = record.id
  await post('/records', record, worker)
  await worker.post(`/api/farms/${farm.id}/records/${recordId}/files`).field({ id: uuidV7(), kind: 'photo' }).attach('file', await buildPicture('png'), 'a.png').expect(201)
  await worker.post(`/api/farms/${farm.id}/records/${recordId}/sign`).send({ password: PASSWORD }).expect(200)
  certifier = await house.as(farm.accounts.certifier)
  await certifier.post(`/api/farms/${farm.id}/saved-filters`).send({ id: uuidV7(), name: 'Kept', query: {} }).expect(201)
})
afterAll(() => house.close())

/** The names of all fields of an answer; codes and ids that stand as keys of a map are no names. */
function namesIn(value: unknown, found = new Set<string>()): Set<string> {
  if (Array.isArray(value)) for (const each of value) namesIn(each, found)
  else if (typeof value === 'object' && value !== null) {
    for (const [name, each] of Object.entries(value)) {
      if (!/[\d-]/.test(name)) found.add(name)
      namesIn(each, found)
    }
  }
  return found
}

it('8.2.3: reads on a granted farm these fields and no others: a new one is put here by whoever means a certifier to see it', async () => {
  const routes = ROUTES.filter(({ method, roles, contentType }) => method === 'get' && roles.includes('certifier') && contentType === undefined)
  const names = new Set<string>()
  for (const { path } of routes) {
    const id = path.includes('/records/') ? recordId : path.includes('/blocks/') ? things.blockId : ''
    const days = path.endsWith('/:id/holds') ? '?from=2026-06-01&to=2026-06-30' : ''
    const answer = await certifier.get(`/api${path.replace(':farmId', farm.id).replace(':id', id).replace(':season', '2026')}${days}`)
    expect(answer.status, path).toBe(200)
    namesIn(answer.body, names)
    // Neither of other farms nor of people's accounts.
    for (const { email } of Object.values(farm.accounts)) expect(`${path} ${answer.text}`).not.toContain(email)
  }
  expect(routes.length).toBeGreaterThan(15)
  expect([...names].sort()).toEqual(ALLOWED)
})
