import { computed, ref, type ComputedRef, type Ref } from 'vue'
import { checkBoundary } from '../../shared/geo/checkBoundary.ts'
import type { Boundary, GeometryFinding, Position } from '../../shared/geo/geometryTypes.ts'
import { measurePolygon, type PolygonMeasure } from '../../shared/geo/measurePolygon.ts'
import { outlineOf, type BlockDraftContent } from './blockDraftContent.ts'
import { isSameCorner } from '../../shared/geo/isSameCorner.ts'
import { useSteps } from './useSteps.ts'

/** An outline in the making: its corners, the way back and forth, and what it measures. */
export interface Outline {
  /** Where the cross stands. */
  cross: Ref<Position | null>
  add: (at: Position) => void
  removeLast: () => void
  undo: () => void
  redo: () => void
  canUndo: ComputedRef<boolean>
  canRedo: ComputedRef<boolean>
  /** Replaces all corners at once, as when they are typed. */
  replace: (points: readonly Position[]) => void
  finish: () => void
  reopen: () => void
  /** The boundary, cleaned and oriented; null while something is impossible. */
  geometry: ComputedRef<Boundary | null>
  measure: ComputedRef<PolygonMeasure | null>
  findings: ComputedRef<readonly GeometryFinding[]>
}

/** Works on the corners of a draft's content; under three corners nothing is measured and nothing is found. */
export function useOutline(content: Ref<BlockDraftContent>): Outline {
  const cross = ref<Position | null>(null) as Ref<Position | null>
  const steps = useSteps<Pick<BlockDraftContent, 'points' | 'closed'>>(
    () => ({ points: content.value.points, closed: content.value.closed }),
    (step) => { content.value = { ...content.value, ...step } },
  )
  const corners = computed(() => content.value.points)
  const check = computed(() => {
    const outline = outlineOf(corners.value)
    return outline === null ? { geometry: null, findings: [] } : checkBoundary(outline)
  })
  const geometry = computed(() => check.value.geometry)

  function add(at: Position): void {
    const { points, closed } = content.value
    const last = points.at(-1)
    if (closed || (last !== undefined && isSameCorner(last, at))) return
    steps.go({ points: [...points, at], closed: false })
  }
  function removeLast(): void {
    const { points } = content.value
    if (points.length > 0) steps.go({ points: points.slice(0, -1), closed: false })
  }
  function finish(): void {
    const { points } = content.value
    const [first, last] = [points[0], points.at(-1)]
    if (first === undefined || last === undefined || points.length < 3) return
    // Someone who walked back to the first corner meant to close there.
    steps.go({ points: isSameCorner(first, last) ? points.slice(0, -1) : points, closed: true })
  }

  return {
    cross, add, removeLast, finish,
    undo: steps.undo, redo: steps.redo, canUndo: steps.canUndo, canRedo: steps.canRedo,
    replace: (points) => { content.value = { ...content.value, points: [...points], closed: points.length > 2 } },
    reopen: () => { steps.go({ points: content.value.points, closed: false }) },
    geometry,
    measure: computed(() => (geometry.value === null ? null : measurePolygon(geometry.value))),
    findings: computed(() => check.value.findings),
  }
}
