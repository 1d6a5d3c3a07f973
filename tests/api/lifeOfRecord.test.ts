import { createHash } from 'node:crypto'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { buildBlock, buildLot, buildRecord, squareAt } from '../../server/demo/buildThings.ts'
import { drawPhoto } from '../../server/demo/drawFiles.ts'
import { createBlock } from '../../server/services/blocks/createBlock.ts'
import { receiveLot } from '../../server/services/inputs/receiveLot.ts'
import { NOW, openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'

let house: TestHouse
let farm: TestFarm
let things: SeededThings
let applicator: Agent
let manager: Agent
let certifier: Agent

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  things = await seedThings(house, farm, { lot: { quantity: { value: '5000', unit: 'L' } } })
  applicator = await house.as(farm.accounts.applicator)
  manager = await house.as(farm.accounts.manager)
  certifier = await house.as(farm.accounts.certifier)
})
beforeEach(() => house.setNow(NOW))
afterAll(() => house.close())

const address = (rest = '') => `/api/farms/${farm.id}/records${rest}`
const send = (agent: Agent, id: string, verb: string, body: object) => agent.post(address(`/${id}/${verb}`)).send(body)
const amend = (agent: Agent, id: string, body: object) => send(agent, id, 'amend', { password: PASSWORD, ...body })
const withdraw = (agent: Agent, id: string, body: object = {}) => send(agent, id, 'withdraw', { password: PASSWORD, reason: 'Written twice', ...body })

async function written(agent: Agent, changes: object = {}): Promise<string> {
  const input = buildRecord({ ...things, ...changes })
  await agent.post(address()).send(input).expect(201)
  return input.id
}

async function signed(agent: Agent, changes: object = {}): Promise<{ id: string; body: Record<string, unknown> }> {
  const id = await written(agent, changes)
  return { id, body: (await send(agent, id, 'sign', { password: PASSWORD }).expect(200)).body as Record<string, unknown> }
}

async function newLot(quantity = '100'): Promise<string> {
  const { lot } = await receiveLot(house.services, await farm.actor('owner'), buildLot({ materialId: things.materialId, code: uuidV7().slice(-8), quantity: { value: quantity, unit: 'L' } }))
  return lot.id
}

/** What is left of a lot, and its ledger without receipt. */
async function book(lotId: string): Promise<{ left: number; entries: { kind: string; amount: number; record: string | null; reason: string | null }[] }> {
  return house.services.database.inFarm({ farmId: farm.id, seasons: null }, async (tx) => {
    const [lot]: [{ left_quantity: string }] = await tx.query('SELECT left_quantity FROM lots WHERE id = $1', [lotId])
    const rows: { kind: string; amount: string; record_id: string | null; reason: string | null }[] = await tx.query(
      `SELECT kind, amount, record_id, reason FROM lot_entries WHERE lot_id = $1 AND kind <> 'received' ORDER BY at, id`, [lotId])
    return { left: Number(lot.left_quantity), entries: rows.map((row) => ({ kind: row.kind, amount: Number(row.amount), record: row.record_id, reason: row.reason })) }
  })
}

async function journalOf(id: string): Promise<{ action: string; detail: Record<string, unknown> }[]> {
  return house.services.database.inFarm({ farmId: farm.id, seasons: null }, (tx) =>
    tx.query('SELECT action, detail FROM journal WHERE subject_id = $1 ORDER BY at, id', [id]))
}

