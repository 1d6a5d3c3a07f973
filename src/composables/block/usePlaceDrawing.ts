import { computed, ref, shallowRef, watch, type ComputedRef, type Ref, type ShallowRef } from 'vue'
import { checkPlace } from '../../../shared/geo/checkPlace.ts'
import { cornersOfPlace } from '../../../shared/geo/cornersOfPlace.ts'
import { formatPoints } from '../../../shared/geo/formatPoints.ts'
import type { GeometryFinding, PlaceGeometry, Position } from '../../../shared/geo/geometryTypes.ts'
import { isSameCorner } from '../../../shared/geo/isSameCorner.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import { useSteps } from './useSteps.ts'
import { useTypedPoints, type TypedPoints } from './useTypedPoints.ts'

/** How something on the ground is drawn. */
export type PlaceShape = 'point' | 'line' | 'area'

/** A point, a line or an outline in the making, drawn or typed, with the way back and forth. */
export interface PlaceDrawing {
  shape: ComputedRef<PlaceShape>
  points: ShallowRef<readonly Position[]>
  by: Ref<'draw' | 'points'>
  text: Ref<string>
  typed: TypedPoints
  /** Where the cross stands. */
  cross: ShallowRef<Position | null>
  geometry: ComputedRef<PlaceGeometry | null>
  /** What is impossible about it; nothing while there are too few points. */
  findings: ComputedRef<readonly GeometryFinding[]>
  setShape: (shape: PlaceShape) => void
  setBy: (by: 'draw' | 'points') => void
  add: (at: Position) => void
  removeLast: () => void
  undo: () => void
  redo: () => void
  canUndo: ComputedRef<boolean>
  canRedo: ComputedRef<boolean>
  swap: () => void
  /** What is drawn and typed, as the device keeps it, and that taken up again. */
  kept: ComputedRef<KeptDrawing>
  resume: (kept: KeptDrawing) => void
}

export interface KeptDrawing { shape: PlaceShape; points: readonly Position[]; by: 'draw' | 'points'; text: string; changed: boolean }

export const LEAST_POINTS: Record<PlaceShape, number> = { point: 1, line: 2, area: 3 }
const SHAPES = { Point: 'point', LineString: 'line', Polygon: 'area' } as const

export function usePlaceDrawing(start: { geometry: PlaceGeometry | null; shape: PlaceShape }, language: () => Language): PlaceDrawing {
  const shape = ref<PlaceShape>(start.geometry === null ? start.shape : SHAPES[start.geometry.type])
  const points = shallowRef<readonly Position[]>(start.geometry === null ? [] : cornersOfPlace(start.geometry))
  const cross = shallowRef<Position | null>(null)
  const by = ref<'draw' | 'points'>('draw')
  const text = ref('')
  const typed = useTypedPoints(() => text.value, language)
  const changed = ref(false)
  const steps = useSteps(() => points.value, (next) => { points.value = next })
  const kept = computed(() => (shape.value === 'point' ? points.value.slice(-1) : points.value))
  const check = computed(() => (kept.value.length < LEAST_POINTS[shape.value] ? { geometry: null, findings: [] } : checkPlace(built(shape.value, kept.value))))

  function go(next: readonly Position[]): void {
    steps.go(next)
    changed.value = true
  }

  watch(typed.points, (read) => {
    if (by.value === 'points') go([...read])
  })

  return {
    shape: computed(() => shape.value), points, by, text, typed, cross,
    // What is not touched keeps its holes and every decimal.
    geometry: computed(() => (!changed.value && start.geometry !== null && SHAPES[start.geometry.type] === shape.value ? start.geometry : check.value.geometry)),
    findings: computed(() => check.value.findings),
    setShape: (next) => { shape.value = next },
    setBy: (next) => {
      if (next === 'points' && by.value === 'draw') text.value = formatPoints([...kept.value])
      by.value = next
    },
    add: (at) => {
      const last = points.value.at(-1)
      if (last !== undefined && isSameCorner(last, at)) return
      go(shape.value === 'point' ? [at] : [...points.value, at])
    },
    removeLast: () => { if (points.value.length > 0) go(points.value.slice(0, -1)) },
    kept: computed(() => ({ shape: shape.value, points: points.value, by: by.value, text: text.value, changed: changed.value })),
    resume: (kept) => {
      [shape.value, points.value, by.value, text.value, changed.value] = [kept.shape, kept.points, kept.by, kept.text, kept.changed]
    },
    undo: steps.undo, redo: steps.redo, canUndo: steps.canUndo, canRedo: steps.canRedo,
    swap: () => { if (typed.swapped.value !== null) text.value = typed.swapped.value },
  }
}

function built(shape: PlaceShape, points: readonly Position[]): unknown {
  if (shape === 'point') return { type: 'Point', coordinates: points[0] }
  return shape === 'line' ? { type: 'LineString', coordinates: points } : { type: 'Polygon', coordinates: [[...points, points[0]]] }
}
