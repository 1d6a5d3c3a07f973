import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { ApiError, NetworkError } from '../../../../src/api/errors.ts'
import type { FileToSend } from '../../../../src/api/fileApi.ts'
import { useFileQueue } from '../../../../src/stores/fileQueue.ts'
import type { KeptCommand } from '../../../../src/stores/keptCommand.ts'
import type { KeptFile } from '../../../../src/stores/keptFile.ts'
import { useOutbox } from '../../../../src/stores/outbox.ts'
import { useSession } from '../../../../src/stores/session.ts'
import { buildUser } from '../buildUser.ts'
import { MemoryTable } from '../memoryTable.ts'

const here = vi.hoisted(() => ({ device: {} as Record<string, unknown>, api: { add: vi.fn(), list: vi.fn(), remove: vi.fn() }, send: vi.fn() }))
vi.mock('../../../../src/plugins/device.ts', () => ({ device: here.device }))
vi.mock('../../../../src/api/fileApi.ts', () => ({ fileApi: here.api }))
vi.mock('../../../../src/api/commandApi.ts', () => ({ sendCommand: here.send }))

const refusal = (status: number) => new ApiError({ type: 'about:blank', title: 'x', status, code: 'x', detail: 'words', errors: [], requestId: 'r' })
const photo = (id: string, recordId = 'r1'): FileToSend => ({ id, farmId: 'f', recordId, kind: 'photo', name: `${id}.jpg`, content: new Blob(['x'], { type: 'image/jpeg' }) })
let files: MemoryTable<KeptFile>
let drafts: MemoryTable<{ id: string }>

beforeEach(() => {
  files = new MemoryTable<KeptFile>('id')
  drafts = new MemoryTable<{ id: string }>('id')
  Object.assign(here.device, { files, drafts, outbox: new MemoryTable<KeptCommand>('key'), reads: new MemoryTable<{ key: string }>('key') })
  for (const call of [here.api.add, here.api.list, here.api.remove, here.send]) call.mockReset()
  here.api.add.mockResolvedValue({ id: 'a' })
  setActivePinia(createPinia())
  useSession().accept({ user: buildUser({ id: 'oda' }), memberships: [] })
})

describe('a file of a record that the server has', () => {
  it('is on this device before it is sent, and off it when the server has it', async () => {
    here.api.add.mockImplementation((item: KeptFile, onProgress: (share: number) => void) => {
      expect([...files.rows.keys()]).toEqual(['a'])
      onProgress(0.5)
      expect(useFileQueue().progress).toEqual({ a: 0.5 })
      return Promise.resolve(item)
    })
    const queue = useFileQueue()
    expect(await queue.add([photo('a')], true)).toBe(true)
    await queue.flush()
    expect(files.rows.size).toBe(0)
    expect(queue.progress).toEqual({})
  })

  it('stays without signal and goes later, once', async () => {
    here.api.add.mockRejectedValueOnce(new NetworkError())
    const queue = useFileQueue()
    await queue.add([photo('a'), photo('b')], true)
    await queue.flush()
    expect(queue.kept).toHaveLength(2)
    await queue.flush()
    expect(queue.items).toEqual([])
    expect(here.api.add.mock.calls.map(([item]: { id: string }[]) => item?.id)).toEqual(['a', 'a', 'b'])
  })

  it.each([401, 429, 503])('stays on %i, and says why', async (status) => {
    here.api.add.mockRejectedValue(refusal(status))
    const queue = useFileQueue()
    await queue.add([photo('a')], true)
    await queue.flush()
    expect(queue.kept).toMatchObject([{ id: 'a', problem: { detail: 'words' } }])
  })

  it('needs a person when it is refused, holds up no other, and goes again when asked to', async () => {
    here.api.add.mockRejectedValueOnce(refusal(415))
    const queue = useFileQueue()
    await queue.add([photo('a'), photo('b')], true)
    await queue.flush()
    expect(queue.needsYou).toMatchObject([{ id: 'a', problem: { detail: 'words' } }])
    await queue.retry('a')
    expect(queue.items).toEqual([])
  })

  it('taken back while it goes, it is taken back at the server too', async () => {
    const queue = useFileQueue()
    here.api.add.mockImplementation(async () => { await queue.discard('a'); return { id: 'a' } })
    await queue.add([photo('a')], true)
    await queue.flush()
    expect(here.api.remove).toHaveBeenCalledExactlyOnceWith('f', 'a')
  })

  it('that this device has no room for is sent all the same', async () => {
    files.put = () => Promise.reject(new DOMException('full', 'QuotaExceededError'))
    const queue = useFileQueue()
    here.api.add.mockRejectedValueOnce(new NetworkError())
    expect(await queue.add([photo('a')], true)).toBe(false)
    await queue.flush()
    expect(queue.kept).toHaveLength(1)
    await queue.flush()
    expect(queue.items).toEqual([])
  })
})

describe('a file of a record that is still on this device', () => {
  it('waits for it, asks nobody, and goes when the record is sent', async () => {
    const queue = useFileQueue()
    queue.start()
    await queue.add([photo('a')], false)
    await queue.flush()
    expect([here.api.list.mock.calls.length, here.api.add.mock.calls.length]).toEqual([0, 0])
    here.send.mockResolvedValue({ id: 'r1' })
    await useOutbox().submit({ kind: 'record.create', farmId: 'f', id: 'r1', body: { id: 'r1', method: 'foliar', lines: [] } })
    await vi.waitFor(() => expect(queue.items).toEqual([]))
    expect(here.api.add).toHaveBeenCalledOnce()
  })

  it('goes before the signature: sendOf says how many are left', async () => {
    const queue = useFileQueue()
    await queue.add([photo('a'), photo('b'), photo('c', 'other')], false)
    here.api.add.mockRejectedValueOnce(refusal(422))
    expect(await queue.sendOf('r1')).toBe(1)
    expect(queue.items.map(({ id }) => id)).toEqual(['a', 'c'])
  })

  it('after a start it is asked for once; dropped with its record where nobody has it any more', async () => {
    const base = { accountId: 'oda', keptAt: '2026-06-16T00:00:00Z', state: 'kept' as const, problem: null, recordSeen: false }
    for (const id of ['there', 'typed', 'dropped']) await files.put({ ...photo(id, `r-${id}`), ...base })
    await drafts.put({ id: 'r-typed' })
    here.api.list.mockImplementation((_farm: string, record: string) => (record === 'r-there' ? Promise.resolve({ items: [], next: null }) : Promise.reject(refusal(404))))
    const queue = useFileQueue()
    queue.start()
    await vi.waitFor(() => expect(queue.items.map(({ id }) => id)).toEqual(['typed']))
    expect(here.api.add.mock.calls.map(([item]: { id: string }[]) => item?.id)).toEqual(['there'])
  })
})
