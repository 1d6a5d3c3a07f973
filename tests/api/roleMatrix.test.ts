import { readFileSync } from 'node:fs'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { buildBlock, buildGround, buildLot, buildMaterial, buildRecord, buildSite, squareAt } from '../../server/demo/buildThings.ts'
import type { Route } from '../../server/routes/defineRoute.ts'
import { ROUTES } from '../../server/routes/routes.ts'
import { createGround } from '../../server/services/ground/groundFeatures.ts'
import { createSite } from '../../server/services/ground/sites.ts'
import { buildPicture } from '../support/buildFiles.ts'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'

const UNKNOWN = '00000000-0000-7000-8000-000000000000'
const ACTORS = ['nobody', 'owner', 'manager', 'applicator', 'certifier', 'outsider', 'expired'] as const
type Actor = (typeof ACTORS)[number]

interface World {
  farm: TestFarm
  things: SeededThings
  recordId: string
  fileId: string
  siteId: string
  groundId: string
  otherBlockId: string
  plantingId: string
  bedId: string
  eventId: string
  invitationId: string
  letterId: string
  planId: string
  jobId: string
  /** Somebody with a PIN. */
  personId: string
  phoneId: string
  sprayerId: string
  calibrationId: string
  certificateId: string
  grantId: string
  paperId: string
}

const MEASURED = { on: '2026-06-15', doneBy: 'Ada Rook', measured: { kind: 'plot', volumeL: '1', areaM2: '20' } }
const CERTIFICATE = { number: 'C-17', body: 'Thornfield Review', validFrom: '2026-02-01' }
const PICTURE = await buildPicture('png')

let house: TestHouse
let mine: World
let neighbour: World
let agents: Record<Exclude<Actor, 'nobody'>, Agent>
/** A filter that each actor keeps on the first farm. */
let filterIds: Partial<Record<Actor, string>>

beforeAll(async () => {
  house = await openHouse()
  mine = await makeWorld()
  neighbour = await makeWorld()
  const ended = await house.makeFarm({ endsOn: '2026-06-01' })
  agents = {
    owner: await house.as(mine.farm.accounts.owner),
    manager: await house.as(mine.farm.accounts.manager),
    applicator: await house.as(mine.farm.accounts.applicator),
    certifier: await house.as(mine.farm.accounts.certifier),
    outsider: await house.as(neighbour.farm.accounts.owner),
    expired: await house.as(ended.accounts.certifier),
  }
  filterIds = {}
  for (const actor of ['owner', 'manager', 'applicator', 'certifier'] as const) {
    const id = uuidV7()
    await agents[actor].post(`/api/farms/${mine.farm.id}/saved-filters`).send({ id, name: 'Kept', query: {} }).expect(201)
    filterIds[actor] = id
  }
})
afterAll(() => house.close())

