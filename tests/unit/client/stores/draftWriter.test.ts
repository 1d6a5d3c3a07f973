import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import type { Draft } from '../../../../src/stores/draftTypes.ts'
import { draftWriter } from '../../../../src/stores/draftWriter.ts'
import { MemoryTable } from '../memoryTable.ts'

const here = vi.hoisted(() => ({ device: {} as { drafts: unknown; transaction: unknown } }))
vi.mock('../../../../src/plugins/device.ts', () => ({ device: here.device }))

const typed = (content: object) => ({ id: 'd1', kind: 'record' as const, farmId: 'f', accountId: 'oda', content })
let drafts: MemoryTable<Draft>

beforeEach(() => {
  vi.useFakeTimers({ now: new Date('2026-06-16T06:38:00Z') })
  drafts = new MemoryTable<Draft>('id')
  here.device.drafts = drafts
  here.device.transaction = (_mode: string, _table: unknown, work: () => Promise<void>) => work()
})
afterEach(() => { vi.useRealTimers() })

describe('draftWriter', () => {
  it('writes the last of many keystrokes within 150 ms, once', async () => {
    draftWriter.write(typed({ purpose: 'a' }))
    draftWriter.write(typed({ purpose: 'ab' }))
    await vi.advanceTimersByTimeAsync(150)
    expect(drafts.everPut).toHaveLength(1)
    expect(drafts.rows.get('d1')).toMatchObject({ content: { purpose: 'ab' }, begunAt: '2026-06-16T06:38:00.120Z' })
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
})
