import type { Boundary, Position } from '../../shared/geo/geometryTypes.ts'

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
  /** Not there yet: a shape of a file that is being imported. */
  isComing?: boolean
}

/** An outline being made: its corners in order and, where edges cross, which. */
export interface MapDraft {
  points: readonly Position[]
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

/** Where the map looks. */
export interface MapView {
  centre: Position
  zoom: number
}

/** A point in the pixels of the map. */
export type Pixel = readonly [number, number]
