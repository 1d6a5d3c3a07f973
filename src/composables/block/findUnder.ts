import type { CornerAt } from '../../../shared/geo/boundaryCorners.ts'
import type { Position } from '../../../shared/geo/geometryTypes.ts'
import { toGridPoint } from '../../../shared/geo/gridPoints.ts'
import { gridDistanceM, gridScaleAt, placeAlong } from '../../../shared/geo/localPlane.ts'
import { cornersOfShape, type Shape } from './shape.ts'

/** A corner, or the edge that leaves it. */
export interface Found { at: CornerAt; isEdge: boolean }

/** The corner nearest a place within reach, else the edge nearest it; null where neither is. @param reachM metres. */
export function findUnder(shape: Shape, place: Position, reachM: number): Found | null {
  const point = toGridPoint(place)
  const scale = gridScaleAt(point)
  const corners = cornersOfShape(shape).map(({ at, position, next }) => ({
    at, offM: gridDistanceM(toGridPoint(position), point, scale), edgeM: placeAlong(toGridPoint(position), toGridPoint(next), point, scale).offM,
  }))
  const corner = corners.filter(({ offM }) => offM <= reachM).sort((a, b) => a.offM - b.offM)[0]
  if (corner !== undefined) return { at: corner.at, isEdge: false }
  const edge = corners.filter(({ edgeM }) => edgeM <= reachM).sort((a, b) => a.edgeM - b.edgeM)[0]
  return edge === undefined ? null : { at: edge.at, isEdge: true }
}
