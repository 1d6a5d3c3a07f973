import type { CornerAt } from '../../../shared/geo/boundaryCorners.ts'
import type { Land } from '../../../shared/contract/land.ts'
import type { Boundary, Position } from '../../../shared/geo/geometryTypes.ts'

/** A block as the map draws it; every word is ready to read. */
export interface MapBlock {
  id: string
  code: string
  geometry: Boundary
  areaM2: number
  /** "0.93 ha". */
  areaText: string
  /** "0.93", where the unit has no room. */
  areaFigure: string
  /** "A3, Long Bank 3, 0.93 ha": said when the block is chosen. */
  spoken: string
  /** How its land stands, where somebody said so. */
  land?: Pick<Land, 'status'> | null
  /** Not there yet: a shape of a file that is being imported. */
  isComing?: boolean
}

/** An outline being made: its corners in order and, where edges cross, which. */
export interface MapDraft {
  points: readonly Position[]
  /** A line or a point: it encloses nothing, so no edge closes it. */
  isOpen?: boolean
  /** Closed outlines have no dashed last edge and no cross. */
  closed: boolean
  /** Numbers (from 0) of the edges that cross another. */
  crossingEdges: readonly number[]
  /** The cross that the arrow keys move, or null while the outline is closed or typed. */
  cross: Position | null
}

/** Pictures of the ground by a tile service. */
export interface MapImagery {
  /** Address of a square with {z}, {x} and {y} in it. */
  url: string
  /** Closer than this its squares are drawn larger. */
  maxZoom: number
}

/** What the map is for: looking, setting corners, or moving those that are there. */
export type MapMode = 'look' | 'draw' | 'edit'

/** An outline whose corners can be moved. */
export interface MapEdit {
  /** Parts, each its outer ring and its holes; corners in order, the first not repeated. */
  parts: readonly (readonly (readonly Position[])[])[]
  /** Whether a hand can take hold of corners now. */
  handles: boolean
  chosen: CornerAt | null
  /** Whether the chosen corner goes with the cross. */
  isHeld: boolean
  /** Edges that cross, each by the corner it leaves. */
  crossing: readonly CornerAt[]
  cross: Position | null
}

/** Where the map looks. */
export interface MapView {
  centre: Position
  zoom: number
}

/** A point in the pixels of the map. */
export type Pixel = readonly [number, number]
