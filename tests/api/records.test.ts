import { createHash } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { buildBlock, buildLot, buildRecord, squareAt } from '../../server/demo/buildThings.ts'
import { createBlock } from '../../server/services/blocks/createBlock.ts'
import { receiveLot } from '../../server/services/inputs/receiveLot.ts'
import { sealRecord } from '../../server/services/records/sealRecord.ts'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'

let house: TestHouse
let farm: TestFarm
let things: SeededThings
let applicator: Agent
let manager: Agent

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  things = await seedThings(house, farm, { lot: { quantity: { value: '5000', unit: 'L' } } })
  applicator = await house.as(farm.accounts.applicator)
  manager = await house.as(farm.accounts.manager)
})
afterAll(() => house.close())

const address = (rest = '') => `/api/farms/${farm.id}/records${rest}`
const sign = (agent: Agent, id: string, acknowledged: object[] = []) => agent.post(address(`/${id}/sign`)).send({ password: PASSWORD, acknowledged })
async function signed(agent: Agent, changes: object = {}): Promise<{ id: string; body: Record<string, never> }> {
  const input = buildRecord({ ...things, ...changes })
  await agent.post(address()).send(input).expect(201)
  return { id: input.id, body: (await sign(agent, input.id).expect(200)).body }
}

describe('a draft', () => {
  it('may lack what is not known yet', async () => {
    const response = await applicator.post(address()).send({ id: uuidV7(), method: 'foliar', lines: [{ blockId: things.blockId }] })
    expect(response.status).toBe(201)
    expect(response.body).toMatchObject({ state: 'draft', number: null, seq: null, computed: { totalL: null } })
  })

  it('is taken in once, with the same answer to each repeat', async () => {
    const input = buildRecord(things)
    const [one, two] = await Promise.all([applicator.post(address()).send(input), applicator.post(address()).send(input)])
    expect([one.status, two.status].sort()).toEqual([200, 201])
    expect(one.body).toEqual(two.body)
    const other = await applicator.post(address()).send({ ...input, purpose: 'Another' })
    expect(other.status).toBe(422)
    expect(other.body.errors).toMatchObject([{ code: 'idempotency.mismatch' }])
  })

  it('is written anew only over the revision that was read', async () => {
    const input = buildRecord(things)
    await applicator.post(address()).send(input).expect(201)
    const { id, ...content } = input
    const first = await applicator.put(address(`/${id}`)).send({ ...content, purpose: 'First', revision: 1 })
    expect(first.body).toMatchObject({ revision: 2, purpose: 'First' })
    const repeat = await applicator.put(address(`/${id}`)).send({ ...content, purpose: 'First', revision: 1 })
    expect(repeat).toMatchObject({ status: 200, body: { revision: 2 } })
    const late = await manager.put(address(`/${id}`)).send({ ...content, purpose: 'Second', revision: 1 })
    expect(late.status).toBe(409)
    expect(late.body).toMatchObject({ code: 'stale', current: { purpose: 'First', revision: 2 } })
  })

  it.each([
    { name: 'the end before the start', line: { startedAt: '2026-06-16T13:00:00Z', endedAt: '2026-06-16T12:00:00Z' }, path: 'lines.0.endedAt', code: 'time.end_before_start' },
    { name: 'a start in the future', line: { startedAt: '2026-06-16T16:00:00Z' }, path: 'lines.0.startedAt', code: 'time.future' },
    { name: 'thirty hours', line: { startedAt: '2026-06-14T13:00:00Z', endedAt: '2026-06-15T19:00:00Z' }, path: 'lines.0.endedAt', code: 'time.too_long' },
    { name: 'a time without its zone', line: { startedAt: '2026-06-16T13:00:00' }, path: 'lines.0.startedAt', code: 'time.zone_needed' },
    { name: 'the 30th of February', line: { startedAt: '2026-02-30T13:00:00Z' }, path: 'lines.0.startedAt', code: 'time.invalid' },
    { name: 'tomorrow', line: { startedAt: 'tomorrow' }, path: 'lines.0.startedAt', code: 'time.invalid' },
  ])('is refused with $name', async ({ line, path, code }) => {
    const response = await applicator.post(address()).send({ id: uuidV7(), method: 'drench', lines: [{ blockId: things.blockId, ...line }] })
    expect(response.status).toBe(422)
    expect(response.body.errors).toContainEqual(expect.objectContaining({ path, code }))
  })

  it.each(['NaN', '1e400', 'Infinity', '-5', '0', '1,5', '12abc', '', ' ', '0x10', '1e3', '٣', '+5', '1.00005', '9007199254740993', 5, null, true, [5]])(
    'refuses %o litres',
    async (value) => {
      const response = await applicator.post(address()).send({ ...buildRecord(things), water: { sizedFrom: 'water', value, unit: 'L' } })
      expect(response.status).toBe(422)
      expect(response.body.errors[0].path).toBe('water.value')
    },
  )

  it.each([
    { change: { totalAmount: '5' } }, { change: { status: 'signed' } }, { change: { seq: 1 } }, { change: { hash: 'x' } }, { change: { createdBy: 'x' } },
  ])('refuses $change, which the server says', async ({ change }) => {
    const response = await applicator.post(address()).send({ ...buildRecord(things), ...change })
    expect(response.status).toBe(422)
    expect(response.body.errors).toMatchObject([{ code: 'unknown_field' }])
  })

  it('keeps who did the work when somebody else writes it anew', async () => {
    const input = buildRecord(things)
    await applicator.post(address()).send(input).expect(201)
    const { id, ...content } = input
    const mended = await manager.put(address(`/${id}`)).send({ ...content, purpose: 'A slip mended', revision: 1 })
    expect(mended.body).toMatchObject({ purpose: 'A slip mended', doneBy: { id: farm.personIds.applicator } })
  })

  it('takes no mass for what went on a line', async () => {
    const input = buildRecord(things)
    const lines = input.lines.map((line) => ({ ...line, amount: { value: '5', unit: 'kg', known: 'measured' } }))
    expect(await applicator.post(address()).send({ ...input, lines })).toMatchObject({ status: 422, body: { errors: [{ path: 'lines.0.amount.unit' }] } })
  })

  it('records an applicator’s own work only', async () => {
    const response = await applicator.post(address()).send(buildRecord({ ...things, doneById: farm.personIds.owner }))
    expect(response).toMatchObject({ status: 422, body: { errors: [{ path: 'doneById', code: 'person.only_yourself' }] } })
    const byManager = await manager.post(address()).send(buildRecord({ ...things, doneById: farm.personIds.applicator }))
    expect(byManager.body.doneBy.id).toBe(farm.personIds.applicator)
    expect(byManager.body.enteredBy.id).toBe(farm.personIds.manager)
  })
})

