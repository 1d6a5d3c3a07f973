import { boundaryParts } from '../../../shared/geo/boundaryParts.ts'
import { bufferPlace } from '../../../shared/geo/bufferPlace.ts'
import type { Boundary, PlaceGeometry, Ring } from '../../../shared/geo/geometryTypes.ts'
import { toPlan, type Plan } from '../../../shared/geo/projectToPlan.ts'
import type { FarmMapData } from '../farmMapReportData.ts'
import { PAPERS, type Paper } from '../parts/paper.ts'

/** Where everything lies on a plan, and what is kept clear round each site, in the order of the sites. */
export interface PlanGround { whole: Plan; rings: readonly (Boundary | null)[] }

/** Fits the blocks with the ground kept clear near them; of a farm without blocks all that is drawn. Null where nothing is. */
export function planGround({ blocks, ground, sites }: FarmMapData): PlanGround | null {
  const rings = sites.map(({ geometry, keepClearM }) => (keepClearM === null ? null : bufferPlace(geometry, keepClearM)))
  const ofBlocks = blocks.flatMap(({ geometry }) => boundaryParts(geometry))
  // A brook runs far beyond the farm; a point with its circle does not.
  const ofSites = sites.flatMap(({ geometry }, index) => {
    const ring = rings[index] ?? null
    return geometry.type !== 'Point' ? [] : ring === null ? [asRings(geometry)] : boundaryParts(ring)
  })
  const drawn = ofBlocks.length > 0 ? [...ofBlocks, ...ofSites] : [...ofSites, ...[...ground, ...sites].map(({ geometry }) => asRings(geometry))]
  return drawn.length === 0 ? null : { whole: toPlan({ geometry: { type: 'MultiPolygon', coordinates: drawn } }), rings }
}

/** Whether the farm is shown larger on a lying sheet. */
export function isLyingFarm(ground: PlanGround | null, paper: Paper): boolean {
  if (ground === null) return false
  const { widthM, heightM } = ground.whole
  const { width, height } = PAPERS[paper]
  return Math.max(widthM / height, heightM / width) < Math.max(widthM / width, heightM / height)
}

/** Points and lines as rings of their own, so that they count for the extent. */
function asRings(geometry: PlaceGeometry): Ring[] {
  if (geometry.type === 'Polygon') return geometry.coordinates
  return [geometry.type === 'Point' ? [geometry.coordinates] : geometry.coordinates]
}
