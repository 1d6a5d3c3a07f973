import { boundaryParts } from './boundaryParts.ts'
import type { Boundary, Ring } from './geometryTypes.ts'

/** Whether two cleaned boundaries are the same outline, wherever their rings start and in whatever order holes and parts stand. */
export function isSameOutline(a: Boundary, b: Boundary): boolean {
  return writeOut(a) === writeOut(b)
}

function writeOut(geometry: Boundary): string {
  return boundaryParts(geometry)
    .map(([outer = [], ...holes]) => [fromSmallest(outer), ...holes.map(fromSmallest).sort()].join('|'))
    .sort()
    .join('#')
}

/** A ring from its smallest corner on. */
function fromSmallest(ring: Ring): string {
  const corners = ring.slice(0, -1).map(([lon, lat]) => `${lon},${lat}`)
  const smallest = corners.reduce((best, corner, index) => (corner < (corners[best] ?? '') ? index : best), 0)
  return [...corners.slice(smallest), ...corners.slice(0, smallest)].join(' ')
}