describe('signing', () => {
  it('stores the canonical text whose SHA-256 is the digest, with what the record rests on', async () => {
    const { id, body } = await signed(applicator, { purpose: 'Soil life' })
    const versions = await applicator.get(address(`/${id}/versions`)).expect(200)
    const [version] = versions.body.items as [{ canonicalText: string; digest: string; signed: Record<string, unknown> }]
    expect(createHash('sha256').update(version.canonicalText, 'utf8').digest('hex')).toBe(body['digest'])
    expect(version.signed).toMatchObject({
      schemaVersion: 2, content: { purpose: 'Soil life' }, blocks: [{ code: 'B1', version: 1 }], materials: [{ name: 'Nettle ferment' }],
      computed: { waterL: '400', totalL: '420', components: [{ amount: { value: '20', unit: 'L' } }] },
    })
    expect(version.canonicalText).not.toContain(farm.accounts.applicator.email)
    expect(version.canonicalText).not.toContain('applicator ')
  })

  it('says of an amount that nobody wrote that it was worked out', async () => {
    const { body } = await signed(applicator)
    expect(body['lines']).toMatchObject([{ amount: { value: '420', unit: 'L', known: 'workedOut' } }])
  })

  it('refuses a wrong password and loses nothing', async () => {
    const input = buildRecord(things)
    await applicator.post(address()).send(input).expect(201)
    const response = await applicator.post(address(`/${input.id}/sign`)).send({ password: 'wrong' })
    expect(response).toMatchObject({ status: 422, body: { code: 'session.wrong_password' } })
    expect((await applicator.get(address(`/${input.id}`))).body).toMatchObject({ state: 'started', number: null })
  })

  it('answers a second tap with the record it signed', async () => {
    const input = buildRecord(things)
    await applicator.post(address()).send(input).expect(201)
    const [one, two] = await Promise.all([sign(applicator, input.id), sign(applicator, input.id)])
    expect(one.status).toBe(200)
    expect(two.body).toEqual(one.body)
  })

  it('cannot be undone: a signed record takes no writing', async () => {
    const { id } = await signed(applicator)
    const { id: _id, ...content } = buildRecord(things)
    const response = await applicator.put(address(`/${id}`)).send({ ...content, revision: 2 })
    expect(response).toMatchObject({ status: 409, body: { code: 'record.signed' } })
  })

  it('is of the text that the signer saw', async () => {
    const input = buildRecord(things)
    await applicator.post(address()).send(input).expect(201)
    const { id, ...content } = input
    await manager.put(address(`/${id}`)).send({ ...content, purpose: 'Changed meanwhile', revision: 1 }).expect(200)
    const blind = await applicator.post(address(`/${id}/sign`)).send({ password: PASSWORD, revision: 1 })
    expect(blind).toMatchObject({ status: 409, body: { code: 'stale', current: { purpose: 'Changed meanwhile' } } })
    await applicator.post(address(`/${id}/sign`)).send({ password: PASSWORD, revision: 2 }).expect(200)
  })

  it('asks why when more went on the land than the mix makes', async () => {
    const input = buildRecord(things)
    const lines = input.lines.map((line) => ({ ...line, amount: { value: '500', unit: 'L', known: 'measured' } }))
    await applicator.post(address()).send({ ...input, lines }).expect(201)
    expect(await sign(applicator, input.id)).toMatchObject({ status: 422, body: { acknowledgeable: true, errors: [{ code: 'total.inconsistent', params: { applied: 500, total: 420 } }] } })
    const done = await sign(applicator, input.id, [{ code: 'total.inconsistent', reason: 'Topped up with rain' }, { code: 'nonsense', reason: 'Not asked for' }])
    expect(done.body.acknowledged).toEqual([{ code: 'total.inconsistent', reason: 'Topped up with rain' }])
  })

  it('asks for everything that happened', async () => {
    const input = { id: uuidV7(), method: 'foliar', lines: [{ blockId: things.blockId }] }
    await applicator.post(address()).send(input).expect(201)
    const response = await sign(applicator, input.id)
    expect(response.status).toBe(422)
    expect(response.body.errors.map(({ code }: { code: string }) => code)).toEqual(
      ['time.missing_start', 'time.missing_end', 'record.component_missing', 'record.water_missing'])
  })

  it('is for an applicator their own work, for a manager any', async () => {
    const byOwner = buildRecord(things)
    const owner = await house.as(farm.accounts.owner)
    await owner.post(address()).send(byOwner).expect(201)
    expect(await sign(applicator, byOwner.id)).toMatchObject({ status: 403, body: { code: 'record.not_yours' } })
    expect((await sign(manager, byOwner.id)).body.signedBy.id).toBe(farm.personIds.manager)
  })

  it('records what was done with a stop when the reason is given, and carries it', async () => {
    const material = { id: uuidV7(), name: 'Copper wash', kind: 'mineral', measuredIn: 'volume', organicStatus: 'prohibited', statusBasis: 'Letter of 3 May' }
    await manager.post(`/api/farms/${farm.id}/materials`).send(material).expect(201)
    const lot = buildLot({ materialId: material.id, code: 'CW-1' })
    await manager.post(`/api/farms/${farm.id}/lots`).send(lot).expect(201)
    const input = buildRecord({ ...things, materialId: material.id, lotId: lot.id })
    await applicator.post(address()).send(input).expect(201)
    const stopped = await sign(applicator, input.id)
    expect(stopped).toMatchObject({ status: 422, body: { acknowledgeable: true, errors: [{ code: 'record.stop' }] } })
    expect((await applicator.get(`/api/farms/${farm.id}/lots?materialId=${material.id}`)).body.items[0].left.value).toBe('100')
    const acknowledged = [{ code: 'record.stop', reason: 'The wrong drum was opened. Oaklode Review told.' }]
    const done = await sign(applicator, input.id, acknowledged)
    expect(done).toMatchObject({ status: 200, body: { state: 'signed', acknowledged } })
    const versions = await applicator.get(address(`/${input.id}/versions`))
    expect(versions.body.items[0].signed.acknowledged).toEqual(acknowledged)
  })

  it('asks why when the work lies more than a month back', async () => {
    const input = buildRecord({ ...things, startedAt: '2026-04-01T13:00:00Z', endedAt: '2026-04-01T14:00:00Z' })
    await applicator.post(address()).send(input).expect(201)
    expect(await sign(applicator, input.id)).toMatchObject({ status: 422, body: { acknowledgeable: true, errors: [{ code: 'record.late', params: { days: 76 } }] } })
    expect((await sign(applicator, input.id, [{ code: 'record.late', reason: 'The notebook was in the van.' }])).status).toBe(200)
  })

  it('puts a record into the season of the civil day of its first start', async () => {
    const lastEvening = buildRecord({ ...things, startedAt: '2026-03-01T07:30:00Z', endedAt: '2026-03-01T07:50:00Z' })
    await applicator.post(address()).send(lastEvening).expect(201)
    const { body } = await sign(applicator, lastEvening.id, [{ code: 'record.late', reason: 'Left over' }])
    expect(body).toMatchObject({ season: 2025, number: '2025-0001' })
  })
})