async function makeWorld(): Promise<World> {
  const farm = await house.makeFarm()
  const things = await seedThings(house, farm)
  const applicator = await house.as(farm.accounts.applicator)
  const input = buildRecord(things)
  await applicator.post(`/api/farms/${farm.id}/records`).send(input).expect(201)
  const fileId = uuidV7()
  await applicator.post(`/api/farms/${farm.id}/records/${input.id}/files`).field({ id: fileId, kind: 'photo' }).attach('file', PICTURE, 'a.png').expect(201)
  await applicator.post(`/api/farms/${farm.id}/records/${input.id}/sign`).send({ password: PASSWORD }).expect(200)
  const ownerActor = await farm.actor('owner')
  const { site } = await createSite(house.services, ownerActor, buildSite())
  const { feature } = await createGround(house.services, ownerActor, buildGround())
  const owner = await house.as(farm.accounts.owner)
  const ids = { otherBlockId: uuidV7(), plantingId: uuidV7(), bedId: uuidV7(), eventId: uuidV7(), planId: uuidV7(), sprayerId: uuidV7(), calibrationId: uuidV7(), certificateId: uuidV7(), personId: uuidV7(), phoneId: uuidV7(), paperId: uuidV7() }
  await owner.post(`/api/farms/${farm.id}/blocks`).send(buildBlock({ id: ids.otherBlockId, code: 'B2', geometry: squareAt(1) })).expect(201)
  await owner.post(`/api/farms/${farm.id}/plantings`).send({ id: ids.plantingId, blockId: things.blockId, crop: 'Apple' }).expect(201)
  await owner.post(`/api/farms/${farm.id}/beds`).send({ id: ids.bedId, blockId: things.blockId, kind: 'row', fromNumber: 1, toNumber: 4, count: 4 }).expect(201)
  await applicator.post(`/api/farms/${farm.id}/farm-events`).send({ id: ids.eventId, kind: 'mown', blockIds: [things.blockId], on: '2026-06-15' }).expect(201)
  await owner.post(`/api/farms/${farm.id}/sprayers`).send({ id: ids.sprayerId, code: 'M1', name: 'Mister', tankL: '400' }).expect(201)
  await applicator.post(`/api/farms/${farm.id}/calibrations`).send({ id: ids.calibrationId, sprayerId: ids.sprayerId, ...MEASURED }).expect(201)
  await owner.post(`/api/farms/${farm.id}/certificates`).send({ id: ids.certificateId, ...CERTIFICATE }).expect(201)
  const step = buildStep(things)
  await owner.post(`/api/farms/${farm.id}/season-plans`).send({ id: ids.planId, name: 'Rounds', steps: [step] }).expect(201)
  await owner.post(`/api/farms/${farm.id}/people`).send({ id: ids.personId, name: 'Wick Ansel', pin: '481902', password: PASSWORD }).expect(201)
  await owner.post(`/api/farms/${farm.id}/shared-phones`).send({ id: ids.phoneId, name: 'Barn phone', password: PASSWORD }).expect(201)
  await owner.post(`/api/farms/${farm.id}/person-papers`).send({ id: ids.paperId, personId: ids.personId, kind: 'licence', title: 'Licence' }).expect(201)
  const { body: grants } = await owner.get(`/api/farms/${farm.id}/grants`).expect(200)
  const invitationId = uuidV7()
  await owner.post(`/api/farms/${farm.id}/invitations`).send({ id: invitationId, email: `asked-${invitationId}@farm.example`, role: 'applicator', language: 'en' }).expect(201)
  const { body: letters } = await owner.get(`/api/farms/${farm.id}/letters`).expect(200)
  return { farm, things, invitationId, letterId: (letters as { items: { id: string }[] }).items[0]?.id ?? '', grantId: grants.items[0].id, jobId: `${step.id}.${things.blockId}.2`, recordId: input.id, fileId, siteId: site.id, groundId: feature.id, ...ids }
}

const buildStep = ({ materialId, blockId }: SeededThings) => ({
  id: uuidV7(), method: 'drench', materialId, basis: { kind: 'ratio', parts: '20' }, blockIds: [blockId], everyDays: 14, firstOn: '2026-07-01', lastOn: '2026-08-31',
})