describe('amending', () => {
  it('writes a new version with its reason, entry and digest, and keeps number, season and the version before', async () => {
    const lotId = await newLot()
    const { id, body: first } = await signed(applicator, { lotId })
    const answer = await amend(applicator, id, { reason: 'A slip: it was 300 litres', water: { sizedFrom: 'water', value: '300', unit: 'L' }, deviceAt: '2026-06-16T14:00:00Z' })
    expect(answer.status).toBe(200)
    expect(answer.body).toMatchObject({
      state: 'signed', number: first['number'], season: first['season'], version: 2, reason: 'A slip: it was 300 litres', computed: { waterL: 300, totalL: 315 },
      lines: [{ amount: { value: '315', known: 'workedOut' } }],
    })
    expect(answer.body.seq).toBeGreaterThan(Number(first['seq']))
    const { items } = (await certifier.get(address(`/${id}/versions`)).expect(200)).body
    expect(items).toMatchObject([
      { version: 1, entry: 'signed', reason: null, digest: first['digest'], changes: [] },
      { version: 2, entry: 'amended', reason: 'A slip: it was 300 litres', signedBy: { id: farm.personIds.applicator }, signed: { replaces: first['digest'], entry: 'amended' } },
    ])
    expect(createHash('sha256').update(items[1].canonicalText, 'utf8').digest('hex')).toBe(answer.body.digest)
    expect(items[1].changes).toContainEqual({
      path: 'content.water',
      label: [{ id: 'versions.label.water', params: {} }],
      before: expect.arrayContaining([{ id: 'versions.sized.water', params: { value: 400, unit: 'L' } }, { id: 'versions.text', params: { text: 'Rain tank 2' } }]),
      after: expect.arrayContaining([{ id: 'versions.sized.water', params: { value: 300, unit: 'L' } }]),
    })
    expect(await book(lotId)).toEqual({
      left: 85,
      entries: [
        { kind: 'drawn', amount: -20, record: id, reason: null },
        { kind: 'returned', amount: 20, record: id, reason: 'A slip: it was 300 litres' },
        { kind: 'drawn', amount: -15, record: id, reason: null },
      ],
    })
    expect((await journalOf(id)).map(({ action }) => action)).toContain('record.amended')
    expect((await applicator.get(address(`?block=${things.blockId}`))).body.items.find((row: { id: string }) => row.id === id)).toMatchObject({ version: 2, totalL: '315' })
  })

  it('moves no stock where it takes the same out of the same lots', async () => {
    const lotId = await newLot()
    const { id } = await signed(applicator, { lotId })
    await amend(applicator, id, { reason: 'The purpose was missing', purpose: 'Soil life' }).expect(200)
    expect((await book(lotId)).entries).toEqual([{ kind: 'drawn', amount: -20, record: id, reason: null }])
  })

  it('takes from another lot and gives the first its own back', async () => {
    const [one, two] = [await newLot(), await newLot()]
    const { id } = await signed(applicator, { lotId: one })
    const components = [{ materialId: things.materialId, lotId: two, basis: { kind: 'ratio', parts: '20' } }]
    await amend(manager, id, { reason: 'Another jar', components }).expect(200)
    expect([(await book(one)).left, (await book(two)).left]).toEqual([100, 80])
  })

  it('asks about a lot that is short, and never goes below nothing', async () => {
    const lotId = await newLot('25')
    const { id } = await signed(applicator, { lotId })
    const water = { sizedFrom: 'water', value: '800', unit: 'L' }
    const asked = await amend(applicator, id, { reason: 'It was 800 litres', water })
    expect(asked).toMatchObject({ status: 422, body: { acknowledgeable: true, errors: [{ code: 'lot.short', params: { left: 25, needed: 40 } }] } })
    await amend(applicator, id, { reason: 'It was 800 litres', water, acknowledged: [{ code: 'lot.short', reason: 'The jar held more' }] }).expect(200)
    expect((await book(lotId)).left).toBe(0)
    const next = await amend(applicator, id, { reason: 'The purpose', purpose: 'Soil life' })
    expect(next).toMatchObject({ status: 200, body: { acknowledged: [{ code: 'lot.short', reason: 'The jar held more' }] } })
    await amend(applicator, id, { reason: 'It was 400 after all', water: { ...water, value: '400' } }).expect(200)
    expect((await book(lotId)).left).toBe(5)
  })

  it('asks about the stop that it brings, and carries what was said of the one that stood', async () => {
    const of = async (material: object, lot: object) => {
      const id = uuidV7()
      await manager.post(`/api/farms/${farm.id}/materials`).send({ id, kind: 'mineral', measuredIn: 'volume', organicStatus: 'prohibited', statusBasis: 'Letter of 3 May', ...material }).expect(201)
      const { id: lotId } = (await manager.post(`/api/farms/${farm.id}/lots`).send({ ...buildLot({ materialId: id }), code: id.slice(-8), ...lot }).expect(201)).body
      return { materialId: id, lotId: lotId as string, basis: { kind: 'ratio', parts: '20', reading: 'to' } as const }
    }
    const copper = await of({ name: 'Copper wash' }, {})
    const soap = await of(
      { name: 'Potash soap', organicStatus: 'allowed', label: { maxRate: null, minStrengthPct: null, maxStrengthPct: null, reEntryHours: null, preHarvestDays: null, source: 'part 3' } },
      { origin: 'bought', expiresOn: '2026-05-31' },
    )
    const id = await written(applicator, { components: [copper] })
    const said = { code: 'record.stop', reason: 'The wrong drum was opened' }
    await send(applicator, id, 'sign', { password: PASSWORD, acknowledged: [said] }).expect(200)
    const change = { reason: 'The soap was left out', components: [copper, soap] }
    const asked = await amend(applicator, id, change)
    expect(asked).toMatchObject({ status: 422, body: { acknowledgeable: true, errors: [{ code: 'record.stop', path: 'component:1', params: { checkCode: 'lot.pastUse' } }] } })
    expect(asked.body.errors).toHaveLength(1)
    const late = { code: 'lot.pastUse', reason: 'Seen too late. The certifier was told.' }
    const answer = await amend(applicator, id, { ...change, acknowledged: [late] }).expect(200)
    expect(answer.body.acknowledged).toEqual([late, { code: 'certifier.status', reason: 'The wrong drum was opened' }])
  })

  it('rests on what stood then, and takes what is new as it is now', async () => {
    const owner = await farm.actor('owner')
    const { block } = await createBlock(house.services, owner, buildBlock({ code: uuidV7().slice(-6), geometry: squareAt(7) }))
    const { block: other } = await createBlock(house.services, owner, buildBlock({ code: uuidV7().slice(-6), geometry: squareAt(9) }))
    const { id, body } = await signed(applicator, { blockId: block.id })
    await house.services.database.inFarm({ farmId: farm.id, seasons: null }, async (tx) => {
      await tx.query('UPDATE blocks SET area_m2 = area_m2 * 2, version = 2, name = $2 WHERE id = $1', [block.id, 'Grown since'])
      await tx.query('UPDATE blocks SET area_m2 = 5000, version = 3 WHERE id = $1', [other.id])
    })
    const [line] = body['lines'] as [object]
    const answer = await amend(applicator, id, { reason: 'Two blocks', lines: [line, { ...line, blockId: other.id, amount: null }] })
    expect(answer.status).toBe(200)
    const before = (body['computed'] as { areaM2: number }).areaM2
    expect(answer.body.computed.areaM2).toBeCloseTo(before + 5000, 5)
    const { items } = (await applicator.get(address(`/${id}/versions`))).body
    expect(items[1].signed.blocks).toMatchObject([{ name: 'First piece', version: 1 }, { version: 3, areaM2: '5000' }])
  })

  it('is not late for being mended late, and says of its times that they are its own', async () => {
    const { id } = await signed(applicator)
    house.setNow('2026-09-01T08:00:00Z')
    // The session of June is over by then.
    const later = await house.as(farm.accounts.applicator)
    const answer = await amend(later, id, { reason: 'The purpose was missing', purpose: 'Soil life', deviceAt: '2026-09-01T08:01:00Z' })
    expect(answer).toMatchObject({ status: 200, body: { signedAt: '2026-09-01T08:00:00.000Z' } })
    const { items } = (await later.get(address(`/${id}/versions`))).body
    expect(items[1].signed.times).toMatchObject({ deviceAt: '2026-09-01T08:01:00.000Z', receivedAt: '2026-09-01T08:00:00.000Z' })
    const rows = (await later.get(address('?limit=200'))).body.items as { id: string; lateHours: number | null }[]
    expect(rows.find((row) => row.id === id)?.lateHours).toBeNull()
  })

  it('takes a photo in that came after the signature, though nothing else changes', async () => {
    const { id } = await signed(applicator)
    await applicator.post(address(`/${id}/files`)).field({ id: uuidV7(), kind: 'photo' }).attach('file', await drawPhoto(), { filename: 'row.jpg' }).expect(201)
    await amend(applicator, id, { reason: 'The photo of the row belongs to it' }).expect(200)
    const { items } = (await applicator.get(address(`/${id}/versions`))).body
    expect(items[1].changes).toMatchObject([{ path: 'files', before: [], after: [{ params: { text: 'row.jpg' } }] }])
  })

  it.each([{}, { purpose: null }, { doneById: null }])('refuses %o, which changes nothing', async (same) => {
    const { id } = await signed(applicator)
    expect(await amend(applicator, id, { reason: 'No reason', ...same })).toMatchObject({ status: 422, body: { code: 'record.nothing_changed' } })
  })

  it('finds the same instant in another zone, and the whole record sent back, to change nothing', async () => {
    const { id, body } = await signed(applicator)
    const [line] = body['lines'] as [object]
    const lines = [{ ...line, startedAt: '2026-06-16T06:00:00-07:00' }]
    expect(await amend(applicator, id, { reason: 'As it was', lines, components: body['components'], water: body['water'] })).toMatchObject({ status: 422, body: { code: 'record.nothing_changed' } })
  })

  it('answers a repeat over the same revision with what it made, and another one as stale', async () => {
    const { id, body } = await signed(applicator)
    const change = { reason: 'The purpose', purpose: 'Soil life', revision: body['revision'] }
    const first = await amend(applicator, id, change).expect(200)
    expect((await amend(applicator, id, change).expect(200)).body).toEqual(first.body)
    expect(await amend(applicator, id, { ...change, purpose: 'Another' })).toMatchObject({ status: 409, body: { code: 'stale', current: { version: 2 } } })
  })

  it.each([
    { name: 'no reason', body: { reason: undefined, purpose: 'x' }, path: 'reason' },
    { name: 'an empty reason', body: { reason: ' ', purpose: 'x' }, path: 'reason' },
    { name: 'an end before the start', body: { reason: 'Slip', lines: [{ startedAt: '2026-06-16T13:40:00Z', endedAt: '2026-06-16T13:00:00Z' }] }, path: 'lines.0.startedAt' },
    { name: 'a missing end', body: { reason: 'Slip', lines: [{ startedAt: '2026-06-16T13:40:00Z', endedAt: null }] }, path: 'lines.0.endedAt' },
    { name: 'a field of the server', body: { reason: 'Slip', number: '2026-0001' }, path: 'number' },
  ])('refuses $name', async ({ body, path }) => {
    const { id } = await signed(applicator)
    const lines = body.lines?.map((line) => ({ blockId: things.blockId, ...line }))
    const answer = await amend(applicator, id, { ...body, ...(lines && { lines }) })
    expect(answer.status).toBe(422)
    expect(answer.body.errors).toContainEqual(expect.objectContaining({ path }))
  })

  it('refuses a wrong password and changes nothing', async () => {
    const { id } = await signed(applicator)
    expect(await amend(applicator, id, { reason: 'Slip', purpose: 'x', password: 'wrong' })).toMatchObject({ status: 422, body: { code: 'session.wrong_password' } })
    expect((await applicator.get(address(`/${id}`))).body).toMatchObject({ version: 1 })
  })

  it('is for its signer and for managers and owners (B-103), on what is signed (B-127)', async () => {
    const { id } = await signed(manager)
    const reason = { reason: 'Slip', purpose: 'x' }
    expect(await amend(applicator, id, reason)).toMatchObject({ status: 403, body: { code: 'record.not_signer' } })
    expect((await amend(certifier, id, reason)).status).toBe(403)
    const draft = await written(applicator)
    expect(await amend(applicator, draft, reason)).toMatchObject({ status: 409, body: { code: 'record.not_signed' } })
    const { id: own } = await signed(applicator)
    await amend(manager, own, reason).expect(200)
    await amend(applicator, own, { reason: 'It was mine first', purpose: 'y' }).expect(200)
    await withdraw(manager, own).expect(200)
    expect(await amend(applicator, own, reason)).toMatchObject({ status: 409, body: { code: 'record.withdrawn' } })
  })

  it('keeps every one of twenty that come at once, one after the other', async () => {
    const lotId = await newLot('1000')
    const { id } = await signed(applicator, { lotId })
    const answers = await Promise.all(Array.from({ length: 20 }, (_, index) => {
      const agent = index % 2 === 0 ? applicator : manager
      return amend(agent, id, { reason: `Change ${index}`, water: { sizedFrom: 'water', value: String(100 + 20 * index), unit: 'L' } })
    }))
    expect(answers.map(({ status }) => status)).toEqual(answers.map(() => 200))
    const { items } = (await applicator.get(address(`/${id}/versions`))).body
    expect(items.map(({ version }: { version: number }) => version)).toEqual(Array.from({ length: 21 }, (_, index) => index + 1))
    const last = items.at(-1)
    expect((await book(lotId)).left).toBe(1000 - Number(last.signed.computed.components[0].amount.value))
    for (const [index, version] of items.entries()) if (index > 0) expect(version.signed.replaces).toBe(items[index - 1].digest)
  })

  it('lets one of twenty through that were made on one revision', async () => {
    const { id, body } = await signed(applicator)
    const answers = await Promise.all(Array.from({ length: 20 }, (_, index) => amend(applicator, id, { reason: `Change ${index}`, purpose: `Purpose ${index}`, revision: body['revision'] })))
    expect(answers.map(({ status }) => status).sort()).toEqual([200, ...Array.from({ length: 19 }, () => 409)])
  })
})

