import { checkRingPlaces } from './checkRingPlaces.ts'
import { findSelfContact } from './findSelfContact.ts'
import { findSpike } from './findSpike.ts'
import type { Boundary, GeometryFinding, Ring } from './geometryTypes.ts'
import { fromGridRing, GRID_PER_DEGREE, toGridRing, type GridRing } from './gridRing.ts'
import { measurePolygon } from './measurePolygon.ts'
import { readRings } from './readRings.ts'
import { M2_PER_HA } from '../units/hectare.ts'

export interface BoundaryCheck {
  /** The boundary cleaned and oriented, or null where anything impossible was found. */
  geometry: Boundary | null
  findings: GeometryFinding[]
}

const MIN_M2 = 1
const MAX_HA = 50_000

/**
 * Whether any value at all is a boundary that can stand: a Polygon or MultiPolygon (RFC 7946) of closed simple rings on the globe,
 * holes in their ground, parts apart, 1 m² to 50 000 ha, at most 5 000 points. Nothing is repaired that changes its shape: only
 * repeated neighbours and heights are dropped, coordinates rounded to 7 decimals and rings turned right-handed. What is found does
 * not depend on where a ring starts or which way it runs. Never throws.
 *
 * Codes: `geometry.type`, `geometry.coordinates`, `geometry.crs`, `geometry.too_many_points`, `geometry.out_of_range` {lon, lat},
 * `geometry.degrees_needed` {lon, lat} for what looks like projected metres, `geometry.maybe_swapped` {lon, lat} for axes exchanged,
 * `geometry.crosses_antimeridian`, `geometry.not_closed`, `geometry.too_few_points`, `geometry.area_zero`, `geometry.spike` {lon, lat},
 * `geometry.self_intersection` {lon, lat, edgeA, edgeB} (edges counted from 1), `geometry.hole_outside`, `geometry.holes_overlap`,
 * `geometry.parts_overlap`, `geometry.area_range` {areaM2, minM2, maxHa}.
 */
export function checkBoundary(geometry: unknown): BoundaryCheck {
  const read = readRings(geometry)
  if (read.type === null) return { geometry: null, findings: read.findings }
  const findings: GeometryFinding[] = []
  const polygons = read.polygons.map((rings, part) =>
    rings.map((ring, index) => {
      const path = read.type === 'Polygon' ? `coordinates.${index}` : `coordinates.${part}.${index}`
      const grid = toGridRing(ring, path)
      if (Array.isArray(grid)) {
        findings.push(...grid)
        return null
      }
      findings.push(...checkShape(grid, path))
      return grid
    }),
  )
  if (findings.length > 0) return { geometry: null, findings }
  const whole = polygons.map((rings) => rings.filter((ring) => ring !== null))
  findings.push(...checkRingPlaces(whole, read.type))
  if (findings.length > 0) return { geometry: null, findings }
  const boundary = toBoundary(whole, read.type)
  const { areaM2 } = measurePolygon(boundary)
  if (areaM2 >= MIN_M2 && areaM2 <= MAX_HA * M2_PER_HA) return { geometry: boundary, findings: [] }
  return { geometry: null, findings: [{ code: 'geometry.area_range', params: { areaM2, minM2: MIN_M2, maxHa: MAX_HA } }] }
}

function checkShape(ring: GridRing, path: string): GeometryFinding[] {
  const spike = findSpike(ring)
  if (spike) return [{ code: 'geometry.spike', params: toPlace(spike), path }]
  const contact = findSelfContact(ring)
  if (!contact) return []
  const { edgeA, edgeB } = contact
  return [{ code: 'geometry.self_intersection', params: { ...toPlace(contact), edgeA, edgeB }, path }]
}

function toPlace({ x, y }: { x: number; y: number }): { lon: number; lat: number } {
  return { lon: Math.round(x) / GRID_PER_DEGREE, lat: Math.round(y) / GRID_PER_DEGREE }
}

function toBoundary(polygons: GridRing[][], type: Boundary['type']): Boundary {
  const coordinates: Ring[][] = polygons.map((rings) => rings.map((ring, index) => fromGridRing(ring, index === 0)))
  return type === 'Polygon' ? { type, coordinates: coordinates[0] ?? [] } : { type, coordinates }
}