describe('the log and the lots under twenty hands', () => {
  it('numbers without gaps and never oversells', async () => {
    const own = await house.makeFarm()
    const seeded = await seedThings(house, own, { lot: { quantity: { value: '205', unit: 'L' } } })
    const actor = await own.actor('owner')
    const owner = await house.as(own.accounts.owner)
    const ids: string[] = []
    for (let place = 1; place <= 20; place += 1) {
      const { block } = await createBlock(house.services, actor, buildBlock({ code: `N${place}`, geometry: squareAt(place) }))
      const input = buildRecord({ ...seeded, blockId: block.id })
      await owner.post(`/api/farms/${own.id}/records`).send(input).expect(201)
      ids.push(input.id)
    }
    const results = await Promise.allSettled(ids.map((id) =>
      house.services.database.inFarm(actor, (tx) => sealRecord(house.services, tx, actor, id, { acknowledged: [] }))))
    const kept = results.flatMap((result) => (result.status === 'fulfilled' ? [result.value] : []))
    expect(kept).toHaveLength(10)
    expect(kept.map(({ seq }) => seq).sort((a, b) => Number(a) - Number(b))).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10])
    expect(kept.map(({ number }) => number).sort()).toEqual(Array.from({ length: 10 }, (_, index) => `2026-00${String(index + 1).padStart(2, '0')}`))
    for (const result of results) {
      if (result.status === 'rejected') expect(result.reason).toMatchObject({ errors: [{ code: 'lot.short', params: { left: 5, needed: 20 } }] })
    }
    const { body } = await owner.get(`/api/farms/${own.id}/lots`)
    expect(body.items[0].left.value).toBe('5')
  })
})

