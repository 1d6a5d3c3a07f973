import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import type { Draft } from '../../../../src/stores/draftTypes.ts'
import type { DraftChannel } from '../../../../src/stores/draftChannel.ts'
import { createDraftWriter } from '../../../../src/stores/draftWriter.ts'
import { MemoryTable } from '../memoryTable.ts'

const here = vi.hoisted(() => ({ device: {} as { drafts: unknown } }))
vi.mock('../../../../src/plugins/device.ts', () => ({ device: here.device }))

const typed = (content: object) => ({ id: 'd1', kind: 'record' as const, farmId: 'f', accountId: 'oda', content })
let drafts: MemoryTable<Draft>
let draftWriter: ReturnType<typeof createDraftWriter>

/** The channel between tabs, at once and in this process: every channel but the one that tells hears it. */
const channels = new Set<DraftChannel>()
function openChannel(): DraftChannel {
  const channel: DraftChannel = {
    onmessage: null,
    postMessage: (data: unknown) => {
      const event = new MessageEvent('message', { data })
      for (const other of channels) if (other !== channel) other.onmessage?.call(other as BroadcastChannel, event)
    },
    close: () => { channels.delete(channel) },
  }
  channels.add(channel)
  return channel
}
const copyOf = (id: string): string | null => localStorage.getItem(`drenchleaf.typing.${id}`)

beforeEach(() => {
  vi.useFakeTimers({ now: new Date('2026-06-16T06:38:00Z') })
  localStorage.clear()
  channels.clear()
  draftWriter = createDraftWriter(openChannel)
  drafts = new MemoryTable<Draft>('id')
  here.device.drafts = drafts
})
afterEach(() => { vi.useRealTimers() })