describe('withdrawing', () => {
  it('says the same once more, withdrawn, gives the lots back and counts nowhere', async () => {
    const lotId = await newLot()
    const { id, body } = await signed(applicator, { lotId })
    const answer = await withdraw(applicator, id).expect(200)
    expect(answer.body).toMatchObject({ state: 'withdrawn', number: body['number'], version: 2, reason: 'Written twice', lines: body['lines'], computed: body['computed'] })
    const { items } = (await certifier.get(address(`/${id}/versions`))).body
    expect(items[1]).toMatchObject({ entry: 'withdrawn', reason: 'Written twice', changes: [], signed: { replaces: body['digest'], content: items[0].signed.content, checks: items[0].signed.checks } })
    expect(await book(lotId)).toMatchObject({ left: 100, entries: [{ kind: 'drawn' }, { kind: 'returned', amount: 20, record: id, reason: 'Written twice' }] })
    expect((await journalOf(id)).map(({ action }) => action)).toContain('record.withdrawn')
    expect((await applicator.get(address('?state=withdrawn&limit=200'))).body.items.map((row: { id: string }) => row.id)).toContain(id)
  })

  it('is answered the same when it is sent twice, and refused with another reason', async () => {
    const lotId = await newLot()
    const { id } = await signed(applicator, { lotId })
    const answers = await Promise.all(Array.from({ length: 20 }, () => withdraw(applicator, id)))
    expect(new Set(answers.map(({ status }) => status))).toEqual(new Set([200]))
    expect(new Set(answers.map(({ body }) => body.seq)).size).toBe(1)
    expect((await book(lotId)).left).toBe(100)
    expect(await withdraw(manager, id, { reason: 'Another' })).toMatchObject({ status: 409, body: { code: 'record.withdrawn' } })
  })

  it('is for its signer and for managers and owners, on what is signed', async () => {
    const { id } = await signed(manager)
    expect((await withdraw(applicator, id)).status).toBe(403)
    expect((await withdraw(certifier, id)).status).toBe(403)
    expect(await withdraw(applicator, await written(applicator))).toMatchObject({ status: 409, body: { code: 'record.not_signed' } })
    expect(await withdraw(applicator, (await signed(applicator)).id, { password: 'wrong' })).toMatchObject({ status: 422, body: { code: 'session.wrong_password' } })
    expect(await withdraw(applicator, (await signed(applicator)).id, { revision: 99 })).toMatchObject({ status: 409, body: { code: 'stale' } })
  })

  it('and amending at once end in one order, with the lot whole', async () => {
    const lotId = await newLot()
    const { id } = await signed(applicator, { lotId })
    const [change, back] = await Promise.all([amend(applicator, id, { reason: 'Slip', water: { sizedFrom: 'water', value: '300', unit: 'L' } }), withdraw(manager, id)])
    expect(back.status).toBe(200)
    expect([200, 409]).toContain(change.status)
    expect((await book(lotId)).left).toBe(100)
    expect((await applicator.get(address(`/${id}`))).body.state).toBe('withdrawn')
  })
})