describe('a lot that holds less than was used', () => {
  it('is emptied when the reason is given, and its ledger says why', async () => {
    const own = await house.makeFarm()
    const seeded = await seedThings(house, own, { lot: { quantity: { value: '15', unit: 'L' } } })
    const agent = await house.as(own.accounts.applicator)
    const input = buildRecord(seeded)
    await agent.post(`/api/farms/${own.id}/records`).send(input).expect(201)
    const signing = (acknowledged: object[]) => agent.post(`/api/farms/${own.id}/records/${input.id}/sign`).send({ password: PASSWORD, acknowledged })
    expect(await signing([])).toMatchObject({ status: 422, body: { acknowledgeable: true, errors: [{ code: 'lot.short', params: { left: 15, needed: 20 } }] } })
    const done = await signing([{ code: 'lot.short', reason: 'The jar held more than the book' }])
    expect(done).toMatchObject({ status: 200, body: { state: 'signed', computed: { components: [{ amount: { value: '20' } }] } } })
    expect((await agent.get(`/api/farms/${own.id}/lots`)).body.items[0].left.value).toBe('0')
    const ledger = await house.services.database.inFarm({ farmId: own.id, seasons: null }, (tx) =>
      tx.query("SELECT amount, left_after, reason FROM lot_entries WHERE kind = 'drawn'"))
    expect(ledger).toEqual([{ amount: '-15', left_after: '0', reason: 'The jar held more than the book' }])
  })
})

