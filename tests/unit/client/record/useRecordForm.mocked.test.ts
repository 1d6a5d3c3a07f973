import { flushPromises } from '@vue/test-utils'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { effectScope, ref } from 'vue'
import { ApiError, NetworkError } from '../../../../src/api/errors.ts'
import { recordApi } from '../../../../src/api/recordApi.ts'
import { draftOfRecord, type RecordDraft } from '../../../../src/composables/record/recordDraft.ts'
import { useRecordForm } from '../../../../src/composables/record/useRecordForm.ts'
import type { RecordStock } from '../../../../src/composables/record/useRecordStock.ts'
import { buildDraft, buildRecord } from './buildRecord.ts'

type Kept = { begunAt: string; content: { typed: RecordDraft } }
const drafts = vi.hoisted(() => ({ read: vi.fn(), write: vi.fn(), flush: vi.fn(), remove: vi.fn(), onTakenOver: vi.fn() }))
vi.mock('../../../../src/composables/form/useDrafts.ts', () => ({ useDrafts: () => drafts }))

const stock: RecordStock = { farmId: 'f1', farm: null, blocks: [], sprayers: [], materials: [], lots: [], people: [] }
const kept = (over: Partial<RecordDraft>): Kept => ({ begunAt: '2026-06-16T06:00:00.000Z', content: { typed: buildDraft(over) } })

async function open() {
  const form = effectScope().run(() => useRecordForm({ id: 'r1', fresh: false, likeId: '', blockIds: [], jobIds: [], stock: ref(stock), stockReady: ref(true) }))
  if (form === undefined) throw new TypeError('The form did not open')
  await flushPromises()
  return form
}

beforeEach(() => { vi.resetAllMocks() })

describe('opening a draft', () => {
  it.each(['signed', 'withdrawn'] as const)('drops it where its record is %s and says all of it', async (state) => {
    const record = buildRecord({ state })
    drafts.read.mockResolvedValue(kept({ ...draftOfRecord(record, 'UTC'), lines: [], revision: 3 }))
    vi.spyOn(recordApi, 'read').mockResolvedValue(record)
    const { state: shown } = await open()
    expect(shown.value).toBe('signed')
    expect(drafts.remove).toHaveBeenCalledWith('r1')
  })

  it('keeps what the signed record does not say, and says so', async () => {
    const record = buildRecord({ state: 'signed' })
    const typed = draftOfRecord(record, 'UTC')
    drafts.read.mockResolvedValue(kept({ ...typed, plain: { ...typed.plain, notes: 'Typed after it was signed elsewhere' }, revision: 3 }))
    vi.spyOn(recordApi, 'read').mockResolvedValue(record)
    const { state, draft, overtakenBy } = await open()
    expect([state.value, overtakenBy.value?.number, draft.value.plain.notes]).toEqual(['ready', record.number, 'Typed after it was signed elsewhere'])
    expect(drafts.remove).not.toHaveBeenCalled()
  })

  it.each([
    ['notHere', 'neither the device nor the farm has it', new ApiError({ type: 'about:blank', title: 'Not found', status: 404, code: 'not-found', detail: '', requestId: '', errors: [] })],
    ['unread', 'the farm cannot be asked', new NetworkError()],
  ] as const)('is no empty form but %s where %s', async (shown, _why, error) => {
    drafts.read.mockResolvedValue(null)
    const read = vi.spyOn(recordApi, 'read').mockRejectedValue(error)
    const { state, lookAgain, draft } = await open()
    expect(state.value).toBe(shown)
    draft.value.sprayerId = 's9'
    await flushPromises()
    expect(drafts.write).not.toHaveBeenCalled()
    read.mockResolvedValue(buildRecord({ state: 'started' }))
    await lookAgain()
    expect([state.value, draft.value.step]).toEqual(['ready', 2])
  })

  it('opens it as it is without signal', async () => {
    drafts.read.mockResolvedValue(kept({ revision: 3 }))
    vi.spyOn(recordApi, 'read').mockRejectedValue(new NetworkError())
    const { state, draft } = await open()
    expect([state.value, draft.value.water.value]).toEqual(['ready', '750'])
    expect(drafts.remove).not.toHaveBeenCalled()
  })

  it('asks nobody about a record the server never had', async () => {
    drafts.read.mockResolvedValue(kept({}))
    const read = vi.spyOn(recordApi, 'read')
    expect((await open()).state.value).toBe('ready')
    expect(read).not.toHaveBeenCalled()
  })
})

describe('a draft that another tab types in', () => {
  it('is shown as it was typed there, and not written back', async () => {
    drafts.read.mockResolvedValue(kept({}))
    const { draft } = await open()
    const take = drafts.onTakenOver.mock.calls[0]?.[1] as (found: Kept) => void
    take(kept({ sprayerId: 's2' }))
    await flushPromises()
    expect(draft.value.sprayerId).toBe('s2')
    expect(drafts.write).not.toHaveBeenCalled()
    draft.value.sprayerId = 's3'
    await flushPromises()
    expect(drafts.write.mock.calls[0]).toMatchObject(['r1', 'record', { typed: { sprayerId: 's3' } }])
  })

  it('is left alone once it is signed here', async () => {
    drafts.read.mockResolvedValue(kept({}))
    const { draft, discard } = await open()
    await discard()
    const take = drafts.onTakenOver.mock.calls[0]?.[1] as (found: Kept) => void
    take(kept({ sprayerId: 's2' }))
    expect(draft.value.sprayerId).toBe('')
  })
})