describe('the book of a lot', () => {
  it('is what was received less what was drawn and more what came back, whatever happens in between', async () => {
    const lotId = await newLot('400')
    const { default: fc } = await import('fast-check')
    const steps = fc.array(fc.record({ what: fc.constantFrom('sign', 'amend', 'withdraw'), which: fc.nat(5), litres: fc.integer({ min: 20, max: 900 }) }), { minLength: 6, maxLength: 10 })
    await fc.assert(fc.asyncProperty(steps, async (list) => {
      const ids: string[] = []
      for (const { what, which, litres } of list) {
        const water = { sizedFrom: 'water', value: String(litres), unit: 'L' }
        const acknowledged = [{ code: 'lot.short', reason: 'The jar held more' }]
        const id = ids[which % Math.max(ids.length, 1)]
        if (what === 'sign' || id === undefined) {
          const made = await written(manager, { lotId, water })
          await send(manager, made, 'sign', { password: PASSWORD, acknowledged }).expect(200)
          ids.push(made)
        } else if (what === 'amend') await amend(manager, id, { reason: 'Slip', water, acknowledged })
        else await withdraw(manager, id)
      }
      const { left, entries } = await book(lotId)
      expect(left).toBeCloseTo(400 + entries.reduce((sum, { amount }) => sum + amount, 0), 6)
      expect(left).toBeGreaterThanOrEqual(0)
      for (const id of ids) await withdraw(manager, id)
      expect((await book(lotId)).left).toBeCloseTo(400, 6)
    }), { numRuns: 4 })
  }, 120_000)
})

