import type { PlaceGeometry } from './geometryTypes.ts'

interface GroundPiece { kind: 'track' | 'water' | 'building' | 'hedge' | 'other'; geometry: PlaceGeometry; widthM: string | null }

/**
 * What a piece of the ground plan cannot be: a building without an outline, a track, water or hedge of one point, or a width on what is
 * no line. @returns the field and the code of its message, or null.
 */
export function groundFault({ kind, geometry, widthM }: GroundPiece): { path: 'geometry' | 'widthM'; code: string } | null {
  if (kind === 'building' && geometry.type !== 'Polygon') return { path: 'geometry', code: 'ground.needs_outline' }
  if (kind !== 'other' && geometry.type === 'Point') return { path: 'geometry', code: 'ground.needs_line' }
  return widthM !== null && geometry.type !== 'LineString' ? { path: 'widthM', code: 'ground.width_of_line' } : null
}
