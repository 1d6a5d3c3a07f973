import type { Boundary, Position, Ring } from '../../shared/geo/geometryTypes.ts'

/** How the outline is given. */
export type OutlineBy = 'draw' | 'points'

/** A block begun and not yet sent: what the device keeps. */
export interface BlockDraftContent {
  by: OutlineBy
  /** Corners in order, the first not repeated. */
  points: Position[]
  /** Whether the drawn outline is finished. */
  closed: boolean
  /** The points as typed. */
  typed: string
  code: string
  name: string
  crop: string
}

/** A draft with nothing in it. */
export function emptyBlockDraft(by: OutlineBy): BlockDraftContent {
  return { by, points: [], closed: false, typed: '', code: '', name: '', crop: '' }
}

/** Whether anything was done that would be missed. */
export function isBlockDraftBegun(content: BlockDraftContent): boolean {
  return content.points.length > 0 || [content.typed, content.code, content.name, content.crop].some((words) => words.trim() !== '')
}

/** The corners as a polygon, its ring closed; null under three corners. */
export function outlineOf(points: readonly Position[]): Boundary | null {
  const first = points[0]
  if (first === undefined || points.length < 3) return null
  const ring: Ring = [...points, first].map(([lon, lat]) => [roundDegrees(lon), roundDegrees(lat)])
  return { type: 'Polygon', coordinates: [ring] }
}

/** Seven decimals, as stored: a centimetre. */
function roundDegrees(degrees: number): number {
  return Number(degrees.toFixed(7))
}
