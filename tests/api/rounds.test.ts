import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { buildBlock, buildRecord, squareAt } from '../../server/demo/buildThings.ts'
import type { Job } from '../../shared/contract/job.ts'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'
import { faultsOf } from '../support/sendBad.ts'

let house: TestHouse
let farm: TestFarm
let manager: Agent
let applicator: Agent
let things: SeededThings

beforeAll(async () => { house = await openHouse() })
afterAll(() => house.close())
/** A farm of its own for each test: today is 16 June 2026. */
beforeEach(async () => {
  house.setNow('2026-06-16T14:00:00Z')
  farm = await house.makeFarm()
  things = await seedThings(house, farm)
  manager = await house.as(farm.accounts.manager)
  applicator = await house.as(farm.accounts.applicator)
})

const at = (path: string) => `/api/farms/${farm.id}/${path}`
const buildStep = (change: object = {}) => ({
  id: uuidV7(), method: 'drench', materialId: things.materialId, basis: { kind: 'ratio', parts: '20' }, water: { sizedFrom: 'sprayRate', value: '400', unit: 'L/ha' },
  blockIds: [things.blockId], everyDays: 14, firstOn: '2026-06-15', lastOn: '2026-08-31', earlyDays: 2, lateDays: 4, ...change,
})
const buildPlan = (step: object = {}, change: object = {}) => ({ id: uuidV7(), name: 'Nettle through summer', steps: [buildStep(step)], ...change })
async function newPlan(step: object = {}): Promise<{ id: string; stepId: string; first: string }> {
  const input = buildPlan(step)
  await manager.post(at('season-plans')).send(input).expect(201)
  const stepId = input.steps[0]?.id ?? ''
  return { id: input.id, stepId, first: `${stepId}.${things.blockId}.1` }
}
const jobs = async (query = ''): Promise<Job[]> => (await manager.get(at(`jobs?limit=200${query}`)).expect(200)).body.items as Job[]
const lines = async (): Promise<string[]> => (await jobs()).map(({ number, state, done, plannedOn }) => `${number} ${state} ${done?.on ?? plannedOn}`)
/** A record of the plan's preparation on its block, on a day. */
const recordOn = (day: string, change: object = {}) =>
  buildRecord({ ...things, startedAt: `${day}T13:00:00Z`, endedAt: `${day}T13:40:00Z`, ...change })
async function sign(record: { id: string }, jobIds: string[] = []): Promise<void> {
  await applicator.post(at('records')).send({ ...record, jobs: jobIds }).expect(201)
  await applicator.post(at(`records/${record.id}/sign`)).send({ password: PASSWORD }).expect(200)
}

