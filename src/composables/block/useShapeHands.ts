import type { ComputedRef } from 'vue'
import type { CornerAt } from '../../../shared/geo/boundaryCorners.ts'
import type { Position } from '../../../shared/geo/geometryTypes.ts'
import type { MapDraft, MapEdit } from '../map/mapTypes.ts'
import type { Shape } from './shape.ts'
import type { ShapeWork } from './useShape.ts'
import { useShapeMap } from './useShapeMap.ts'
import { useShapeSaid, type ShapeKeys } from './useShapeSaid.ts'

/** What the hands ask of the map. */
export interface ShownMap {
  bringIntoView: (position: Position) => void
  addAtCross: () => void
}

/** An outline under the hands: what the map is given, what it tells, and what the list of corners does. */
export interface ShapeHands {
  keys: ShapeKeys
  edit: ComputedRef<MapEdit>
  draft: ComputedRef<MapDraft | null>
  /** What the map tells of the outline, for `v-on`. */
  told: {
    corner: (at: Position) => void
    cross: (at: Position) => void
    drag: (at: CornerAt, to: Position, isFirst: boolean) => void
    insert: (after: CornerAt, to: Position) => void
    chooseCorner: (at: CornerAt) => void
    pick: (reachM: number) => void
    step: (by: 1 | -1) => void
  }
  /** Chooses a corner in the list and brings it into view. */
  choose: (at: CornerAt) => void
  /** Takes the last corner of the ring being set, else the chosen one. */
  removePoint: () => void
}

/** @param handles whether corners that are there can be moved now. */
export function useShapeHands(work: ShapeWork, shape: () => Shape, map: () => ShownMap | null, handles: () => boolean): ShapeHands {
  const keys = useShapeSaid(work, shape)
  const { edit, draft } = useShapeMap(work, shape, handles)
  return {
    keys, edit, draft,
    told: {
      corner: work.add, cross: work.moveCross, drag: work.drag, insert: work.insert, chooseCorner: keys.choose, pick: keys.pick,
      step: (by) => {
        const corner = keys.step(by)
        if (corner !== undefined) map()?.bringIntoView(corner.position)
      },
    },
    choose: (at) => {
      keys.choose(at)
      if (work.cross.value !== null) map()?.bringIntoView(work.cross.value)
    },
    removePoint: () => { if (shape().open === null) keys.remove(); else work.removeLast() },
  }
}
