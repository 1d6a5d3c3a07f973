import type { CornerAt } from '../../../shared/geo/boundaryCorners.ts'
import { cornersOfRing } from '../../../shared/geo/boundaryCorners.ts'
import { boundaryParts } from '../../../shared/geo/boundaryParts.ts'
import { cutHole } from '../../../shared/geo/cutHole.ts'
import { checkBoundary, type BoundaryCheck } from '../../../shared/geo/checkBoundary.ts'
import type { Boundary, Position } from '../../../shared/geo/geometryTypes.ts'

/** The ring whose corners are being set, and what it becomes. */
export interface OpenRing { as: 'part' | 'hole'; points: Position[] }

/** An outline in the making: finished parts, each its outer ring and its holes, corners in order, the first not repeated. */
export interface Shape { parts: Position[][][]; open: OpenRing | null }

/** A corner with its position, and where the next one of its ring is. */
export interface ShapeCorner { at: CornerAt; position: Position; next: Position }

export const emptyShape = (): Shape => ({ parts: [], open: null })

export const shapeOf = (boundary: Boundary): Shape => ({ parts: boundaryParts(boundary).map((rings) => rings.map(cornersOfRing)), open: null })

/** Seven decimals, as stored: a centimetre. */
const round = (degrees: number): number => Number(degrees.toFixed(7))

/** The finished parts as a boundary, rounded as stored; null while there is none. */
export function boundaryOf(parts: Shape['parts']): Boundary | null {
  const [only] = parts
  if (only === undefined) return null
  const coordinates = parts.map((rings) => rings.map((ring) => [...ring, ...ring.slice(0, 1)].map(([lon, lat]): Position => [round(lon), round(lat)])))
  return coordinates.length === 1 ? { type: 'Polygon', coordinates: coordinates[0] ?? [] } : { type: 'MultiPolygon', coordinates }
}

/** What the shape would be if its open ring were finished; one under three corners is not looked at. */
export function judgeShape({ parts, open }: Shape): BoundaryCheck {
  const points = open !== null && open.points.length > 2 ? open.points : null
  const finished = boundaryOf(parts)
  if (points === null) return finished === null ? { geometry: null, findings: [] } : checkBoundary(finished)
  if (open?.as === 'hole' && finished !== null) return cutHole(finished, points.map(([lon, lat]): Position => [round(lon), round(lat)]))
  return checkBoundary(boundaryOf([...parts, [points]]))
}

/** Every corner of the finished parts, ring by ring. */
export function cornersOfShape({ parts }: Shape): ShapeCorner[] {
  return parts.flatMap((rings, part) => rings.flatMap((points, ring) => points.map((position, corner): ShapeCorner => ({
    at: { part, ring, corner }, position, next: points[(corner + 1) % points.length] ?? position,
  }))))
}

/** The ring that is typed or drawn first: the outer one of the first part, or the one being set. */
export const firstRing = ({ parts, open }: Shape): readonly Position[] => parts[0]?.[0] ?? open?.points ?? []

/** How many corners there are, those of the open ring too. */
export function countPoints(shape: Shape): number {
  return shape.parts.flat().reduce((sum, ring) => sum + ring.length, 0) + (shape.open?.points.length ?? 0)
}

export const isSameAt = (one: CornerAt | null, other: CornerAt | null): boolean =>
  one?.part === other?.part && one?.ring === other?.ring && one?.corner === other?.corner
