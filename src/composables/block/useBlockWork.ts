import { computed, watch, type ComputedRef, type Ref } from 'vue'
import { formatPoints } from '../../../shared/geo/formatPoints.ts'
import type { Position } from '../../../shared/geo/geometryTypes.ts'
import type { NamedBoundary } from '../../../shared/geo/findOverlaps.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import { findCautions, type Caution } from './blockCautions.ts'
import type { OutlineBy } from './blockDraftContent.ts'
import { useBlockDraft, type BlockDraft } from './useBlockDraft.ts'
import { firstRing } from './shape.ts'
import { useShape, type ShapeWork } from './useShape.ts'
import { useTypedPoints, type TypedPoints } from './useTypedPoints.ts'

/** A block in the making: its draft, its outline drawn or typed, and what is unlikely about it. */
export interface BlockWork {
  draft: BlockDraft
  outline: ShapeWork
  typed: TypedPoints
  by: ComputedRef<OutlineBy>
  setBy: (by: OutlineBy) => void
  setTyped: (text: string) => void
  /** Exchanges latitude and longitude in every typed line, where longitude seems to come first. */
  swap: () => void
  cautions: ComputedRef<readonly Caution[]>
  isDrawing: ComputedRef<boolean>
}

interface Around {
  farmId: Ref<string>
  by: OutlineBy
  language: () => Language
  others: () => readonly NamedBoundary[]
  farmPlace: () => Position | null
}

/** Joins the draft with its outline; drawn corners can be read as typed points and the other way round. */
export function useBlockWork({ farmId, by, language, others, farmPlace }: Around): BlockWork {
  const draft = useBlockDraft(farmId, by)
  const { content } = draft
  const outline = useShape(content)
  // Words of the form change the content too; only what was typed here is read again.
  const text = computed(() => content.value.typed)
  const typed = useTypedPoints(() => text.value, language)

  watch(typed.points, (points) => {
    if (content.value.by === 'points') outline.typeRing(points)
  })

  watch(draft.ready, (isReady) => { if (isReady) setBy(by) }, { immediate: true })

  function setBy(next: OutlineBy): void {
    if (next === content.value.by) return
    const isUntyped = content.value.typed.trim() === ''
    const fromMap = next === 'points' && (isUntyped || typed.errors.value.length === 0)
    content.value = { ...content.value, by: next, typed: fromMap ? formatPoints([...firstRing(content.value.shape)]) : content.value.typed }
  }

  function setTyped(text: string): void {
    content.value = { ...content.value, typed: text }
  }

  return {
    draft, outline, typed, setBy, setTyped,
    swap: () => { if (typed.swapped.value !== null) setTyped(typed.swapped.value) },
    by: computed(() => content.value.by),
    cautions: computed(() => {
      const geometry = outline.geometry.value
      return geometry === null ? [] : findCautions(geometry, others(), farmPlace())
    }),
    isDrawing: computed(() => content.value.by === 'draw' && content.value.shape.open !== null),
  }
}