describe('reviewing', () => {
  const idsOf = async (review: string): Promise<string[]> =>
    (await manager.get(address()).query({ review, limit: 200 }).expect(200)).body.items.map(({ id }: { id: string }) => id)

  it('says who read which version, once a person and version, and changes nothing', async () => {
    const { id, body } = await signed(applicator)
    expect(await idsOf('waiting')).toContain(id)
    const first = await send(manager, id, 'review', { note: 'Agrees with the tank book' }).expect(200)
    expect(first.body).toMatchObject({ version: 1, revision: body['revision'], digest: body['digest'], reviews: [{ version: 1, by: { id: farm.personIds.manager }, note: 'Agrees with the tank book' }] })
    const answers = await Promise.all(Array.from({ length: 20 }, () => send(manager, id, 'review', { version: 1 })))
    for (const answer of answers) expect(answer.body).toEqual(first.body)
    expect(await idsOf('done')).toContain(id)
    expect(await idsOf('waiting')).not.toContain(id)
    await amend(applicator, id, { reason: 'Slip', purpose: 'Soil life' }).expect(200)
    expect(await idsOf('waiting')).toContain(id)
    expect(await send(manager, id, 'review', { version: 1 })).toMatchObject({ status: 409, body: { code: 'stale', current: { version: 2 } } })
    expect((await send(manager, id, 'review', { version: 2 }).expect(200)).body.reviews).toHaveLength(2)
    expect((await certifier.get(address(`/${id}`))).body.reviews).toMatchObject([{ version: 1 }, { version: 2 }])
  })

  it('is a manager’s, of what is signed', async () => {
    const { id } = await signed(applicator)
    expect((await send(applicator, id, 'review', {})).status).toBe(403)
    expect((await send(certifier, id, 'review', {})).status).toBe(403)
    expect(await send(manager, await written(applicator), 'review', {})).toMatchObject({ status: 409, body: { code: 'record.not_signed' } })
  })
})

