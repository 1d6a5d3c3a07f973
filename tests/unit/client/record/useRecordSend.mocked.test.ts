import { beforeEach, describe, expect, it, vi } from 'vitest'
import { ref } from 'vue'
import { ApiError } from '../../../../src/api/errors.ts'
import { recordApi } from '../../../../src/api/recordApi.ts'
import type { RecordDraft } from '../../../../src/composables/record/recordDraft.ts'
import { useRecordSend } from '../../../../src/composables/record/useRecordSend.ts'
import { buildDraft, buildRecord } from './buildRecord.ts'

const submit = vi.fn()
vi.mock('../../../../src/composables/form/useSubmit.ts', () => ({ useSubmit: () => ({ submit }) }))

const refusal = (over: { code: string; status: number; current?: unknown }): ApiError =>
  new ApiError({ type: 'about:blank', title: 'no', detail: 'no', requestId: 'q', errors: [{ path: 'id', code: over.code, message: 'no' }], ...over })
const sent = (revision: number): unknown => ({ state: 'sent', answer: buildRecord({ revision }) })

function sending(over: Partial<RecordDraft> = {}) {
  const draft = ref(buildDraft(over))
  const send = useRecordSend({ id: 'r1', farmId: () => 'f1', draft, content: () => ({ method: 'foliar', lines: [{ blockId: 'b1' }] }) })
  return { draft, ...send }
}

beforeEach(() => { submit.mockReset() })

describe('sending a record', () => {
  it('makes it once, then writes it over with the revision it was given', async () => {
    submit.mockResolvedValueOnce(sent(1)).mockResolvedValueOnce(sent(2))
    const { save, draft } = sending()
    expect([await save(), await save()]).toEqual(['sent', 'sent'])
    expect(submit.mock.calls.map(([command]) => [command.kind, command.id, command.body.revision])).toEqual([['record.create', 'r1', undefined], ['record.update', 'r1', 1]])
    expect(draft.value.revision).toBe(2)
  })

  it('knows no revision while it is only kept on the device, and does not sign it', async () => {
    submit.mockResolvedValue({ state: 'kept' })
    const { sign, draft } = sending()
    expect(await sign('secret', [])).toBe('kept')
    expect(submit).toHaveBeenCalledTimes(1)
    expect(draft.value.revision).toBeNull()
  })

  it('writes over what it sent before, when that answer never came', async () => {
    const read = vi.spyOn(recordApi, 'read').mockResolvedValue(buildRecord({ revision: 4 }))
    submit.mockRejectedValueOnce(refusal({ code: 'idempotency.mismatch', status: 422 })).mockResolvedValueOnce(sent(5))
    const { save, draft } = sending()
    expect(await save()).toBe('sent')
    expect(read).toHaveBeenCalledWith('f1', 'r1')
    expect(submit.mock.calls[1]?.[0]).toMatchObject({ kind: 'record.update', body: { revision: 4 } })
    expect(draft.value.revision).toBe(5)
  })

  it('tells of a change made elsewhere once, then writes over it', async () => {
    submit.mockRejectedValueOnce(refusal({ code: 'stale', status: 409, current: buildRecord({ revision: 7 }) })).mockResolvedValueOnce(sent(8))
    const { save, draft } = sending({ revision: 3 })
    await expect(save()).rejects.toBeInstanceOf(ApiError)
    expect(draft.value.revision).toBe(7)
    expect(await save()).toBe('sent')
    expect(submit.mock.calls[1]?.[0]).toMatchObject({ body: { revision: 7 } })
  })

  it('sends the password and the reasons with the signature alone', async () => {
    submit.mockResolvedValueOnce(sent(4)).mockResolvedValueOnce(sent(5))
    const { sign } = sending({ revision: 3 })
    await sign('secret', [{ code: 'label.rate', reason: 'late' }])
    expect(JSON.stringify(submit.mock.calls[0])).not.toContain('secret')
    expect(submit.mock.calls[1]?.[0]).toMatchObject({ kind: 'record.sign', body: { password: 'secret', acknowledged: [{ code: 'label.rate', reason: 'late' }] } })
  })
})
