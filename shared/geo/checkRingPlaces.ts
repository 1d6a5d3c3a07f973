import type { Boundary, GeometryFinding } from './geometryTypes.ts'
import type { GridRing } from './gridRing.ts'
import { relateRings } from './relateRings.ts'

/**
 * Whether simple rings lie where they may: holes in their outer ring, holes apart from each other, parts apart or in a hole of
 * another part.
 */
export function checkRingPlaces(polygons: readonly GridRing[][], type: Boundary['type']): GeometryFinding[] {
  const findings = polygons.flatMap((rings, part) => checkHoles(rings, type === 'Polygon' ? 'coordinates' : `coordinates.${part}`))
  polygons.forEach((rings, part) => {
    const clashes = polygons.slice(0, part).some((others) => doPartsOverlap(rings, others))
    if (clashes) findings.push({ code: 'geometry.parts_overlap', params: { part: part + 1 }, path: `coordinates.${part}` })
  })
  return findings
}

function checkHoles([outer, ...holes]: GridRing[], path: string): GeometryFinding[] {
  if (!outer) return []
  const findings: GeometryFinding[] = []
  holes.forEach((hole, index) => {
    const at = `${path}.${index + 1}`
    if (relateRings(hole, outer) !== 'within') findings.push({ code: 'geometry.hole_outside', params: { hole: index + 1 }, path: at })
    else if (holes.slice(0, index).some((other) => relateRings(hole, other) !== 'apart')) {
      findings.push({ code: 'geometry.holes_overlap', params: { hole: index + 1 }, path: at })
    }
  })
  return findings
}

function doPartsOverlap([outerA, ...holesA]: GridRing[], [outerB, ...holesB]: GridRing[]): boolean {
  if (!outerA || !outerB) return false
  const relation = relateRings(outerA, outerB)
  if (relation === 'within') return !holesB.some((hole) => relateRings(outerA, hole) === 'within')
  if (relation === 'around') return !holesA.some((hole) => relateRings(outerB, hole) === 'within')
  return relation === 'crossing'
}
