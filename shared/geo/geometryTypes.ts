/** [longitude, latitude] in degrees, WGS84. */
export type Position = [number, number]
export type Ring = Position[]
export interface Polygon { type: 'Polygon'; coordinates: Ring[] }
export interface MultiPolygon { type: 'MultiPolygon'; coordinates: Ring[][] }
export type Boundary = Polygon | MultiPolygon

/** One thing found in a boundary; words are rendered from the messages by `code`. */
export interface GeometryFinding {
  code: string
  params: Record<string, string | number>
  /** Where in the coordinates, "coordinates.0.3". */
  path?: string
}

/** Something on the ground that need not have an area. */
export type PlaceGeometry =
  | { type: 'Point'; coordinates: Position }
  | { type: 'LineString'; coordinates: Position[] }
  | Polygon
