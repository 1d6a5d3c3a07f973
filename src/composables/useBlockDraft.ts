import { ref, shallowRef, watch, type Ref, type ShallowRef } from 'vue'
import { emptyBlockDraft, isBlockDraftBegun, type BlockDraftContent, type OutlineBy } from './blockDraftContent.ts'
import { newId } from './newId.ts'
import { useDrafts } from './useDrafts.ts'

/** The one block in the making on this device, for this account and farm. */
export interface BlockDraft {
  /** The id the block will have, made once, so that sending twice makes one block. */
  id: Ref<string>
  content: ShallowRef<BlockDraftContent>
  /** False until the device has said whether a draft was kept. */
  ready: Ref<boolean>
  /** True when this is one begun earlier. */
  resumed: Ref<boolean>
  /** Forgets the draft and begins anew. */
  discard: () => Promise<void>
}

/** A block's draft, kept on the device at every change; it survives a reload and leaves when the block is sent. */
export function useBlockDraft(farmId: Ref<string>, by: OutlineBy): BlockDraft {
  const drafts = useDrafts(farmId, 'block')
  const id = ref(newId())
  const content = shallowRef(emptyBlockDraft(by))
  const ready = ref(false)
  const resumed = ref(false)

  watch([drafts.ready, drafts.drafts], ([isReady, kept]) => {
    if (!isReady || ready.value) return
    const newest = kept[0]
    if (newest !== undefined && !isBlockDraftBegun(content.value)) {
      id.value = newest.id
      content.value = { ...emptyBlockDraft(by), ...(newest.content as BlockDraftContent) }
      resumed.value = true
    }
    ready.value = true
  }, { immediate: true })
  watch(content, (value) => {
    if (!ready.value) return
    if (isBlockDraftBegun(value)) drafts.write(id.value, 'block', value)
    else void drafts.remove(id.value)
  })

  async function discard(): Promise<void> {
    await drafts.remove(id.value)
    id.value = newId()
    content.value = emptyBlockDraft(content.value.by)
    resumed.value = false
  }

  return { id, content, ready, resumed, discard }
}
