import { computed, ref, shallowRef, watch, type ComputedRef, type Ref, type ShallowRef } from 'vue'
import { checkPlace } from '../../shared/geo/checkPlace.ts'
import { cornersOfPlace } from '../../shared/geo/cornersOfPlace.ts'
import { formatPoints } from '../../shared/geo/formatPoints.ts'
import type { GeometryFinding, PlaceGeometry, Position } from '../../shared/geo/geometryTypes.ts'
import { isSameCorner } from '../../shared/geo/isSameCorner.ts'
import type { Language } from '../../shared/messages/translate.ts'
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
}

export const LEAST_POINTS: Record<PlaceShape, number> = { point: 1, line: 2, area: 3 }
const SHAPES = { Point: 'point', LineString: 'line', Polygon: 'area' } as const

export function usePlaceDrawing(start: { geometry: PlaceGeometry | null; shape: PlaceShape }, language: () => Language): PlaceDrawing {
  const shape = ref<PlaceShape>(start.geometry === null ? start.shape : SHAPES[start.geometry.type])
  const points = shallowRef<readonly Position[]>(start.geometry === null ? [] : cornersOfPlace(start.geometry))
  const cross = shallowRef<Position | null>(null)
  const by = ref<'draw' | 'points'>('draw')
  const text = ref('')
  const typed = useTypedPoints(() => text.value, language)
  const past = shallowRef<readonly (readonly Position[])[]>([])
  const future = shallowRef<readonly (readonly Position[])[]>([])
  const changed = ref(false)
  const kept = computed(() => (shape.value === 'point' ? points.value.slice(-1) : points.value))
  const check = computed(() => (kept.value.length < LEAST_POINTS[shape.value] ? { geometry: null, findings: [] } : checkPlace(built(shape.value, kept.value))))

  watch(typed.points, (read) => {
    if (by.value === 'points') go([...read])
  })

  function go(next: readonly Position[]): void {
    past.value = [...past.value, points.value]
    future.value = []
    points.value = next
    changed.value = true
  }
  function step(from: ShallowRef<readonly (readonly Position[])[]>, to: ShallowRef<readonly (readonly Position[])[]>): void {
    const next = from.value.at(-1)
    if (next === undefined) return
    from.value = from.value.slice(0, -1)
    to.value = [...to.value, points.value]
    points.value = next
  }

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
    undo: () => { step(past, future) },
    redo: () => { step(future, past) },
    canUndo: computed(() => past.value.length > 0),
    canRedo: computed(() => future.value.length > 0),
    swap: () => { if (typed.swapped.value !== null) text.value = typed.swapped.value },
  }
}

function built(shape: PlaceShape, points: readonly Position[]): unknown {
  if (shape === 'point') return { type: 'Point', coordinates: points[0] }
  return shape === 'line' ? { type: 'LineString', coordinates: points } : { type: 'Polygon', coordinates: [[...points, points[0]]] }
}
