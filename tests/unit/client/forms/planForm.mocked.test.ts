import { beforeEach, describe, expect, it, vi } from 'vitest'
import { nextTick, ref, shallowRef } from 'vue'
import type { SeasonPlan } from '../../../../shared/contract/seasonPlan.ts'
import { usePlanForm, type PlanDraft } from '../../../../src/composables/rounds/usePlanForm.ts'
import { inSetup, laterAnswer, refusalOf, staleWith } from './inSetup.ts'

const submit = vi.fn()
vi.mock('../../../../src/composables/form/useSubmit.ts', () => ({ useSubmit: () => ({ submit }) }))
interface Kept { id: string; content: PlanDraft }
const listed = shallowRef<Kept[]>([])
const drafts = { ready: ref(true), drafts: listed, write: vi.fn(), remove: vi.fn(() => Promise.resolve()) }
vi.mock('../../../../src/composables/form/useDrafts.ts', () => ({ useDrafts: () => drafts }))
beforeEach(() => {
  vi.clearAllMocks()
  submit.mockReset()
  listed.value = []
})

const ID = '01990000-0000-7000-8000-00000000000'
const STEP: SeasonPlan['steps'][number] = {
  id: `${ID}2`, kind: 'application', method: 'drench', materialId: `${ID}3`, basis: { kind: 'ratio', parts: '40', reading: 'to' }, water: null, blockIds: [`${ID}4`], everyDays: 14,
  firstOn: '2026-06-01', lastOn: '2026-08-01', earlyDays: 2, lateDays: 4,
}
const PLAN: SeasonPlan = { id: `${ID}1`, name: 'Nettle', note: null, steps: [STEP], ended: null, revision: 5 }

async function filled() {
  const form = inSetup(() => usePlanForm(null))
  const [step] = form.draft.steps
  if (step === undefined) throw new TypeError('A new plan has a step')
  form.draft.name = 'Comfrey'
  Object.assign(step, { blockIds: [`${ID}4`], firstOn: '2026-06-01', lastOn: '2026-08-01' })
  step.component.materialId = `${ID}3`
  await nextTick()
  return form
}

describe('a season plan', () => {
  it('says at each field of each step what is missing, and sends nothing', async () => {
    const form = inSetup(() => usePlanForm(null))
    expect(await form.save()).toBeNull()
    expect(Object.keys(form.errors.value)).toEqual(expect.arrayContaining(['name', 'steps.0.materialId', 'steps.0.blockIds', 'steps.0.firstOn', 'steps.0.lastOn']))
    expect(submit).not.toHaveBeenCalled()
  })

  it('sends figures as figures, once for two presses, and then forgets what was kept', async () => {
    const form = await filled()
    const slow = laterAnswer({ state: 'sent', answer: {} })
    submit.mockReturnValueOnce(slow.promise)
    const presses = [form.save(), form.save()]
    slow.come()
    expect(await Promise.all(presses)).toEqual(['sent', null])
    expect(submit).toHaveBeenCalledTimes(1)
    expect(submit.mock.calls[0]?.[0]).toMatchObject({
      kind: 'plan.create', id: form.draft.id,
      body: { id: form.draft.id, name: 'Comfrey', note: null, steps: [{ method: 'foliar', materialId: `${ID}3`, basis: { kind: 'ratio', parts: '20' }, water: null, blockIds: [`${ID}4`], everyDays: 14, earlyDays: 2, lateDays: 4 }] },
    })
    await nextTick()
    expect(drafts.remove).toHaveBeenCalled()
  })

  it('writes one that is there over the revision that was seen', async () => {
    const form = inSetup(() => usePlanForm(PLAN))
    submit.mockRejectedValueOnce(refusalOf('steps.0.everyDays', 'Too often.'))
    await form.save()
    expect(submit.mock.calls[0]?.[0]).toMatchObject({ kind: 'plan.update', id: PLAN.id, body: { revision: 5, name: 'Nettle', steps: [{ id: STEP.id, everyDays: 14 }] } })
    expect([form.errors.value, form.refusal.value]).toEqual([{ 'steps.0.everyDays': 'Too often.' }, ''])
    expect(drafts.remove).not.toHaveBeenCalled()
  })
})

describe('a plan that another changed meanwhile', () => {
  it('takes over what was not touched, is kept over the newer revision, and waits while something has to be chosen', async () => {
    const form = inSetup(() => usePlanForm(PLAN))
    form.draft.name = 'Nettle and more'
    submit.mockRejectedValueOnce(staleWith({ ...PLAN, revision: 8, note: 'Early, before the wind' }))
    expect(await form.save()).toBeNull()
    expect([form.draft.name, form.draft.note, form.refusal.value]).toEqual(['Nettle and more', 'Early, before the wind', ''])
    submit.mockRejectedValueOnce(staleWith({ ...PLAN, revision: 9, name: 'Theirs', note: 'Early, before the wind' }))
    expect(await form.save()).toBeNull()
    expect(submit.mock.lastCall?.[0]).toMatchObject({ body: { revision: 8, name: 'Nettle and more' } })
    expect(await form.save()).toBeNull()
    expect(submit).toHaveBeenCalledTimes(2)
    form.merge?.choose('name', 'mine')
    submit.mockResolvedValueOnce({ state: 'sent', answer: {} })
    expect(await form.save()).toBe('sent')
    expect(submit.mock.lastCall?.[0]).toMatchObject({ body: { revision: 9, name: 'Nettle and more' } })
  })
})

describe('what was typed of it', () => {
  it('is kept at every change, and not while nothing was done', async () => {
    const form = inSetup(() => usePlanForm(PLAN))
    await nextTick()
    expect(drafts.write).not.toHaveBeenCalled()
    const [step] = form.draft.steps
    if (step) step.everyDays = '10'
    await nextTick()
    await nextTick()
    expect(drafts.write).toHaveBeenLastCalledWith(`plan::${PLAN.id}@5`, 'plan', expect.objectContaining({ name: 'Nettle', steps: [expect.objectContaining({ everyDays: '10' })] }))
  })

  it('is brought back with its id, and left behind when begun anew', async () => {
    const before = await filled()
    const content = JSON.parse(JSON.stringify(before.draft)) as PlanDraft
    listed.value = [{ id: 'plan::new', content }]
    const form = inSetup(() => usePlanForm(null))
    await nextTick()
    expect([form.resumed.value, form.draft.id, form.draft.name]).toEqual([true, content.id, 'Comfrey'])
    submit.mockResolvedValueOnce({ state: 'kept' })
    expect(await form.save()).toBe('kept')
    expect(submit.mock.calls[0]?.[0].id).toBe(content.id)
    await form.beginAnew()
    expect([form.resumed.value, form.draft.name]).toEqual([false, ''])
  })

  it('over another revision of the plan is not brought back', async () => {
    listed.value = [{ id: `plan::${PLAN.id}@4`, content: { id: PLAN.id, name: 'Older', note: '', steps: [] } }]
    const form = inSetup(() => usePlanForm(PLAN))
    await nextTick()
    expect([form.resumed.value, form.draft.name]).toEqual([false, 'Nettle'])
  })
})
