import { computed, ref, shallowRef, type ComputedRef, type Ref } from 'vue'
import { insertCorner, moveCorner, moveWhole, removeCorner, type CornerAt } from '../../../shared/geo/boundaryCorners.ts'
import type { Boundary, GeometryFinding, Position } from '../../../shared/geo/geometryTypes.ts'
import { isSameCorner } from '../../../shared/geo/isSameCorner.ts'
import { movePosition } from '../../../shared/geo/movePosition.ts'
import { measurePolygon, type PolygonMeasure } from '../../../shared/geo/measurePolygon.ts'
import { findUnder } from './findUnder.ts'
import { boundaryOf, cornersOfShape, isSameAt, judgeShape, shapeOf, type Shape } from './shape.ts'
import { useSteps } from './useSteps.ts'

/** An outline being made or changed: corners set, moved, added and taken, holes cut, and the way back and forth over all of it. */
export interface ShapeWork {
  /** Where the cross stands. */
  cross: Ref<Position | null>
  /** The corner that is chosen, in the list and on the map. */
  chosen: Ref<CornerAt | null>
  /** Whether the chosen corner goes with the cross. */
  isHeld: Ref<boolean>
  /** Moves the cross, and with it the corner that is held. */
  moveCross: (to: Position) => void
  /** Takes up the corner under the cross or sets one into the edge there; lets go of the one that is held. What came of it. */
  pick: (reachM: number) => 'held' | 'added' | 'dropped' | 'nothing'
  /** One step of a drag: the first writes down the way back. */
  drag: (at: CornerAt, to: Position, isFirst: boolean) => void
  insert: (after: CornerAt, position: Position) => void
  remove: (at: CornerAt) => void
  moveBy: (at: CornerAt, eastM: number, northM: number) => void
  moveAll: (eastM: number, northM: number) => void
  /** Takes another outline in one step, as when it is snapped. */
  replace: (geometry: Boundary) => void
  /** Takes the outer ring of the first part as typed; all that is typed one after another is one step. */
  typeRing: (points: readonly Position[]) => void
  /** Begins to set the corners of a hole or another part. */
  open: (as: 'part' | 'hole') => void
  add: (at: Position) => void
  /** Takes the last corner of the ring being set. */
  removeLast: () => void
  /** Closes the ring being set; false where it has too few corners or cannot stand there. */
  finish: () => boolean
  /** Leaves the ring being set. */
  leave: () => void
  undo: () => void
  redo: () => void
  canUndo: ComputedRef<boolean>
  canRedo: ComputedRef<boolean>
  /** The boundary as it would be stored, the open ring in it; null while something is impossible. */
  geometry: ComputedRef<Boundary | null>
  measure: ComputedRef<PolygonMeasure | null>
  findings: ComputedRef<readonly GeometryFinding[]>
}

/** Works on the shape in a draft's content. */
export function useShape<Content extends { shape: Shape }>(content: Ref<Content>): ShapeWork {
  const cross = ref<Position | null>(null) as Ref<Position | null>
  const chosen = shallowRef<CornerAt | null>(null)
  const isHeld = ref(false)
  const here = (): Shape => content.value.shape
  const put = (shape: Shape): void => { content.value = { ...content.value, shape } }
  const steps = useSteps(here, put, letGo)
  let isTyping = false
  function go(shape: Shape): void {
    isTyping = false
    steps.go(shape)
  }
  const check = computed(() => judgeShape(content.value.shape))

  function letGo(): void {
    isTyping = false
    chosen.value = null
    isHeld.value = false
  }
  /** Changes the finished parts in one step, or goes on with the step before. */
  function change(make: (boundary: Boundary) => Boundary | null, isStep = true): void {
    const boundary = boundaryOf(here().parts)
    const next = boundary === null ? null : make(boundary)
    if (next === null) return
    const shape = { ...here(), parts: shapeOf(next).parts }
    if (isStep) go(shape)
    else put(shape)
  }

  function drag(at: CornerAt, to: Position, isFirst: boolean): void {
    change((boundary) => moveCorner(boundary, at, to), isFirst)
  }
  function moveCross(to: Position): void {
    cross.value = to
    if (isHeld.value && chosen.value !== null) drag(chosen.value, to, false)
  }
  function insert(after: CornerAt, position: Position): void {
    change((boundary) => insertCorner(boundary, after, position))
    chosen.value = { ...after, corner: after.corner + 1 }
  }
  function pick(reachM: number): ReturnType<ShapeWork['pick']> {
    if (cross.value === null) return 'nothing'
    if (isHeld.value) {
      isHeld.value = false
      return 'dropped'
    }
    const found = findUnder(here(), cross.value, reachM)
    if (found === null) return 'nothing'
    if (found.isEdge) insert(found.at, cross.value)
    else {
      go(here())
      chosen.value = found.at
      drag(found.at, cross.value, false)
    }
    isHeld.value = true
    return found.isEdge ? 'added' : 'held'
  }

  function add(at: Position): void {
    const { open } = here()
    const last = open?.points.at(-1)
    if (open === null || (last !== undefined && isSameCorner(last, at))) return
    go({ ...here(), open: { ...open, points: [...open.points, at] } })
  }
  function finish(): boolean {
    const { open } = here()
    const { geometry } = check.value
    if (open === null || open.points.length < 3 || geometry === null) return false
    go(shapeOf(geometry))
    return true
  }

  function typeRing(points: readonly Position[]): void {
    const { parts } = here()
    const holes = (parts[0] ?? []).slice(1)
    if (points.length < 3 && (holes.length > 0 || parts.length > 1)) return
    const shape: Shape = points.length < 3
      ? { parts: [], open: { as: 'part', points: [...points] } }
      : { parts: [[[...points], ...holes], ...parts.slice(1)], open: null }
    if (isTyping) put(shape)
    else go(shape)
    isTyping = true
  }

  return {
    cross, chosen, isHeld, moveCross, pick, drag, insert, add, finish, typeRing,
    remove: (at) => {
      change((boundary) => removeCorner(boundary, at))
      letGo()
    },
    moveBy: (at, eastM, northM) => {
      const position = cornersOfShape(here()).find((each) => isSameAt(each.at, at))?.position
      if (position !== undefined) change((boundary) => moveCorner(boundary, at, movePosition(position, eastM, northM)))
    },
    moveAll: (eastM, northM) => { change((boundary) => moveWhole(boundary, eastM, northM)) },
    replace: (geometry) => { go(shapeOf(geometry)) },
    open: (as) => {
      letGo()
      go({ ...here(), open: { as, points: [] } })
    },
    removeLast: () => {
      const { open } = here()
      if (open !== null && open.points.length > 0) go({ ...here(), open: { ...open, points: open.points.slice(0, -1) } })
    },
    leave: () => { if (here().open !== null) go({ ...here(), open: null }) },
    undo: steps.undo, redo: steps.redo, canUndo: steps.canUndo, canRedo: steps.canRedo,
    geometry: computed(() => check.value.geometry),
    measure: computed(() => (check.value.geometry === null ? null : measurePolygon(check.value.geometry))),
    findings: computed(() => check.value.findings),
  }
}