describe('draftWriter', () => {
  it('writes the last of many keystrokes within 150 ms, once', async () => {
    draftWriter.write(typed({ purpose: 'a' }))
    draftWriter.write(typed({ purpose: 'ab' }))
    await vi.advanceTimersByTimeAsync(150)
    expect(drafts.everPut).toHaveLength(1)
    expect(drafts.rows.get('d1')).toMatchObject({ content: { purpose: 'ab' }, begunAt: '2026-06-16T06:38:00.000Z' })
  })

  it('copies what it is given, so that the form may go on changing it', async () => {
    const content = { purpose: 'as it was' }
    draftWriter.write(typed(content))
    content.purpose = 'changed after'
    await draftWriter.flush()
    expect(drafts.rows.get('d1')?.content).toEqual({ purpose: 'as it was' })
  })

  it('keeps when it was begun', async () => {
    draftWriter.write(typed({}))
    await draftWriter.flush()
    vi.setSystemTime(new Date('2026-06-16T07:00:00Z'))
    draftWriter.write(typed({ purpose: 'x' }))
    await draftWriter.flush()
    expect(drafts.rows.get('d1')).toMatchObject({ begunAt: '2026-06-16T06:38:00.000Z', updatedAt: '2026-06-16T07:00:00.000Z' })
  })

  it('writes at once when the page is left', async () => {
    draftWriter.write(typed({ purpose: 'half a wo' }))
    window.dispatchEvent(new Event('pagehide'))
    await draftWriter.flush()
    expect(drafts.rows.get('d1')?.content).toEqual({ purpose: 'half a wo' })
  })

  it('does not bring back what was removed', async () => {
    draftWriter.write(typed({}))
    await draftWriter.remove('d1')
    await vi.advanceTimersByTimeAsync(300)
    expect(drafts.rows.size).toBe(0)
  })

  it('has each keystroke on the device before the database has it, for a page that is gone at once', async () => {
    draftWriter.write(typed({ purpose: 'half a wo' }))
    expect(drafts.rows.size).toBe(0)
    await createDraftWriter(openChannel).recover()
    expect(drafts.rows.get('d1')).toMatchObject({ accountId: 'oda', content: { purpose: 'half a wo' }, begunAt: '2026-06-16T06:38:00.000Z' })
    expect(copyOf('d1')).toBeNull()
  })

  it('drops the copy once the database has that version, and not before', async () => {
    draftWriter.write(typed({ purpose: 'a' }))
    const written = draftWriter.flush()
    draftWriter.write(typed({ purpose: 'ab' }))
    await written
    expect(copyOf('d1')).toContain('"ab"')
    await draftWriter.flush()
    expect([copyOf('d1'), drafts.rows.get('d1')?.content]).toEqual([null, { purpose: 'ab' }])
  })

  it('takes no older copy over a newer draft', async () => {
    const older = { ...typed({ purpose: 'older' }), begunAt: '2026-06-16T06:00:00.000Z', updatedAt: '2026-06-16T06:00:00.000Z' }
    draftWriter.write(typed({ purpose: 'newer' }))
    await draftWriter.flush()
    localStorage.setItem('drenchleaf.typing.d1', JSON.stringify(older))
    await createDraftWriter(openChannel).recover()
    expect([copyOf('d1'), drafts.rows.get('d1')?.content]).toEqual([null, { purpose: 'newer' }])
  })

  it('removes the copy with the draft', async () => {
    draftWriter.write(typed({}))
    await draftWriter.remove('d1')
    await createDraftWriter(openChannel).recover()
    expect([copyOf('d1'), drafts.rows.size]).toEqual([null, 0])
  })

  it('writes to the database where the device has no room for a copy', async () => {
    const full = vi.spyOn(Storage.prototype, 'setItem').mockImplementation(() => { throw new DOMException('full', 'QuotaExceededError') })
    draftWriter.write(typed({ purpose: 'kept' }))
    await draftWriter.flush()
    full.mockRestore()
    expect(drafts.rows.get('d1')?.content).toEqual({ purpose: 'kept' })
  })

  it('writes again what the database refused once', async () => {
    const put = vi.spyOn(drafts, 'put').mockRejectedValueOnce(new Error('refused'))
    draftWriter.write(typed({ purpose: 'kept' }))
    await expect(draftWriter.flush()).rejects.toThrow('refused')
    expect(draftWriter.isWaiting('d1')).toBe(true)
    await draftWriter.flush()
    put.mockRestore()
    expect(drafts.rows.get('d1')?.content).toEqual({ purpose: 'kept' })
  })

  it('keeps what is typed after the clock was put back', async () => {
    draftWriter.saw({ id: 'd1', updatedAt: '2026-06-16T09:00:00.000Z' })
    draftWriter.write(typed({ purpose: 'later' }))
    await draftWriter.flush()
    expect(drafts.rows.get('d1')?.updatedAt).toBe('2026-06-16T09:00:00.001Z')
  })
})

describe('a draft open in two tabs', () => {
  it('tells the other tab once the draft is on the device, and not itself', async () => {
    const other = createDraftWriter(openChannel)
    const [heardHere, heardThere] = [vi.fn(), vi.fn()]
    const stops = [draftWriter.listen(heardHere), other.listen(heardThere)]
    draftWriter.write(typed({ purpose: 'here' }))
    expect(heardThere).not.toHaveBeenCalled()
    await draftWriter.flush()
    expect(heardThere.mock.calls).toEqual([[{ id: 'd1', updatedAt: '2026-06-16T06:38:00.000Z' }]])
    expect(heardHere).not.toHaveBeenCalled()
    for (const stop of stops) stop()
    expect(channels.size).toBe(0)
  })

  it('lets the words typed last stay, and tells the tab whose words came earlier', async () => {
    const other = createDraftWriter(openChannel)
    const heard = vi.fn()
    draftWriter.listen(heard)
    draftWriter.write(typed({ purpose: 'earlier' }))
    vi.setSystemTime(new Date('2026-06-16T06:38:01Z'))
    other.write(typed({ purpose: 'later' }))
    await other.flush()
    await draftWriter.flush()
    expect(drafts.rows.get('d1')?.content).toEqual({ purpose: 'later' })
    expect(heard).toHaveBeenLastCalledWith({ id: 'd1', updatedAt: '2026-06-16T06:38:01.000Z' })
  })
})
