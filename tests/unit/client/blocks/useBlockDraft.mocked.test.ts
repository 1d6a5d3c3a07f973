import { beforeEach, describe, expect, it, vi } from 'vitest'
import { effectScope, nextTick, ref, shallowRef, type Ref } from 'vue'
import { emptyBlockDraft, type BlockDraftContent } from '../../../../src/composables/block/blockDraftContent.ts'
import { useBlockDraft, type BlockDraft } from '../../../../src/composables/block/useBlockDraft.ts'

type Kept = { id: string; content: BlockDraftContent }
const listed = shallowRef<Kept[]>([])
const drafts = { ready: ref(true), drafts: listed, write: vi.fn(), remove: vi.fn(() => Promise.resolve()), onTakenOver: vi.fn() }
vi.mock('../../../../src/composables/form/useDrafts.ts', () => ({ useDrafts: () => drafts }))

const begun = (code: string): BlockDraftContent => ({ ...emptyBlockDraft('draw'), code })
function open(): BlockDraft {
  const draft = effectScope().run(() => useBlockDraft(ref('f1'), 'draw'))
  if (draft === undefined) throw new TypeError('The draft did not open')
  return draft
}
/** What another tab typed, as the device tells it. */
function hear(content: BlockDraftContent): void {
  const take = drafts.onTakenOver.mock.calls.at(-1)?.[1] as (found: Pick<Kept, 'content'>) => void
  take({ content })
}
const followed = (): string => (drafts.onTakenOver.mock.calls.at(-1)?.[0] as Ref<string>).value

beforeEach(() => {
  vi.clearAllMocks()
  listed.value = []
  drafts.ready.value = true
})

describe('a block in the making', () => {
  it('shows what another tab typed and does not write it back', async () => {
    listed.value = [{ id: 'd1', content: begun('N') }]
    const { id, content } = open()
    expect([id.value, followed()]).toEqual(['d1', 'd1'])
    hear(begun('N2'))
    await nextTick()
    expect(content.value.code).toBe('N2')
    expect(drafts.write).not.toHaveBeenCalled()
    content.value = begun('N3')
    await nextTick()
    expect(drafts.write).toHaveBeenCalledWith('d1', 'block', begun('N3'))
  })

  it('takes up one begun in another tab while nothing is begun here', async () => {
    const { id, content, resumed } = open()
    listed.value = [{ id: 'd2', content: begun('B') }]
    await nextTick()
    expect([id.value, content.value.code, resumed.value, followed()]).toEqual(['d2', 'B', true, 'd2'])
    expect(drafts.write).not.toHaveBeenCalled()
  })

  it('keeps what was drawn before the device had answered', async () => {
    drafts.ready.value = false
    const { id, content } = open()
    content.value = begun('early')
    await nextTick()
    expect(drafts.write).not.toHaveBeenCalled()
    drafts.ready.value = true
    await nextTick()
    expect(content.value.code).toBe('early')
    expect(drafts.write).toHaveBeenCalledWith(id.value, 'block', begun('early'))
  })

  it('leaves what is begun here alone', async () => {
    const { id, content } = open()
    const before = id.value
    content.value = begun('mine')
    await nextTick()
    listed.value = [{ id: 'd2', content: begun('B') }]
    await nextTick()
    expect([id.value, content.value.code]).toEqual([before, 'mine'])
  })

  it('begins anew when another tab has sent it or dropped it', async () => {
    listed.value = [{ id: 'd1', content: begun('N') }]
    const { id, content } = open()
    listed.value = []
    await nextTick()
    expect(content.value.code).toBe('')
    expect(id.value).not.toBe('d1')
    expect(drafts.remove).not.toHaveBeenCalled()
  })

  it('is not begun anew by the list being behind what is typed', async () => {
    listed.value = [{ id: 'd1', content: begun('N') }]
    const { id, content } = open()
    content.value = emptyBlockDraft('draw')
    await nextTick()
    content.value = begun('again')
    await nextTick()
    listed.value = []
    await nextTick()
    expect([id.value, content.value.code]).toEqual(['d1', 'again'])
  })
})