/** A body that the route takes, made anew for each call, so that only rights can refuse it. */
function bodyFor(route: Route, world: World, place: number): object | undefined {
  const { things } = world
  const tag = uuidV7().slice(-8)
  const bodies: Record<string, () => object> = {
    'post /farms/:farmId/blocks': () => buildBlock({ code: tag, geometry: squareAt(place) }),
    'post /farms/:farmId/blocks/import': () => ({ blocks: [buildBlock({ code: tag, geometry: squareAt(place) })] }),
    'post /farms/:farmId/sites': () => buildSite(),
    'patch /farms/:farmId/sites/:id': () => ({ revision: 1, keepClearM: '25' }),
    'post /farms/:farmId/ground': () => buildGround(),
    'patch /farms/:farmId/ground/:id': () => ({ revision: 1, name: tag }),
    // Over a revision that nobody saw: rights alone are asked here, and the block stands for the routes that come after.
    'patch /farms/:farmId/blocks/:id': () => ({ revision: 9, name: tag }),
    'put /farms/:farmId/blocks/:id/land': () => ({ revision: 9, status: 'certified' }),
    'post /farms/:farmId/blocks/:id/split': () => ({ revision: 9, parts: [{ id: uuidV7(), code: `${tag}a`, name: tag, geometry: squareAt(place) }, { id: uuidV7(), code: `${tag}b`, name: tag, geometry: squareAt(place + 0.5) }] }),
    'post /farms/:farmId/blocks/:id/reopen': () => ({ revision: 9 }),
    'post /farms/:farmId/blocks/merge': () => ({ blocks: [{ id: things.blockId, revision: 9 }, { id: world.otherBlockId, revision: 9 }], block: { id: uuidV7(), code: tag, name: tag } }),
    'post /farms/:farmId/plantings': () => ({ id: uuidV7(), blockId: things.blockId, crop: 'Apple' }),
    'patch /farms/:farmId/plantings/:id': () => ({ revision: 1, crop: tag }),
    'post /farms/:farmId/beds': () => ({ id: uuidV7(), blockId: things.blockId, kind: 'bed', name: tag, count: 2 }),
    'patch /farms/:farmId/beds/:id': () => ({ revision: 1, kind: 'bed', name: tag, count: 2 }),
    'post /farms/:farmId/farm-events': () => ({ id: uuidV7(), kind: 'mulched', blockIds: [things.blockId], on: '2026-06-16' }),
    'post /farms/:farmId/farm-events/:id/withdraw': () => ({ reason: 'A slip' }),
    // The owner lets nobody go here: rights alone are asked, and everybody is still there for the routes that come after.
    'post /farms/:farmId/people': () => ({ id: uuidV7(), name: tag, pin: '307461', password: PASSWORD }),
    'patch /farms/:farmId/people/:id': () => ({ revision: 999, name: tag, password: PASSWORD }),
    'put /farms/:farmId/people/:id/pin': () => ({ revision: 999, pin: '307461', password: PASSWORD }),
    'post /farms/:farmId/people/:id/end-sessions': () => ({ password: PASSWORD }),
    'post /farms/:farmId/people/:id/reset-factor': () => ({ password: PASSWORD }),
    'post /farms/:farmId/shared-phones': () => ({ id: uuidV7(), name: tag, password: PASSWORD }),
    'post /farms/:farmId/person-papers': () => ({ id: uuidV7(), personId: world.personId, kind: 'training', title: tag }),
    'put /farms/:farmId/person-papers/:id': () => ({ revision: 999, kind: 'training', title: tag }),
    'post /farms/:farmId/person-papers/:id/files': () => ({ id: uuidV7(), kind: 'photo' }),
    'post /farms/:farmId/blocks/:id/papers': () => ({ id: uuidV7(), kind: 'photo' }),
    'post /farms/:farmId/calibrations/:id/papers': () => ({ id: uuidV7(), kind: 'photo' }),
    'post /farms/:farmId/certificates': () => ({ id: uuidV7(), ...CERTIFICATE }),
    'patch /farms/:farmId/certificates/:id': () => ({ revision: 1, ...CERTIFICATE }),
    'post /farms/:farmId/certificates/:id/withdraw': () => ({ reason: 'A slip' }),
    'post /farms/:farmId/certificates/:id/papers': () => ({ id: uuidV7(), kind: 'photo' }),
    'put /farms/:farmId/second-factor': () => ({ asked: false, password: PASSWORD }),
    'post /farms/:farmId/materials': () => buildMaterial({ name: tag }),
    'post /farms/:farmId/lots': () => buildLot({ materialId: things.materialId, code: tag }),
    'post /farms/:farmId/lots/:id/count': () => ({ id: uuidV7(), revision: 1, left: { value: '90', unit: 'L' }, reason: 'Counted' }),
    'post /farms/:farmId/invitations': () => ({ id: uuidV7(), email: `${tag}@farm.example`, role: 'applicator', language: 'en' }),
    'post /farms/:farmId/invitations/:id/resend': () => ({ revision: 9 }),
    'post /farms/:farmId/invitations/:id/withdraw': () => ({ revision: 9 }),
    'post /farms/:farmId/letters/:id/resend': () => ({ id: uuidV7() }),
    'post /farms/:farmId/sprayers': () => ({ id: uuidV7(), code: tag, name: 'Drencher', tankL: '400' }),
    'patch /farms/:farmId/sprayers/:id': () => ({ revision: 9, name: tag }),
    'post /farms/:farmId/sprayers/:id/retire': () => ({ revision: 9, reason: 'Worn out' }),
    'post /farms/:farmId/calibrations': () => ({ id: uuidV7(), sprayerId: world.sprayerId, ...MEASURED }),
    'post /farms/:farmId/calibrations/:id/withdraw': () => ({ reason: 'A slip' }),
    'patch /farms/:farmId': () => ({ revision: 9, name: tag }),
    'patch /farms/:farmId/start': () => ({ skipped: [] }),
    'post /farms/:farmId/records': () => buildRecord(things),
    'post /farms/:farmId/saved-filters': () => ({ id: uuidV7(), name: tag, query: { method: 'drench', sort: 'number' } }),
    'put /farms/:farmId/records/:id': () => ({ ...buildRecord(things), id: undefined, revision: 1 }),
    'post /farms/:farmId/records/:id/sign': () => ({ password: PASSWORD }),
    'post /farms/:farmId/records/:id/files': () => ({ id: uuidV7(), kind: 'photo' }),
    'post /farms/:farmId/records/sign': () => ({ password: PASSWORD, ids: [world.recordId] }),
    'post /farms/:farmId/records/:id/amend': () => ({ password: PASSWORD, reason: 'A slip', purpose: tag }),
    'post /farms/:farmId/records/:id/withdraw': () => ({ password: PASSWORD, reason: 'Written twice' }),
    'post /farms/:farmId/records/:id/review': () => ({}),
    'post /farms/:farmId/records/:id/discard': () => ({}),
    'post /farms/:farmId/season-plans': () => ({ id: uuidV7(), name: tag, steps: [buildStep(things)] }),
    'put /farms/:farmId/season-plans/:id': () => ({ revision: 9, name: tag, steps: [buildStep(things)] }),
    'post /farms/:farmId/season-plans/:id/end': () => ({ revision: 9, reason: tag }),
    'post /farms/:farmId/season-plans/:id/reopen': () => ({ revision: 9 }),
    'post /farms/:farmId/jobs/:id/move': () => ({ revision: 9, to: '2026-07-15' }),
    'post /farms/:farmId/jobs/:id/skip': () => ({ revision: 9, reason: tag }),
    'post /farms/:farmId/jobs/:id/unskip': () => ({ revision: 9 }),
    'post /farms/:farmId/grants': () => ({ id: uuidV7(), certifierEmail: `${tag}@review.example`, organisation: 'Oaklode Review', seasons: [2026], endsOn: '2026-12-31', password: PASSWORD }),
    // Over a revision that nobody saw, so that the grant stands for the routes that come after.
    'patch /farms/:farmId/grants/:id': () => ({ revision: 9, endsOn: '2026-12-30', password: PASSWORD }),
    'post /farms/:farmId/grants/:id/end': () => ({ revision: 9, password: PASSWORD }),
  }
  const make = bodies[`${route.method} ${route.path}`]
  if (!make && route.body) throw new Error(`The matrix has no body for ${route.method} ${route.path}`)
  return make?.()
}

