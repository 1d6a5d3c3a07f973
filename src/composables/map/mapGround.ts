import type { GroundKind, SiteKind } from '../../../shared/contract/ground.ts'
import type { Boundary, PlaceGeometry } from '../../../shared/geo/geometryTypes.ts'

/** A piece of the ground plan as the map draws it. */
export interface MapGroundFeature {
  id: string
  kind: GroundKind
  name: string | null
  geometry: PlaceGeometry
  /** Metres; null draws a line as thin as it can be seen. */
  widthM: number | null
}

/** A site as the map draws it. */
export interface MapSite {
  id: string
  kind: SiteKind
  name: string
  geometry: PlaceGeometry
  /** The ground kept clear round it; null where no distance is written down, or it is still being worked out. */
  ring: Boundary | null
}

/** What lies under and round the blocks. */
export interface MapGround {
  features: readonly MapGroundFeature[]
  sites: readonly MapSite[]
}

export const NO_GROUND: MapGround = { features: [], sites: [] }