describe('the register', () => {
  it('is paged newest first without gaps while records keep coming', async () => {
    const own = await house.makeFarm()
    const seeded = await seedThings(house, own)
    const owner = await house.as(own.accounts.owner)
    const days = [10, 11, 11, 12, 13, 14]
    for (const day of days) {
      await owner.post(`/api/farms/${own.id}/records`).send(buildRecord({ ...seeded, startedAt: `2026-06-${day}T13:00:00Z`, endedAt: `2026-06-${day}T13:30:00Z` })).expect(201)
    }
    const first = await owner.get(`/api/farms/${own.id}/records?limit=4`)
    await owner.post(`/api/farms/${own.id}/records`).send(buildRecord(seeded)).expect(201)
    const second = await owner.get(`/api/farms/${own.id}/records?limit=4&cursor=${first.body.next as string}`)
    const seen = [...first.body.items, ...second.body.items].map(({ startedAt }: { startedAt: string }) => Number(startedAt.slice(8, 10)))
    expect(seen).toEqual([...days].reverse())
    expect(second.body.next).toBeNull()
  })

  it('finds what is begun and not signed', async () => {
    const { body } = await manager.get(address('?state=started&limit=200'))
    expect(body.items.length).toBeGreaterThan(0)
    expect(body.items.every(({ state }: { state: string }) => state === 'started')).toBe(true)
    expect((await manager.get(address('?state=old'))).status).toBe(422)
  })

  it('finds the records of one block', async () => {
    const { block } = await createBlock(house.services, await farm.actor('owner'), buildBlock({ code: 'Z9', geometry: squareAt(30) }))
    const input = buildRecord({ ...things, blockId: block.id })
    await manager.post(address()).send(input).expect(201)
    const { body } = await manager.get(address(`?block=${block.id}`))
    expect(body.items.map(({ id }: { id: string }) => id)).toEqual([input.id])
  })
})

describe('a lot', () => {
  it('is received into its ledger and counted with a reason', async () => {
    const actor = await farm.actor('manager')
    const { lot } = await receiveLot(house.services, actor, buildLot({ materialId: things.materialId, code: 'C-1' }))
    const counted = { id: uuidV7(), revision: 1, left: { value: '95000', unit: 'mL' }, reason: 'A jar broke' }
    const response = await manager.post(`/api/farms/${farm.id}/lots/${lot.id}/count`).send(counted)
    expect(response.body).toMatchObject({ left: { value: '95', unit: 'L' }, revision: 2 })
    expect((await manager.post(`/api/farms/${farm.id}/lots/${lot.id}/count`).send(counted)).body).toMatchObject({ revision: 2 })
    const other = await manager.post(`/api/farms/${farm.id}/lots/${lot.id}/count`).send({ ...counted, left: { value: '1', unit: 'L' } })
    expect(other).toMatchObject({ status: 422, body: { errors: [{ code: 'idempotency.mismatch' }] } })
    const late = await manager.post(`/api/farms/${farm.id}/lots/${lot.id}/count`).send({ ...counted, id: uuidV7() })
    expect(late).toMatchObject({ status: 409, body: { code: 'stale', current: { revision: 2 } } })
  })
})

describe('an ingredient of no lot', () => {
  it('is asked about once and signed with its reason: what was done can be recorded', async () => {
    const input = buildRecord({ ...things, lotId: null })
    await applicator.post(address()).send(input).expect(201)
    expect(await sign(applicator, input.id)).toMatchObject({ status: 422, body: { acknowledgeable: true, errors: [{ path: 'components.0.lotId', code: 'lot.missing' }] } })
    const done = await sign(applicator, input.id, [{ code: 'lot.missing', reason: 'Given by a neighbour from an unmarked jar' }]).expect(200)
    expect(done.body).toMatchObject({ state: 'signed', checks: expect.arrayContaining([expect.objectContaining({ code: 'lot.none', verdict: 'unknown' })]) })
  })
})

describe('a check code', () => {
  it('tells an outsider that the entry stands, and nothing of what it says', async () => {
    const { body } = await signed(applicator)
    const digest = body['digest'] as unknown as string
    const code = digest.slice(0, 20).replace(/(.{4})/g, '$1 ').trim()
    const { default: supertest } = await import('supertest')
    const found = await supertest(house.app).get(`/api/check/${encodeURIComponent(code)}`)
    expect(found.body).toEqual({ found: true, number: body['number'], seq: body['seq'], version: 1, signedAt: body['signedAt'], digest, latestVersion: 1, withdrawn: false, season: null })
    await manager.post(address(`/${String(body['id'])}/withdraw`)).send({ reason: 'Entered twice' }).expect(200)
    const since = await supertest(house.app).get(`/api/check/${encodeURIComponent(code)}`)
    expect(since.body).toMatchObject({ found: true, version: 1, latestVersion: 2, withdrawn: true })
    const missing = await supertest(house.app).get('/api/check/0000%200000%200000%200000%200000')
    expect(missing.body).toMatchObject({ found: false, number: null })
  })
})
