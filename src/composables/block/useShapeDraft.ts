import { computed, watch, type ComputedRef, type Ref } from 'vue'
import type { Block, Boundary } from '../../../shared/contract/block.ts'
import { isSameOutline } from '../../../shared/geo/isSameOutline.ts'
import { emptyShape, shapeOf, type Shape } from './shape.ts'
import { useKeptForm, type KeptForm } from '../form/useKeptForm.ts'

/** Changes to an outline that are not sent yet: what the device keeps. */
export interface ShapeDraftContent {
  shape: Shape
  /** What the new outline rests on. */
  note: string
  /** The outline that the changes begin from, and its block's revision. */
  from: Boundary | null
  revision: number
}

/** The changes to one block's outline on this device. */
export interface ShapeDraft extends KeptForm<ShapeDraftContent> {
  /** Somebody else has given the block another outline since these changes were begun. */
  isStale: ComputedRef<boolean>
  /** Goes on with these changes over the outline that is there now. */
  goOn: () => void
}

export function useShapeDraft(farmId: Ref<string>, block: ComputedRef<Block | null>): ShapeDraft {
  const fresh = (): ShapeDraftContent | null => {
    const { value: found } = block
    return found === null ? null : { shape: shapeOf(found.geometry), note: '', from: found.geometry, revision: found.revision }
  }
  const isBegun = ({ shape, note, from }: ShapeDraftContent): boolean => note !== '' || (from !== null && JSON.stringify(shape) !== JSON.stringify(shapeOf(from)))
  const kept = useKeptForm<ShapeDraftContent>(
    { shape: emptyShape(), note: '', from: null, revision: 0 }, { farmId, kind: 'shape', about: () => block.value?.id ?? null, fresh, isBegun },
  )
  const { content, ready } = kept
  const isBehind = computed(() => ready.value && block.value !== null && content.value.revision !== block.value.revision)
  const isStale = computed(() => isBehind.value && (content.value.from === null || block.value === null || !isSameOutline(content.value.from, block.value.geometry)))

  function goOn(): void {
    if (block.value !== null) content.value = { ...content.value, from: block.value.geometry, revision: block.value.revision }
  }
  // A new name or crop has nothing to do with the outline.
  watch(isBehind, (isSo) => { if (isSo && !isStale.value) goOn() }, { immediate: true })

  return { ...kept, isStale, goOn }
}
