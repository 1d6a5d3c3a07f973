import { ref, shallowRef, watch, type ComputedRef, type Ref, type ShallowRef } from 'vue'
import type { Block } from '../../shared/contract/block.ts'
import { emptyShape, shapeOf, type Shape } from './shape.ts'
import { useDrafts } from './useDrafts.ts'

/** Changes to an outline that are not sent yet: what the device keeps. */
export interface ShapeDraftContent {
  shape: Shape
  /** What the new outline rests on. */
  note: string
  /** The revision of the block that the changes begin from. */
  revision: number
}

/** The changes to one block's outline on this device. */
export interface ShapeDraft {
  content: ShallowRef<ShapeDraftContent>
  /** False until block and device have both answered. */
  ready: Ref<boolean>
  /** True when these changes were begun earlier. */
  resumed: Ref<boolean>
  isBegun: () => boolean
  /** Forgets the changes and begins from the block as it is. */
  discard: () => Promise<void>
}

/** Keeps changes at every step; they survive a reload and leave when they are sent. */
export function useShapeDraft(farmId: Ref<string>, block: ComputedRef<Block | null>): ShapeDraft {
  const drafts = useDrafts(farmId, 'shape')
  const content = shallowRef<ShapeDraftContent>({ shape: emptyShape(), note: '', revision: 0 })
  const ready = ref(false)
  const resumed = ref(false)
  const draftId = (): string => `shape:${block.value?.id ?? ''}`
  const fresh = (from: Block): ShapeDraftContent => ({ shape: shapeOf(from.geometry), note: '', revision: from.revision })
  const isBegun = (): boolean => block.value !== null && !isSame({ ...content.value, revision: 0 }, { ...fresh(block.value), revision: 0 })

  watch([block, drafts.ready], ([found, isListed]) => {
    if (found === null || !isListed || ready.value) return
    const kept = drafts.drafts.value.find(({ id }) => id === draftId())
    resumed.value = kept !== undefined
    content.value = kept === undefined ? fresh(found) : (kept.content as ShapeDraftContent)
    ready.value = true
  }, { immediate: true })

  watch(content, (value) => {
    if (!ready.value) return
    if (isBegun()) drafts.write(draftId(), 'shape', value)
    else void drafts.remove(draftId())
  })

  return {
    content, ready, resumed, isBegun,
    discard: async () => {
      await drafts.remove(draftId())
      resumed.value = false
      if (block.value !== null) content.value = fresh(block.value)
    },
  }
}

const isSame = (one: ShapeDraftContent, other: ShapeDraftContent): boolean => JSON.stringify(one) === JSON.stringify(other)
