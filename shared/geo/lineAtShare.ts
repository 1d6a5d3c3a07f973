import { boundaryParts } from './boundaryParts.ts'
import type { CornerAt } from './boundaryCorners.ts'
import { metresPerDegree } from './ellipsoid.ts'
import type { Boundary, Position } from './geometryTypes.ts'
import { toFlatRing } from './gridPoints.ts'
import { signedArea } from './gridRing.ts'

/** Metres along an edge, and away from it into the ground on its left. */
type EdgePoint = readonly [along: number, away: number]

/** Halvings of the distance: a field of 10 km to a tenth of a millimetre. */
const HALVINGS = 40

/**
 * A straight line parallel to an edge that leaves a share of a boundary's area on the edge's side; its ends lie outside.
 * @param boundary valid and oriented, as `checkBoundary` lets it stand. @param from the corner the edge leaves. @param share above 0, below 1.
 * @throws {RangeError} for a share outside that, or no such corner.
 * @source plane about the edge's first corner (radii of curvature there), halving of the distance: areas within a few ppm over a farm.
 */
export function lineAtShare(boundary: Boundary, { part, ring, corner }: CornerAt, share: number): [Position, Position] {
  if (!(share > 0 && share < 1)) throw new RangeError(`share must be above 0 and below 1, is ${share}`)
  const edge = boundaryParts(boundary)[part]?.[ring]
  const [origin, end] = [edge?.[corner], edge?.[corner + 1]]
  if (origin === undefined || end === undefined) throw new RangeError(`there is no edge ${corner}`)
  const metres = metresPerDegree(origin[1])
  const [dx, dy] = [(end[0] - origin[0]) * metres.east, (end[1] - origin[1]) * metres.north]
  const length = Math.hypot(dx, dy)
  const [ux, uy] = [dx / length, dy / length]
  const toEdge = ([lon, lat]: Position): EdgePoint => {
    const [x, y] = [(lon - origin[0]) * metres.east, (lat - origin[1]) * metres.north]
    return [x * ux + y * uy, y * ux - x * uy]
  }
  const toPosition = ([along, away]: EdgePoint): Position => [
    origin[0] + (along * ux - away * uy) / metres.east, origin[1] + (along * uy + away * ux) / metres.north,
  ]
  const rings = boundaryParts(boundary).flatMap((each) => each.map((points) => points.slice(0, -1).map(toEdge)))
  const away = distanceAtShare(rings, share)
  const alongs = rings.flat().map(([along]) => along)
  const margin = length + 1
  return [toPosition([Math.min(...alongs) - margin, away]), toPosition([Math.max(...alongs) + margin, away])]
}

function distanceAtShare(rings: readonly EdgePoint[][], share: number): number {
  const aways = rings.flat().map(([, away]) => away)
  let [near, far] = [Math.min(...aways), Math.max(...aways)]
  const wanted = areaWithin(rings, far) * share
  for (let halving = 0; halving < HALVINGS; halving += 1) {
    const middle = (near + far) / 2
    if (areaWithin(rings, middle) < wanted) near = middle
    else far = middle
  }
  return (near + far) / 2
}

/** Twice the area of the ground no farther away than this: outer rings run one way and holes the other, so that their areas add up. */
function areaWithin(rings: readonly EdgePoint[][], most: number): number {
  return rings.reduce((sum, ring) => sum + signedArea(toFlatRing(clip(ring, most))), 0)
}

function clip(ring: readonly EdgePoint[], most: number): EdgePoint[] {
  return ring.flatMap((from, index): EdgePoint[] => {
    const to = ring[(index + 1) % ring.length] ?? from
    const kept: EdgePoint[] = from[1] <= most ? [from] : []
    if (from[1] <= most === to[1] <= most) return kept
    const share = (most - from[1]) / (to[1] - from[1])
    return [...kept, [from[0] + share * (to[0] - from[0]), most]]
  })
}
