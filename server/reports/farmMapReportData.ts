import type { SiteKind } from '../../shared/contract/ground.ts'
import type { Boundary, PlaceGeometry } from '../../shared/geo/geometryTypes.ts'
import type { Language } from '../../shared/messages/translate.ts'
import type { Paper } from './parts/paper.ts'
import type { GroundPiece } from './parts/planTypes.ts'

/** All that the map of a farm shows: plain data, no clock, no database. */
export interface FarmMapData {
  farm: { name: string; zone: string }
  language: Language
  paper: Paper
  /** RFC 3339 instant. */
  printedAt: string
  blocks: readonly { code: string; name: string; crop: string | null; areaM2: number; geometry: Boundary }[]
  ground: readonly GroundPiece[]
  sites: readonly { kind: SiteKind; name: string; geometry: PlaceGeometry; keepClearM: number | null; note: string | null }[]
}