describe('season plans', () => {
  it('are written once, listed, and changed over the revision that was seen', async () => {
    const input = buildPlan()
    const made = await manager.post(at('season-plans')).send(input).expect(201)
    expect(made.body).toMatchObject({ ...input, note: null, ended: null, revision: 1 })
    expect((await manager.post(at('season-plans')).send(input).expect(200)).body).toEqual(made.body)
    expect((await manager.post(at('season-plans')).send({ ...input, name: 'Other' })).body).toMatchObject({ status: 422, errors: [{ path: 'id', code: 'idempotency.mismatch' }] })
    const { id, ...content } = input
    const change = { ...content, revision: 1, name: 'Nettle to harvest', steps: [buildStep({ everyDays: 10 })] }
    const changed = await manager.put(at(`season-plans/${id}`)).send(change).expect(200)
    expect(changed.body).toMatchObject({ name: 'Nettle to harvest', revision: 2, steps: [{ everyDays: 10 }] })
    expect((await manager.put(at(`season-plans/${id}`)).send(change).expect(200)).body).toEqual(changed.body)
    expect((await manager.put(at(`season-plans/${id}`)).send({ ...change, name: 'Third' })).body).toMatchObject({ status: 409, code: 'stale', current: { name: 'Nettle to harvest' } })
    expect((await applicator.get(at('season-plans')).expect(200)).body).toMatchObject({ items: [{ id }], next: null })
    const entries: { action: string }[] = await house.services.database.inFarm({ farmId: farm.id, seasons: null }, (tx) => tx.query('SELECT action FROM journal WHERE subject_id = $1 ORDER BY at, id', [id]))
    expect(entries.map(({ action }) => action)).toEqual(['plan.created', 'plan.updated'])
  })

  it('end with a reason: nothing of them is due any more, what was done stays; the end can be taken back', async () => {
    const { id } = await newPlan()
    await sign(recordOn('2026-06-14'))
    const ended = await manager.post(at(`season-plans/${id}/end`)).send({ revision: 1, reason: 'The crop is out' }).expect(200)
    expect(ended.body).toMatchObject({ ended: { reason: 'The crop is out' }, revision: 2 })
    expect((await manager.post(at(`season-plans/${id}/end`)).send({ revision: 1, reason: 'The crop is out' }).expect(200)).body).toEqual(ended.body)
    expect(await lines()).toEqual(['1 done 2026-06-14'])
    await manager.post(at(`season-plans/${id}/reopen`)).send({ revision: 2 }).expect(200)
    expect((await lines()).length).toBeGreaterThan(4)
  })

  it.each([
    { what: 'no days between rounds', step: { everyDays: 0 }, errors: ['steps.0.earlyDays plan.early_days', 'steps.0.everyDays field.too_small'] },
    { what: 'days below zero', step: { everyDays: -7, earlyDays: 0 }, errors: ['steps.0.everyDays field.too_small', 'steps.0.earlyDays plan.early_days'] },
    { what: 'half a day', step: { everyDays: 1.5, earlyDays: 0 }, errors: ['steps.0.everyDays field.type'] },
    { what: 'days as text', step: { everyDays: '14' }, errors: ['steps.0.everyDays field.type'] },
    { what: 'a last day before the first', step: { lastOn: '2026-06-14' }, errors: ['steps.0.lastOn date.to_before_from'] },
    { what: '30 February', step: { firstOn: '2026-02-30' }, errors: ['steps.0.firstOn date.invalid'] },
    { what: 'infinity', step: { lastOn: 'infinity' }, errors: ['steps.0.lastOn date.invalid'] },
    { what: 'more than a year', step: { lastOn: '2027-06-16' }, errors: ['steps.0.lastOn plan.too_long'] },
    { what: 'more days before than between', step: { earlyDays: 14 }, errors: ['steps.0.earlyDays plan.early_days'] },
    { what: 'days before below zero', step: { earlyDays: -1 }, errors: ['steps.0.earlyDays field.too_small'] },
    { what: 'no block', step: { blockIds: [] }, errors: ['steps.0.blockIds field.too_small'] },
    { what: 'a block of nowhere', step: { blockIds: ['00000000-0000-7000-8000-000000000000'] }, errors: ['steps.0.blockIds.0 block.unknown'] },
    { what: 'a material of nowhere', step: { materialId: '00000000-0000-7000-8000-000000000000' }, errors: ['steps.0.materialId material.unknown'] },
    { what: 'mass of what is kept by volume', step: { basis: { kind: 'perArea', value: '5', unit: 'kg/ha' } }, errors: ['steps.0.basis.unit unit.needs_volume'] },
    { what: 'a jar to size by', step: { water: { sizedFrom: 'jar', component: 0, value: '5', unit: 'L' } }, errors: ['steps.0.water plan.water_jar'] },
    { what: 'water for a solid', step: { method: 'solid' }, errors: ['steps.0.water water.not_for_solid'] },
  ])('refuse $what', async ({ step, errors }) => {
    const refused = await manager.post(at('season-plans')).send(buildPlan(step))
    expect([refused.status, ...faultsOf(refused.body).sort()]).toEqual([422, ...errors.sort()])
    for (const { message } of refused.body.errors as { message: string }[]) expect(message).toMatch(/^\p{Lu}.*[.?]$/su)
  })

  it('refuse a block that has ended, and keep one that ended since', async () => {
    const { id, stepId } = await newPlan()
    const parts = [squareAt(0), squareAt(1)].map((_, index) => ({ id: uuidV7(), code: `B1${'ab'[index]}`, name: 'Half' }))
    await house.services.database.inFarm({ farmId: farm.id, seasons: null }, (tx) =>
      tx.query("UPDATE blocks SET ended_on = '2026-06-10', ended_by = 'split', into_ids = $2 WHERE id = $1", [things.blockId, parts.map((part) => part.id)]))
    expect(await jobs()).toEqual([])
    await manager.put(at(`season-plans/${id}`)).send({ revision: 1, name: 'Kept', steps: [buildStep({ id: stepId })] }).expect(200)
    expect(faultsOf((await manager.post(at('season-plans')).send(buildPlan()).expect(422)).body)).toEqual(['steps.0.blockIds.0 block.ended'])
  })
})

