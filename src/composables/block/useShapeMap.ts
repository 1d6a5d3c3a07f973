import { computed, type ComputedRef } from 'vue'
import type { CornerAt } from '../../../shared/geo/boundaryCorners.ts'
import type { GeometryFinding } from '../../../shared/geo/geometryTypes.ts'
import type { MapDraft, MapEdit } from '../map/mapTypes.ts'
import { crossingEdges } from './outlineWords.ts'
import type { Shape } from './shape.ts'
import type { ShapeWork } from './useShape.ts'

/** An outline in the making as the map draws it: its finished parts, and the ring being set. */
export function useShapeMap(work: ShapeWork, shape: () => Shape, handles: () => boolean): { edit: ComputedRef<MapEdit>; draft: ComputedRef<MapDraft | null> } {
  return {
    edit: computed(() => ({
      parts: shape().parts, handles: handles() && shape().open === null, chosen: work.chosen.value, isHeld: work.isHeld.value,
      crossing: shape().open === null ? work.findings.value.flatMap(crossingAt) : [],
      cross: shape().open === null && handles() ? work.cross.value : null,
    })),
    draft: computed(() => {
      const { open } = shape()
      return open === null ? null : { points: open.points, closed: false, crossingEdges: crossingEdges(work.findings.value), cross: work.cross.value }
    }),
  }
}

/** The edges of a finding that cross; its path is `coordinates.ring`, or `coordinates.part.ring`. */
function crossingAt(finding: GeometryFinding): CornerAt[] {
  const places = (finding.path ?? '').split('.').slice(1).map(Number)
  const [part, ring] = places.length > 1 ? places : [0, places[0]]
  return crossingEdges([finding]).map((corner) => ({ part: part ?? 0, ring: ring ?? 0, corner }))
}
