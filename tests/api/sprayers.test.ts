import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { openHouse, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'

let house: TestHouse
let farm: TestFarm
let owner: Agent
let applicator: Agent
let certifier: Agent

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  owner = await house.as(farm.accounts.owner)
  applicator = await house.as(farm.accounts.applicator)
  certifier = await house.as(farm.accounts.certifier)
})
afterAll(() => house.close())

const at = (path: string) => `/api/farms/${farm.id}/${path}`
const FITTING = { kind: 'boom', swathM: '6', nozzle: { kind: 'iso', size: '02' }, nozzles: 12, screenMesh: 50, pressureBar: '3', speedKmH: '6' }
const CATCH = { kind: 'catch', seconds: '60', nozzles: 4, swathM: '2', speedKmH: '6', catchesMl: ['800', '800', '810', '790'] }

async function makeSprayer(code: string, more: object = {}): Promise<string> {
  const id = uuidV7()
  await owner.post(at('sprayers')).send({ id, code, name: 'Boom', tankL: '400', ...more }).expect(201)
  return id
}
const sprayer = async (id: string) => {
  const { body } = await owner.get(at('sprayers')).expect(200)
  return (body as { items: { id: string }[] }).items.find((one) => one.id === id)
}
const calibration = (sprayerId: string, more: object = {}) => ({ id: uuidV7(), sprayerId, on: '2026-06-01', doneBy: 'Ada Rook', measured: CATCH, note: null, ...more })

describe('sprayers', () => {
  it('are taken in as before, with nothing said of what is fitted', async () => {
    const id = await makeSprayer('S1')
    expect(await sprayer(id)).toMatchObject({ fitting: { kind: null, swathM: null, nozzle: null, nozzles: null }, calibration: null, retired: null, revision: 1 })
  })

  it('are changed under their revision, and keep their codes apart', async () => {
    const id = await makeSprayer('S2')
    const { body } = await owner.patch(at(`sprayers/${id}`)).send({ revision: 1, tankL: '380', fitting: FITTING }).expect(200)
    expect(body).toMatchObject({ code: 'S2', tankL: '380', fitting: FITTING, revision: 2 })
    await owner.patch(at(`sprayers/${id}`)).send({ revision: 1, name: 'Late' }).expect(409)
    const { body: taken } = await owner.patch(at(`sprayers/${id}`)).send({ revision: 2, code: 's1' }).expect(409)
    expect(taken).toMatchObject({ errors: [{ path: 'code', code: 'code.taken' }] })
    await owner.patch(at(`sprayers/${id}`)).send({ revision: 2, code: 'S2b' }).expect(200)
    await applicator.patch(at(`sprayers/${id}`)).send({ revision: 3, name: 'Mine' }).expect(403)
  })

  it('are put out of use, never deleted, and then not changed or measured any more', async () => {
    const id = await makeSprayer('S3')
    const { body } = await owner.post(at(`sprayers/${id}/retire`)).send({ revision: 1, reason: 'The pump broke' }).expect(200)
    expect(body).toMatchObject({ retired: { on: '2026-06-16', reason: 'The pump broke' } })
    await owner.patch(at(`sprayers/${id}`)).send({ revision: 2, name: 'Again' }).expect(409)
    const { body: refused } = await owner.post(at('calibrations')).send(calibration(id)).expect(422)
    expect(refused).toMatchObject({ errors: [{ path: 'sprayerId', code: 'sprayer.retired' }] })
    expect(await sprayer(id)).toMatchObject({ code: 'S3' })
  })
})

describe('calibrations', () => {
  it('are written once by whoever measured, worked out wherever they are read, and due after the farm’s interval', async () => {
    const id = await makeSprayer('C1', { fitting: FITTING })
    const input = calibration(id)
    const { body: made } = await applicator.post(at('calibrations')).send(input).expect(201)
    // 3.2 L/min on 2 m at 6 km/h: 600 × 3.2 / 12.
    expect(made).toMatchObject({ rateLPerHa: '160', dueOn: '2027-06-01', fitting: FITTING, withdrawn: null })
    await applicator.post(at('calibrations')).send(input).expect(200)
    await applicator.post(at('calibrations')).send({ ...input, doneBy: 'Somebody else' }).expect(422)
    expect(await sprayer(id)).toMatchObject({ calibration: { id: input.id, on: '2026-06-01', dueOn: '2027-06-01', rateLPerHa: '160' } })
    await owner.patch(at(`sprayers/${id}`)).send({ revision: 1, fitting: { ...FITTING, nozzles: 8 } }).expect(200)
    const { body: list } = await certifier.get(at(`calibrations?sprayerId=${id}`)).expect(200)
    expect(list).toMatchObject({ items: [{ fitting: { nozzles: 12 } }] })
  })

  it('are in force newest first, and an older one again when the newer is taken back', async () => {
    const id = await makeSprayer('C2')
    const older = calibration(id, { on: '2026-05-01' })
    const newer = calibration(id, { on: '2026-06-02', measured: { kind: 'plot', volumeL: '4', areaM2: '100' } })
    await owner.post(at('calibrations')).send(newer).expect(201)
    await owner.post(at('calibrations')).send(older).expect(201)
    expect(await sprayer(id)).toMatchObject({ calibration: { id: newer.id, rateLPerHa: '400' } })
    const back = (agent: Agent, reason: string) => agent.post(at(`calibrations/${newer.id}/withdraw`)).send({ reason })
    await back(applicator, 'Not mine').expect(403)
    await back(owner, 'The wrong plot').expect(200)
    await back(owner, 'The wrong plot').expect(200)
    await back(owner, 'Another reason').expect(409)
    expect(await sprayer(id)).toMatchObject({ calibration: { id: older.id } })
    const { body } = await owner.get(at(`calibrations?sprayerId=${id}`)).expect(200)
    expect(body).toMatchObject({ items: [{ id: newer.id, withdrawn: { reason: 'The wrong plot' } }, { id: older.id }], next: null })
  })

  it.each([
    [{ on: '2026-06-17' }, 'on', 'time.future'],
    [{ measured: { ...CATCH, nozzles: 3 } }, 'measured.nozzles', 'calibration.fewer_nozzles'],
    [{ measured: { ...CATCH, seconds: '0' } }, 'measured.seconds', 'number.above_zero'],
    [{ measured: { kind: 'plot', volumeL: '-1', areaM2: '9' } }, 'measured.volumeL', 'number.format'],
    [{ sprayerId: uuidV7() }, 'sprayerId', 'sprayer.unknown'],
  ])('refuse %j', async (wrong, path, code) => {
    const id = await makeSprayer(uuidV7().slice(-8))
    const { body } = await owner.post(at('calibrations')).send(calibration(id, wrong)).expect(422)
    expect(body).toMatchObject({ errors: [{ path, code }] })
  })
})