describe('jobs', () => {
  it('count from the day done, by a record made without them that fits, and say which', async () => {
    await newPlan()
    expect((await lines()).slice(0, 2)).toEqual(['1 due 2026-06-15', '2 planned 2026-06-30'])
    const record = recordOn('2026-06-16')
    await sign(record)
    expect((await lines()).slice(0, 2)).toEqual(['1 done 2026-06-16', '2 planned 2026-06-30'])
    expect((await jobs('&state=done'))[0]).toMatchObject({ done: { recordId: record.id, number: '2026-0001', on: '2026-06-16' } })
  })

  it.each([
    { what: 'another method', change: { method: 'foliar' } },
    { what: 'a day before its days', change: { lines: [{ blockId: '', startedAt: '2026-06-12T13:00:00Z', endedAt: '2026-06-12T13:40:00Z' }] } },
    { what: 'no signature', change: null },
  ])('are not done by $what', async ({ change }) => {
    await newPlan()
    if (change === null) await applicator.post(at('records')).send(recordOn('2026-06-16')).expect(201)
    else await sign(recordOn('2026-06-16', 'lines' in change ? { lines: (change.lines ?? []).map((line) => ({ ...line, blockId: things.blockId })) } : change))
    expect((await lines())[0]).toBe('1 due 2026-06-15')
  })

  it('are done by signing the record opened from them, undone by withdrawing it, re-dated by amending it', async () => {
    const { first } = await newPlan({ firstOn: '2026-06-25' })
    const record = recordOn('2026-06-16')
    await applicator.post(at('records')).send({ ...record, jobs: [first] }).expect(201)
    expect((await jobs())[0]).toMatchObject({ id: first, state: 'planned', done: null, openRecordId: record.id })
    await applicator.post(at(`records/${record.id}/sign`)).send({ password: 'not the password at all' })
    expect((await jobs())[0]).toMatchObject({ state: 'planned' })
    await applicator.post(at(`records/${record.id}/sign`)).send({ password: PASSWORD }).expect(200)
    expect((await lines()).slice(0, 2)).toEqual(['1 done 2026-06-16', '2 planned 2026-06-30'])
    await applicator.post(at(`records/${record.id}/amend`)).send({ reason: 'It was the day before', lines: recordOn('2026-06-15').lines }).expect(200)
    expect((await lines()).slice(0, 2)).toEqual(['1 done 2026-06-15', '2 planned 2026-06-29'])
    await applicator.post(at(`records/${record.id}/withdraw`)).send({ reason: 'Written twice' }).expect(200)
    expect((await lines()).slice(0, 2)).toEqual(['1 planned 2026-06-25', '2 planned 2026-07-09'])
  })

  it('keep the record that did them, and what was decided on the next, when an earlier record is entered later', async () => {
    const { stepId } = await newPlan({ firstOn: '2026-06-12', everyDays: 3, earlyDays: 1 })
    const second = `${stepId}.${things.blockId}.2`
    const done = recordOn('2026-06-14')
    await sign(done)
    await manager.post(at(`jobs/${second}/skip`)).send({ revision: 0, reason: 'Rain' }).expect(200)
    await sign(recordOn('2026-06-12'))
    expect((await jobs())[0]).toMatchObject({ number: 1, done: { recordId: done.id, on: '2026-06-14' } })
    expect((await lines()).slice(0, 3)).toEqual(['1 done 2026-06-14', '2 skipped 2026-06-17', '3 planned 2026-06-20'])
  })

  it('keep the record that did them before the plan was made, once something is decided', async () => {
    const done = recordOn('2026-06-14')
    await sign(done)
    const { stepId } = await newPlan({ firstOn: '2026-06-12', everyDays: 3, earlyDays: 1 })
    await manager.post(at(`jobs/${stepId}.${things.blockId}.2/move`)).send({ revision: 0, to: '2026-06-18', acknowledged: [] }).expect(200)
    await sign(recordOn('2026-06-12'))
    expect((await lines()).slice(0, 2)).toEqual(['1 done 2026-06-14', '2 due 2026-06-18'])
  })

  it('are forgotten with a discarded draft; a record names only jobs of its farm', async () => {
    const { first, stepId } = await newPlan()
    const record = recordOn('2026-06-16')
    await applicator.post(at('records')).send({ ...record, jobs: [first] }).expect(201)
    const { id, jobs: _opened, ...content } = record
    await applicator.put(at(`records/${id}`)).send({ ...content, revision: 1, purpose: 'Soil life' }).expect(200)
    expect((await jobs())[0]).toMatchObject({ openRecordId: id })
    await applicator.post(at(`records/${id}/discard`)).send({}).expect(204)
    expect((await jobs())[0]).toMatchObject({ openRecordId: null })
    const refused = await applicator.post(at('records')).send({ ...recordOn('2026-06-16'), jobs: [`${uuidV7()}.${things.blockId}.1`, 'nothing'] })
    expect(faultsOf(refused.body)).toEqual(['jobs.1 id.format'])
    const other = await applicator.post(at('records')).send({ ...recordOn('2026-06-16'), jobs: [`${uuidV7()}.${things.blockId}.1`, `${stepId}.${uuidV7()}.1`] })
    expect(faultsOf(other.body)).toEqual(['jobs.0 job.unknown', 'jobs.1 job.unknown'])
  })

  it('several of one day and step are done by one record over many blocks', async () => {
    const second = buildBlock({ id: uuidV7(), code: 'B2', geometry: squareAt(1) })
    await manager.post(at('blocks')).send(second).expect(201)
    const { stepId } = await newPlan({ blockIds: [things.blockId, second.id] })
    const line = recordOn('2026-06-16').lines[0]
    await sign(recordOn('2026-06-16', { lines: [line, { ...line, blockId: second.id }] }), [`${stepId}.${things.blockId}.1`, `${stepId}.${second.id}.1`])
    expect((await jobs('&state=done')).map(({ blockCode }) => blockCode)).toEqual(['B1', 'B2'])
  })

  it('fall due on the farm’s own civil day, over the night the clocks go back', async () => {
    await newPlan({ firstOn: '2026-11-02', lastOn: '2026-12-31', earlyDays: 0 })
    const first = async () => (await jobs())[0]?.state
    house.setNow('2026-11-02T07:30:00Z')
    // The session of June is over by then.
    manager = await house.as(farm.accounts.manager)
    expect(await first()).toBe('planned')
    house.setNow('2026-11-02T08:30:00Z')
    expect(await first()).toBe('due')
    house.setNow('2026-11-07T08:30:00Z')
    expect(await first()).toBe('late')
  })

  it('are found by window, state and block, page by page', async () => {
    const { id } = await newPlan()
    const inWindow = await jobs('&from=2026-06-29&to=2026-07-31')
    expect(inWindow.map(({ number }) => number)).toEqual([2, 3, 4])
    expect((await jobs('&state=waiting')).map(({ number }) => number)).toEqual([1])
    expect(await jobs(`&blockId=${uuidV7()}`)).toEqual([])
    expect((await jobs(`&planId=${id}`)).length).toBe(6)
    const seen: number[] = []
    let cursor: string | null = ''
    while (cursor !== null) {
      const { body }: { body: { items: Job[]; next: string | null } } = await manager.get(at(`jobs?limit=4${cursor === '' ? '' : `&cursor=${cursor}`}`)).expect(200)
      seen.push(...body.items.map(({ number }) => number))
      cursor = body.next
    }
    expect(seen).toEqual([1, 2, 3, 4, 5, 6])
  })

  it.each([
    { what: 'a window that runs backwards', query: 'from=2026-06-16&to=2026-06-15', errors: ['to date.to_before_from'] },
    { what: 'more than 366 days', query: 'from=2026-06-16&to=2027-06-17', errors: ['to date.window_too_long'] },
    { what: '30 February', query: 'from=2026-02-30&to=2026-03-01', errors: ['from date.invalid'] },
  ])('are not asked about in $what', async ({ query, errors }) => {
    for (const path of ['jobs', 'season-sheet']) expect(faultsOf((await manager.get(at(`${path}?${query}`)).expect(422)).body)).toEqual(errors)
    await manager.get(at('season-sheet?from=2026-06-16&to=2027-06-16')).expect(200)
  })
})

