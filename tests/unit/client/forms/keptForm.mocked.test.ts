import { beforeEach, describe, expect, it, vi } from 'vitest'
import { nextTick, ref, shallowRef } from 'vue'
import { useKeptForm, type KeptForm } from '../../../../src/composables/form/useKeptForm.ts'
import { inSetup } from './inSetup.ts'

interface Line { points: readonly number[] }
const listed = shallowRef<{ id: string; content: Line }[]>([])
const drafts = { ready: ref(false), drafts: listed, write: vi.fn(), remove: vi.fn(() => Promise.resolve()) }
vi.mock('../../../../src/composables/form/useDrafts.ts', () => ({ useDrafts: () => drafts }))
beforeEach(() => {
  vi.clearAllMocks()
  listed.value = []
  drafts.ready.value = false
})

const NOTHING: Line = { points: [] }
const open = (fresh: () => Line | null): KeptForm<Line> =>
  inSetup(() => useKeptForm(NOTHING, { farmId: ref('f1'), kind: 'split', about: () => 'b1', fresh, isBegun: ({ points }) => points.length > 0 }))

async function answer(): Promise<void> {
  drafts.ready.value = true
  await nextTick()
}

describe('a form kept on the device', () => {
  it('keeps what a hand did before the device had answered, and writes it', async () => {
    const form = open(() => NOTHING)
    form.content.value = { points: [1] }
    await nextTick()
    expect(drafts.write).not.toHaveBeenCalled()
    await answer()
    expect([form.content.value, form.resumed.value]).toEqual([{ points: [1] }, false])
    expect(drafts.write).toHaveBeenCalledWith('split::b1', 'split', { points: [1] })
    form.content.value = { points: [1, 2] }
    await nextTick()
    expect(drafts.write).toHaveBeenLastCalledWith('split::b1', 'split', { points: [1, 2] })
  })

  it('goes on with what was begun earlier, whatever a hand did meanwhile', async () => {
    listed.value = [{ id: 'split::b1', content: { points: [7, 8, 9] } }]
    const form = open(() => NOTHING)
    form.content.value = { points: [1] }
    await answer()
    expect([form.content.value, form.resumed.value]).toEqual([{ points: [7, 8, 9] }, true])
  })

  it('begins from what it rests on once that is read', async () => {
    const read = shallowRef<Line | null>(null)
    const form = open(() => read.value)
    await answer()
    expect(form.ready.value).toBe(false)
    read.value = { points: [4] }
    await nextTick()
    expect([form.content.value, form.ready.value]).toEqual([{ points: [4] }, true])
  })
})