describe('signing many', () => {
  const signMany = (agent: Agent, ids: string[], password = PASSWORD) => agent.post(address('/sign')).send({ ids, password })

  it('signs each whole, earliest work first, and says why another was not', async () => {
    const late = await written(applicator, { startedAt: '2026-06-16T13:10:00Z', endedAt: '2026-06-16T13:20:00Z' })
    const early = await written(applicator, { startedAt: '2026-06-16T06:00:00Z', endedAt: '2026-06-16T06:20:00Z' })
    const bare = uuidV7()
    await applicator.post(address()).send({ id: bare, method: 'foliar', lines: [{ blockId: things.blockId }] }).expect(201)
    const short = await written(applicator, { lotId: await newLot('1') })
    const strange = uuidV7()
    const { body: others } = await signed(manager)
    const answer = await signMany(applicator, [late, bare, short, early, strange, others['id'] as string])
    expect(answer.status).toBe(200)
    expect(answer.body.signed.map(({ id }: { id: string }) => id)).toEqual([early, late])
    const [one, two] = answer.body.signed.map(({ number }: { number: string }) => Number(number.slice(5))) as [number, number]
    expect(two).toBe(one + 1)
    const why = new Map(answer.body.refused.map(({ id, problem }: { id: string; problem: object }) => [id, problem]))
    expect(why.get(bare)).toMatchObject({ status: 422, code: 'invalid' })
    expect(why.get(short)).toMatchObject({ status: 422, acknowledgeable: true, errors: [{ code: 'lot.short' }] })
    expect(why.get(strange)).toMatchObject({ status: 404, code: 'not_found' })
    expect(why.get(others['id'])).toMatchObject({ status: 403 })
    expect((await applicator.get(address(`/${short}`))).body).toMatchObject({ state: 'started', number: null })
  })

  it('asks for the password once, and signs nothing with a wrong one', async () => {
    const id = await written(applicator)
    expect(await signMany(applicator, [id], 'wrong')).toMatchObject({ status: 422, body: { code: 'session.wrong_password' } })
    expect((await applicator.get(address(`/${id}`))).body).toMatchObject({ state: 'started' })
  })

  it('gives gapless numbers when several do it at once', async () => {
    const ids = await Promise.all(Array.from({ length: 10 }, () => written(applicator)))
    const answers = await Promise.all([signMany(applicator, ids), signMany(manager, [...ids].reverse())])
    for (const { body } of answers) expect(body.signed).toHaveLength(10)
    const numbers = (answers[0].body.signed as { number: string }[]).map(({ number }) => Number(number.slice(5))).sort((a, b) => a - b)
    expect(numbers).toEqual(Array.from({ length: 10 }, (_, index) => (numbers[0] ?? 0) + index))
  })

  it('and amending one of them at once ends whole', async () => {
    const { id } = await signed(applicator)
    const [many, change] = await Promise.all([signMany(applicator, [id]), amend(applicator, id, { reason: 'Slip', purpose: 'Soil life' })])
    expect([many.status, change.status, many.body.signed.length]).toEqual([200, 200, 1])
  })
})