describe('a job', () => {
  it('moves to another day within its days, and back; the day stays when the one before slips', async () => {
    const { first, stepId } = await newPlan()
    const moved = await manager.post(at(`jobs/${first}/move`)).send({ revision: 0, to: '2026-06-18' }).expect(200)
    expect(moved.body).toMatchObject({ id: first, plannedOn: '2026-06-18', isMoved: true, state: 'due', revision: 1 })
    expect((await manager.post(at(`jobs/${first}/move`)).send({ revision: 0, to: '2026-06-18' }).expect(200)).body).toEqual(moved.body)
    expect((await manager.post(at(`jobs/${first}/move`)).send({ revision: 0, to: '2026-06-19' })).body).toMatchObject({ status: 409, code: 'stale', current: { plannedOn: '2026-06-18' } })
    expect((await manager.post(at(`jobs/${first}/move`)).send({ revision: 1, to: null }).expect(200)).body).toMatchObject({ plannedOn: '2026-06-15', isMoved: false, revision: 2 })
    const second = `${stepId}.${things.blockId}.2`
    await manager.post(at(`jobs/${second}/move`)).send({ revision: 0, to: '2026-07-01' }).expect(200)
    await sign(recordOn('2026-06-16'))
    expect((await lines()).slice(0, 3)).toEqual(['1 done 2026-06-16', '2 planned 2026-07-01', '3 planned 2026-07-15'])
  })

  it('moves out of its days only with a reason, and never into the past', async () => {
    const { first } = await newPlan()
    const move = (to: string, acknowledged: object[] = []) => manager.post(at(`jobs/${first}/move`)).send({ revision: 0, to, acknowledged })
    const asked = await move('2026-06-25')
    expect(asked.body).toMatchObject({ status: 422, acknowledgeable: true, errors: [{ path: 'to', code: 'job.outside_window', params: { earliestOn: '2026-06-13', latestOn: '2026-06-19' } }] })
    expect((await move('2026-06-15')).body).toMatchObject({ status: 422, errors: [{ path: 'to', code: 'job.past_day' }] })
    await move('2026-06-25', [{ code: 'job.outside_window', reason: 'The brew is ready on the 25th' }]).expect(200)
    const [entry]: { detail: object }[] = await house.services.database.inFarm({ farmId: farm.id, seasons: null }, (tx) => tx.query("SELECT detail FROM journal WHERE action = 'job.moved'"))
    expect(entry?.detail).toMatchObject({ job: first, block: 'B1', from: '2026-06-15', to: '2026-06-25', acknowledged: [{ reason: 'The brew is ready on the 25th' }] })
  })

  it('is skipped with a reason, which can be taken back; what is done is neither moved nor skipped', async () => {
    const { first } = await newPlan()
    expect(faultsOf((await manager.post(at(`jobs/${first}/skip`)).send({ revision: 0, reason: ' ' }).expect(422)).body)).toEqual(['reason text.required'])
    const skipped = await manager.post(at(`jobs/${first}/skip`)).send({ revision: 0, reason: 'Picking since the 12th' }).expect(200)
    expect(skipped.body).toMatchObject({ state: 'skipped', skip: { reason: 'Picking since the 12th', by: { id: farm.personIds.manager } }, revision: 1 })
    expect((await manager.post(at(`jobs/${first}/skip`)).send({ revision: 0, reason: 'Picking since the 12th' }).expect(200)).body).toEqual(skipped.body)
    expect((await lines()).slice(0, 2)).toEqual(['1 skipped 2026-06-15', '2 planned 2026-06-29'])
    expect((await manager.post(at(`jobs/${first}/move`)).send({ revision: 1, to: '2026-06-18' })).body).toMatchObject({ status: 409, code: 'job.settled' })
    const back = await manager.post(at(`jobs/${first}/unskip`)).send({ revision: 1 }).expect(200)
    expect(back.body).toMatchObject({ state: 'due', skip: null, revision: 2 })
    expect((await manager.post(at(`jobs/${first}/unskip`)).send({ revision: 1 }).expect(200)).body).toEqual(back.body)
    expect((await manager.post(at(`jobs/${first}/unskip`)).send({ revision: 2 })).body).toMatchObject({ status: 409, code: 'job.not_skipped' })
    await sign(recordOn('2026-06-16'))
    expect((await manager.post(at(`jobs/${first}/skip`)).send({ revision: 2, reason: 'Late' })).body).toMatchObject({ status: 409, code: 'job.settled' })
  })

  it.each(['move', 'skip', 'unskip'])('that no plan makes is nowhere: %s', async (deed) => {
    const { stepId } = await newPlan()
    const body = { move: { to: '2026-06-18' }, skip: { reason: 'No' }, unskip: {} }[deed]
    for (const id of [`${stepId}.${things.blockId}.99`, `${stepId}.${uuidV7()}.1`, `${uuidV7()}.${things.blockId}.1`, 'nothing']) {
      await manager.post(at(`jobs/${id}/${deed}`)).send({ revision: 0, ...body }).expect(404)
    }
  })

  it('is opened and read by an applicator, decided by those who lead, and no certifier’s business', async () => {
    const { first } = await newPlan()
    await applicator.get(at('season-sheet?from=2026-06-01&to=2026-06-30')).expect(200)
    await applicator.post(at(`jobs/${first}/skip`)).send({ revision: 0, reason: 'No' }).expect(403)
    const certifier = await house.as(farm.accounts.certifier)
    for (const path of ['jobs', 'season-plans', 'season-sheet?from=2026-06-01&to=2026-06-30']) await certifier.get(at(path)).expect(403)
    const { farmId, seasons, role } = { ...(await farm.actor('certifier')) }
    for (const table of ['season_plans', 'plan_steps', 'plan_jobs', 'plan_job_records']) {
      expect(await house.services.database.inFarm({ farmId, seasons, role }, (tx) => tx.query(`SELECT 1 FROM ${table}`)), table).toEqual([])
    }
  })
})

describe('the season sheet', () => {
  it('holds jobs whose days meet the window, signed work of plans or none with its holds, and harvests', async () => {
    await newPlan()
    const foliar = recordOn('2026-06-14', { method: 'foliar' })
    await sign(foliar)
    await manager.post(at('plantings')).send({ id: uuidV7(), blockId: things.blockId, crop: 'Apple', harvests: [{ from: '2026-06-18', to: '2026-06-30' }, { from: '2026-09-01', to: '2026-09-20' }] }).expect(201)
    const { body } = await applicator.get(at('season-sheet?from=2026-06-10&to=2026-06-20')).expect(200)
    expect(body).toMatchObject({
      today: '2026-06-16', from: '2026-06-10', to: '2026-06-20',
      jobs: [{ number: 1, state: 'due', preparation: 'Nettle ferment', blockCode: 'B1' }],
      works: [{ recordId: foliar.id, number: '2026-0001', blockId: things.blockId, on: '2026-06-14', method: 'foliar', preparations: ['Nettle ferment'], reEntryUntil: null, pickFrom: null }],
      harvests: [{ blockId: things.blockId, from: '2026-06-18', to: '2026-06-30' }],
    })
  })
})