function addressOf(route: Route, world: World, things: SeededThings | null, actor: Actor): string {
  const ids: [path: string, id: string | undefined][] = [
    ['/saved-filters', filterIds[actor]], ['/sites', world.siteId], ['/ground', world.groundId], ['/farms/:farmId/files', world.fileId],
    ['/people', world.personId], ['/shared-phones', world.phoneId], ['/person-papers', world.paperId],
    ['/plantings', world.plantingId], ['/beds', world.bedId], ['/farm-events', world.eventId], ['/sprayers', world.sprayerId], ['/calibrations', world.calibrationId], ['/certificates', world.certificateId], ['/season-plans', world.planId], ['/jobs', world.jobId], ['/invitations', world.invitationId], ['/letters', world.letterId], ['/blocks', things?.blockId], ['/lots', things?.lotId], ['/grants', world.grantId],
  ]
  const found = ids.find(([path]) => route.path.includes(path))
  const unknown = route.path.includes('/jobs/') ? `${UNKNOWN}.${UNKNOWN}.1` : UNKNOWN
  const id = things === null ? unknown : found === undefined ? world.recordId : found[1] ?? UNKNOWN
  return `/api${route.path.replace(':farmId', world.farm.id).replace(':id', id).replace(':season', '2026')}${/season-sheet$|:id\/holds$/.test(route.path) ? '?from=2026-06-01&to=2026-06-30' : ''}`
}

