import { ref, shallowRef, watch, type Ref, type ShallowRef } from 'vue'
import type { Draft } from '../../stores/draftTypes.ts'
import { emptyBlockDraft, isBlockDraftBegun, readBlockDraft, type BlockDraftContent, type OutlineBy } from './blockDraftContent.ts'
import { newId } from '../form/newId.ts'
import { useDrafts } from '../form/useDrafts.ts'

/** The one block in the making on this device, for this account and farm. */
export interface BlockDraft {
  /** The id the block will have, made once, so that sending twice makes one block. */
  id: Ref<string>
  content: ShallowRef<BlockDraftContent>
  /** False until the device has said whether a draft was kept. */
  ready: Ref<boolean>
  /** True when this is one begun earlier, or in another tab. */
  resumed: Ref<boolean>
  /** Forgets the draft and begins anew. */
  discard: () => Promise<void>
}

/**
 * A block's draft, kept on the device at every change; it survives a reload and leaves when the block is sent.
 * Tabs of one device work on the same draft: what one types the others show, and when one is done with it all begin anew.
 */
export function useBlockDraft(farmId: Ref<string>, by: OutlineBy): BlockDraft {
  const drafts = useDrafts(farmId, 'block')
  const id = ref(newId())
  const content = shallowRef(emptyBlockDraft(by))
  const ready = ref(false)
  const resumed = ref(false)
  /** The content as the device has it: what another tab typed is not written back. */
  let keptText = ''
  /** Whether the device listed the draft as it was last typed here. */
  let isListed = false

  function show(shown: BlockDraftContent): void {
    keptText = JSON.stringify(shown)
    content.value = shown
  }
  function resume(found: Draft<BlockDraftContent>): void {
    id.value = found.id
    resumed.value = true
    show(readBlockDraft(found.content, by))
  }
  function beginAnew(): void {
    id.value = newId()
    resumed.value = false
    isListed = false
    show(emptyBlockDraft(content.value.by))
  }

  watch([drafts.ready, drafts.drafts], ([isReady, kept]) => {
    if (!isReady) return
    const newest = kept[0]
    const isHere = (): boolean => kept.some((draft) => draft.id === id.value)
    if (newest !== undefined && !isHere() && !isBlockDraftBegun(content.value)) resume(newest as Draft<BlockDraftContent>)
    else if (!isHere() && isListed) beginAnew()
    isListed = isHere()
    if (ready.value) return
    ready.value = true
    // A hand is faster than a slow device.
    if (!isListed && isBlockDraftBegun(content.value)) keep(content.value)
  }, { immediate: true })

  function keep(value: BlockDraftContent): void {
    keptText = JSON.stringify(value)
    isListed = false
    if (isBlockDraftBegun(value)) drafts.write(id.value, 'block', value)
    else void drafts.remove(id.value)
  }
  watch(content, (value) => { if (ready.value && JSON.stringify(value) !== keptText) keep(value) })

  drafts.onTakenOver<BlockDraftContent>(id, ({ content: typed }) => { show(readBlockDraft(typed, by)) })

  async function discard(): Promise<void> {
    isListed = false
    await drafts.remove(id.value)
    beginAnew()
  }

  return { id, content, ready, resumed, discard }
}
