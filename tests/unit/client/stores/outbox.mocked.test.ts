import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { ApiError, NetworkError } from '../../../../src/api/errors.ts'
import type { KeptCommand } from '../../../../src/stores/keptCommand.ts'
import { useOutbox } from '../../../../src/stores/outbox.ts'
import { useSession } from '../../../../src/stores/session.ts'
import { buildUser } from '../buildUser.ts'
import { MemoryTable } from '../memoryTable.ts'

const here = vi.hoisted(() => ({ device: {} as { outbox: unknown; reads: unknown }, send: vi.fn() }))
vi.mock('../../../../src/plugins/device.ts', () => ({ device: here.device }))
vi.mock('../../../../src/api/commandApi.ts', () => ({ sendCommand: here.send }))

const refusal = (status: number) => new ApiError({ type: 'about:blank', title: 'x', status, code: 'x', detail: 'words', errors: [], requestId: 'r' })
const sprayer = (id: string, name = 'Knapsack') => ({ kind: 'sprayer.create' as const, farmId: 'f', id, body: { id, code: id, name, tankL: '15' } })
const sign = { kind: 'record.sign' as const, farmId: 'f', id: 'r1', body: { password: 'secret words' } }
let outboxTable: MemoryTable<KeptCommand>

function signInAs(id: string): void {
  useSession().accept({ user: buildUser({ id }), memberships: [] })
}

beforeEach(() => {
  outboxTable = new MemoryTable<KeptCommand>('key')
  here.device.outbox = outboxTable
  here.device.reads = new MemoryTable<{ key: string }>('key')
  here.send.mockReset()
  setActivePinia(createPinia())
  signInAs('oda')
})

describe('submit', () => {
  it('writes the command down before it is sent, and forgets it when it is answered', async () => {
    here.send.mockImplementation(() => {
      expect([...outboxTable.rows.keys()]).toEqual(['sprayer.create:s1'])
      return Promise.resolve({ id: 's1' })
    })
    expect(await useOutbox().submit(sprayer('s1'))).toEqual({ state: 'sent', answer: { id: 's1' } })
    expect(outboxTable.rows.size).toBe(0)
    expect(useOutbox().lastSentAt).not.toBeNull()
  })

  it('keeps it without signal and sends it later', async () => {
    here.send.mockRejectedValueOnce(new NetworkError()).mockResolvedValueOnce({ id: 's1' })
    const outbox = useOutbox()
    expect(await outbox.submit(sprayer('s1'))).toEqual({ state: 'kept' })
    expect(outbox.kept).toHaveLength(1)
    await outbox.flush()
    expect(outbox.kept).toHaveLength(0)
    expect(here.send).toHaveBeenCalledTimes(2)
  })

  it.each([401, 429, 503])('keeps it on %i: nothing was decided', async (status) => {
    here.send.mockRejectedValue(refusal(status))
    expect(await useOutbox().submit(sprayer('s1'))).toEqual({ state: 'kept' })
  })

  it('gives a refusal to the caller and keeps nothing', async () => {
    here.send.mockRejectedValue(refusal(422))
    await expect(useOutbox().submit(sprayer('s1'))).rejects.toBeInstanceOf(ApiError)
    expect(outboxTable.rows.size).toBe(0)
  })

  it('never writes a password to the device, whether the signature is sent or not', async () => {
    here.send.mockResolvedValueOnce({ id: 'r1' }).mockRejectedValueOnce(new NetworkError())
    const outbox = useOutbox()
    expect(await outbox.submit(sign)).toEqual({ state: 'sent', answer: { id: 'r1' } })
    await expect(outbox.submit(sign)).rejects.toBeInstanceOf(NetworkError)
    expect(outboxTable.everPut).toEqual([])
  })

  it('replaces what was not sent by a second write of the same thing', async () => {
    here.send.mockRejectedValue(new NetworkError())
    const outbox = useOutbox()
    await outbox.submit(sprayer('s1', 'Knapsack'))
    await outbox.submit(sprayer('s1', 'Big knapsack'))
    expect([...outboxTable.rows.values()].map((row) => row.command.body)).toMatchObject([{ name: 'Big knapsack' }])
  })

  it('sends the older command about the same thing first', async () => {
    here.send.mockRejectedValueOnce(new NetworkError())
    const outbox = useOutbox()
    await outbox.submit({ ...sprayer('s1'), kind: 'sprayer.create' })
    here.send.mockResolvedValue({ id: 's1' })
    const count = { kind: 'lot.count' as const, farmId: 'f', id: 's1', body: { id: 'c1', revision: 1, left: { value: '1', unit: 'L' as const }, reason: 'spilt' } }
    await outbox.submit(count)
    expect(here.send.mock.calls.slice(1).map(([command]: { kind: string }[]) => command?.kind)).toEqual(['sprayer.create', 'lot.count'])
  })

  it('sends a kept command only for the account that wrote it', async () => {
    here.send.mockRejectedValueOnce(new NetworkError())
    const outbox = useOutbox()
    await outbox.submit(sprayer('s1'))
    signInAs('ruan')
    await outbox.flush()
    expect(here.send).toHaveBeenCalledOnce()
    expect(outbox.items).toEqual([])
    expect(outboxTable.rows.size).toBe(1)
  })
})

describe('what is kept', () => {
  it('needs a person when the server refuses it later, and is never dropped by itself', async () => {
    here.send.mockRejectedValueOnce(new NetworkError()).mockRejectedValueOnce(refusal(422))
    const outbox = useOutbox()
    await outbox.submit(sprayer('s1'))
    await outbox.flush()
    expect(outbox.needsYou).toMatchObject([{ problem: { detail: 'words' } }])
    await outbox.flush()
    expect(here.send).toHaveBeenCalledTimes(2)
    here.send.mockResolvedValueOnce({ id: 's1' })
    await outbox.retry('sprayer.create:s1')
    expect(outbox.items).toEqual([])
  })

  it('goes when a person drops it', async () => {
    here.send.mockRejectedValue(new NetworkError())
    const outbox = useOutbox()
    await outbox.submit(sprayer('s1'))
    await outbox.discard('sprayer.create:s1')
    expect(outboxTable.rows.size).toBe(0)
  })

  it('stops at the first that finds no signal', async () => {
    here.send.mockRejectedValue(new NetworkError())
    const outbox = useOutbox()
    await outbox.submit(sprayer('s1'))
    await outbox.submit(sprayer('s2'))
    here.send.mockClear()
    await outbox.flush()
    expect(here.send).toHaveBeenCalledOnce()
    expect(outbox.kept).toHaveLength(2)
  })
})

describe('a retry in the middle of sending', () => {
  it('does not send the same command a second time', async () => {
    let answer: (value: unknown) => void = () => undefined
    here.send.mockReturnValueOnce(new Promise((resolve) => { answer = resolve }))
    const outbox = useOutbox()
    const sending = outbox.submit(sprayer('s1'))
    await vi.waitFor(() => { expect(here.send).toHaveBeenCalledOnce() })
    await outbox.flush()
    answer({ id: 's1' })
    await sending
    expect(here.send).toHaveBeenCalledOnce()
    expect(outboxTable.rows.size).toBe(0)
  })
})