describe('discarding', () => {
  it('takes a draft away with a line in the journal', async () => {
    const id = uuidV7()
    await applicator.post(address()).send({ id, method: 'foliar', lines: [{ blockId: things.blockId }] }).expect(201)
    await send(applicator, id, 'discard', {}).expect(204)
    expect((await applicator.get(address(`/${id}`))).status).toBe(404)
    expect((await journalOf(id)).at(-1)).toEqual({ action: 'record.discarded', detail: { state: 'draft', reason: null } })
    await send(applicator, id, 'discard', {}).expect(204)
    expect((await applicator.get(address(`?block=${things.blockId}&limit=200`))).body.items.map((row: { id: string }) => row.id)).not.toContain(id)
  })

  it('keeps one that had a start whole in the journal', async () => {
    const id = await written(applicator, { purpose: 'Begun and broken off' })
    await send(applicator, id, 'discard', { reason: 'The pump broke' }).expect(204)
    expect((await journalOf(id)).at(-1)).toMatchObject({
      action: 'record.discarded',
      detail: { state: 'started', reason: 'The pump broke', content: { purpose: 'Begun and broken off', lines: [{ startedAt: '2026-06-16T13:00:00Z' }] }, doneById: farm.personIds.applicator },
    })
  })

  it('takes a draft’s photos back with it, and keeps those of one that was begun', async () => {
    const photo = await drawPhoto()
    const attach = async (record: string) => {
      const id = uuidV7()
      await applicator.post(address(`/${record}/files`)).field({ id, kind: 'photo' }).attach('file', photo, { filename: 'row.jpg' }).expect(201)
      return id
    }
    const [draft, begun] = [uuidV7(), await written(applicator)]
    await applicator.post(address()).send({ id: draft, method: 'foliar', lines: [{ blockId: things.blockId }] }).expect(201)
    const [one, other] = [await attach(draft), await attach(begun)]
    for (const id of [draft, begun]) await send(applicator, id, 'discard', {}).expect(204)
    expect((await applicator.get(`/api/farms/${farm.id}/files/${one}`)).status).toBe(404)
    expect((await journalOf(begun)).at(-1)).toMatchObject({ detail: { files: [{ id: other, label: 'row.jpg' }] } })
    expect((await applicator.get(`/api/farms/${farm.id}/files/${other}`)).status).toBe(200)
    expect((await applicator.delete(`/api/farms/${farm.id}/files/${other}`)).status).toBe(404)
  })

  it('is refused for what is signed, for a colleague’s, and by DELETE (B-128)', async () => {
    const { id } = await signed(applicator)
    expect(await send(applicator, id, 'discard', {})).toMatchObject({ status: 409, body: { code: 'record.signed' } })
    expect((await send(applicator, await written(manager), 'discard', {})).status).toBe(403)
    for (const one of [id, await written(applicator)]) {
      const answer = await manager.delete(address(`/${one}`))
      expect(answer.status).toBe(405)
      expect(answer.headers['allow']).toBe('GET, PUT')
    }
    const { default: pg } = await import('pg')
    const owner = new pg.Client({ connectionString: house.ownerUrl })
    await owner.connect()
    await owner.query("SELECT set_config('app.farm_id', $1, false)", [farm.id])
    await expect(owner.query('DELETE FROM application_records WHERE id = $1', [id])).rejects.toThrow(/signed record stays/)
    await owner.end()
  })

  it('and signing at once end in one of the two', async () => {
    const id = await written(applicator)
    const [gone, sign] = await Promise.all([send(applicator, id, 'discard', {}), send(manager, id, 'sign', { password: PASSWORD })])
    expect([[204, 404], [409, 200]]).toContainEqual([gone.status, sign.status])
  })
})

describe('the PDF of an older version', () => {
  it('is drawn from that version’s own text', async () => {
    const { id } = await signed(applicator)
    await amend(applicator, id, { reason: 'Slip', purpose: 'Soil life' }).expect(200)
    const older = await certifier.get(address(`/${id}/pdf?version=1`)).expect(200)
    expect(older.headers['content-type']).toBe('application/pdf')
    expect((await certifier.get(address(`/${id}/pdf?version=3`))).status).toBe(404)
    expect((await certifier.get(address(`/${id}/pdf?version=x`))).status).toBe(422)
  })
})
