import type { Method } from '../../../shared/contract/recordContent.ts'
import type { GroundKind } from '../../../shared/contract/ground.ts'
import type { Boundary, PlaceGeometry, Position } from '../../../shared/geo/geometryTypes.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import type { Canvas } from './canvas.ts'
import type { PlanBox, PlanView } from './planScale.ts'

export interface PlanBlock {
  code: string
  /** Words under the code, each on a line of its own. */
  notes: readonly string[]
  geometry: Boundary
  /** What was treated of it: all, nothing that was drawn, or the parts that were drawn. */
  treated: 'whole' | readonly Boundary[]
}

/** A piece of the ground plan; without a width a line is drawn as thin as it can be seen. */
export interface GroundPiece { kind: GroundKind; name: string | null; geometry: PlaceGeometry; widthM: number | null }

/** Something of the ground near a block that the plan shows for orientation. */
export interface PlanSite { kind: string; name: string; geometry: PlaceGeometry | Boundary | { type: 'MultiLineString'; coordinates: Position[][] } }

export interface BlockPlan {
  blocks: readonly PlanBlock[]
  neighbours: readonly { code: string; geometry: Boundary }[]
  ground: readonly GroundPiece[]
  sites: readonly PlanSite[]
  method: Method
  language: Language
  /** Words around it; the scale's are made of its number. */
  words: { north: string; scale: (denominator: number) => string; alt: (denominator: number) => string }
}

/** A plan while it is drawn. */
export interface Drawing { canvas: Canvas; frame: PlanBox; view: PlanView; origin: Position }
