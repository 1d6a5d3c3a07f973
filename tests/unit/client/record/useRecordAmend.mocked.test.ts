import { flushPromises } from '@vue/test-utils'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { computed, nextTick, ref } from 'vue'
import type { Material } from '../../../../shared/contract/input.ts'
import type { ApplicationRecord } from '../../../../shared/contract/record.ts'
import { ApiError } from '../../../../src/api/errors.ts'
import { useRecordAmend } from '../../../../src/composables/record/useRecordAmend.ts'
import type { RecordStock } from '../../../../src/composables/record/useRecordStock.ts'
import { inSetup } from '../forms/inSetup.ts'
import { buildBlock, buildComponent, buildRecord } from './buildRecord.ts'

const submit = vi.fn()
vi.mock('../../../../src/composables/form/useSubmit.ts', () => ({ useSubmit: () => ({ submit }) }))
vi.mock('../../../../src/composables/form/useDrafts.ts', () => ({ useDrafts: () => ({ read: () => Promise.resolve(null), write: vi.fn(), remove: () => Promise.resolve() }) }))
const record = ref<ApplicationRecord>()
vi.mock('../../../../src/composables/record/useRecord.ts', () => ({ useRecord: () => ({ data: record, error: ref(null), refetch: vi.fn() }) }))
const material = (id: string, organicStatus: Material['organicStatus']): Material => ({
  id, name: id, kind: 'mineral', measuredIn: 'volume', organicStatus, statusBasis: 'Letter of 3 May', label: null, note: null, revision: 1, createdAt: '2026-01-01T00:00:00Z',
} as Material)
const stock = computed<RecordStock>(() => ({ farmId: 'f1', farm: null, blocks: [buildBlock()], materials: [material('m1', 'prohibited'), material('m2', 'prohibited')], lots: [], sprayers: [], people: [] }))
vi.mock('../../../../src/composables/record/useRecordStock.ts', () => ({ useRecordStock: () => ({ stock, ready: ref(true), error: ref(null), again: vi.fn() }) }))

beforeEach(() => {
  submit.mockReset()
  record.value = buildRecord({
    state: 'signed', number: '2026-0143', version: 1,
    lines: [{ blockId: 'b1', part: { kind: 'whole' }, counts: {}, stage: null, bbch: null, startedAt: '2026-06-16T13:50:00Z', endedAt: '2026-06-16T14:30:00Z', amount: { value: '400', unit: 'L', known: 'measured' } }],
    components: [{ materialId: 'm1', lotId: null, basis: { kind: 'ratio', parts: '20', reading: 'to' }, used: null }],
    acknowledged: [{ code: 'record.stop', reason: 'The wrong drum was opened' }],
  })
})

async function open() {
  const amend = inSetup(() => useRecordAmend('r1'))
  await flushPromises()
  amend.reason.value = 'The second drum was left out'
  amend.signing.password.value = 'a long password'
  return amend
}

describe('an amendment', () => {
  it('asks nothing about a stop that was answered before', async () => {
    const { stops, reasoned } = await open()
    expect([reasoned.value.length, stops.value.length]).toEqual([1, 0])
  })

  it('that brings a stop asks why, whom was told and what was done, beside the answer that stood', async () => {
    const amend = await open()
    amend.draft.value.step = 1
    amend.draft.value.components.push(buildComponent({ key: 'k2', materialId: 'm2', lotId: '' }))
    await nextTick()
    expect(amend.stops.value.map(({ about }) => about)).toEqual(['component:1'])
    await amend.sign()
    expect(submit).not.toHaveBeenCalled()
    expect(amend.draft.value.step).toBe(2)
    expect(Object.keys(amend.errors.value)).toEqual(['stop.why', 'stop.told', 'stop.done'])
    amend.draft.value.stop = { why: 'Mixed up', told: 'The owner', done: 'Washed off' }
    submit.mockResolvedValue({ state: 'sent', answer: record.value })
    await amend.sign()
    const [[command]] = submit.mock.calls as [[{ body: { acknowledged: { code: string; reason: string }[] } }]]
    expect(command.body.acknowledged.map(({ code }) => code)).toEqual(['certifier.status'])
    expect(command.body.acknowledged[0]?.reason).toContain('Washed off')
  })

  it('asks the same three of a stop that the server alone found', async () => {
    const amend = await open()
    const problem = { type: 'about:blank', title: 'no', detail: 'no', requestId: 'q', status: 422, code: 'unlikely', acknowledgeable: true, errors: [{ path: 'component:0', code: 'record.stop', message: 'It was done with a stop' }] }
    submit.mockRejectedValueOnce(new ApiError(problem)).mockResolvedValueOnce({ state: 'sent', answer: record.value })
    await amend.sign()
    await amend.sign()
    expect(submit).toHaveBeenCalledTimes(1)
    amend.draft.value.stop = { why: 'Mixed up', told: 'The owner', done: 'Washed off' }
    await amend.sign()
    expect(submit.mock.calls[1]?.[0]).toMatchObject({ body: { acknowledged: [{ code: 'record.stop', reason: expect.stringContaining('Washed off') }] } })
  })
})