let place = 10

async function call(actor: Actor, route: Route, address: string, body: object | undefined): Promise<{ status: number; body: Record<string, unknown> }> {
  const { default: supertest } = await import('supertest')
  const agent = actor === 'nobody' ? supertest(house.app) : agents[actor]
  const request = agent[route.method](address).set('X-Requested-With', 'drenchleaf')
  if (route.upload) request.field((body ?? {}) as Record<string, string>).attach('file', PICTURE, 'a.png')
  const response = await (body && !route.upload ? request.send(body) : request)
  return { status: response.status, body: response.body as Record<string, unknown> }
}

const farmRoutes = ROUTES.filter((route) => Array.isArray(route.roles))

describe('role × route × own, neighbour, unknown', () => {
  it.each(farmRoutes.flatMap((route) => ACTORS.map((actor) => ({ route, actor, name: `${route.method} ${route.path}` }))))(
    '$name as $actor',
    async ({ route, actor }) => {
      const own = await call(actor, route, addressOf(route, mine, mine.things, actor), bodyFor(route, mine, (place += 1)))
      if (actor === 'nobody') expect(own.status).toBe(401)
      else if (actor === 'outsider' || actor === 'expired') expect(own.status).toBe(404)
      else if (!route.roles.includes(actor)) expect(own.status).toBe(403)
      else expect([200, 201, 204, 409]).toContain(own.status)
      if (actor === 'outsider') return
      const foreign = await call(actor, route, addressOf(route, neighbour, neighbour.things, actor), bodyFor(route, neighbour, (place += 1)))
      expect(foreign.status).toBe(actor === 'nobody' ? 401 : 404)
      expect(JSON.stringify(foreign.body)).not.toContain(neighbour.farm.id)
      if (!route.path.includes(':id')) return
      const unknown = await call(actor, route, addressOf(route, mine, null, actor), bodyFor(route, mine, (place += 1)))
      expect(unknown.status).toBe(actor === 'nobody' ? 401 : own.status === 403 ? 403 : 404)
      if (foreign.status === 404 && unknown.status === 404) {
        expect({ ...foreign.body, requestId: '' }).toEqual({ ...unknown.body, requestId: '' })
      }
    },
  )
})

describe('routes outside a farm', () => {
  it.each(ROUTES.filter((route) => route.roles === 'account').map((route) => ({ route, name: `${route.method} ${route.path}` })))(
    '$name asks for a session',
    async ({ route }) => {
      const address = `/api${route.path.replace(':z/:x/:y', '1/0/0')}`
      expect((await call('nobody', route, address, route.body ? {} : undefined)).status).toBe(401)
    },
  )

  it('are only these without any session', () => {
    expect(ROUTES.filter((route) => route.roles === 'everybody').map((route) => `${route.method} ${route.path}`)).toEqual([
      'get /health', 'get /config', 'get /check/:code', 'get /welcome/:token', 'post /welcome', 'post /reset', 'get /reset/:token', 'post /reset/password', 'post /session', 'get /shared-phone', 'post /shared-phone/session',
    ])
  })

  it('are all described to the outside', async () => {
    const { default: supertest } = await import('supertest')
    const { body } = await supertest(house.app).get('/api/openapi.json').expect(200)
    const described = Object.entries(body.paths as Record<string, object>).flatMap(([path, methods]) => Object.keys(methods).map((method) => `${method} ${path}`))
    expect(described.sort()).toEqual(ROUTES.map((route) => `${route.method} ${route.path.replace(/:(\w+)/g, '{$1}')}`).sort())
    const page = await supertest(house.app).get('/api/docs').expect(200)
    expect(page.text).toContain('POST /api/farms/{farmId}/records')
  })

  it('leave no other door: every router of the server is made from the list', () => {
    const app = readFileSync('server/app.ts', 'utf8')
    expect([...app.matchAll(/\bapi\.(get|post|put|patch|delete)\('([^']+)'/g)].map((match) => match[2])).toEqual(['/openapi.json', '/docs', '/docs.css'])
  })
})
