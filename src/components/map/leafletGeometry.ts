import type { LatLngTuple, Map as LeafletMap } from 'leaflet'
import type { Boundary, Position, Ring } from '../../../shared/geo/geometryTypes.ts'
import type { Pixel } from '../../composables/map/mapTypes.ts'

/** Leaflet writes latitude first. */
export const toLatLng = ([lon, lat]: Position): LatLngTuple => [lat, lon]

/** The polygons of a boundary, each as its rings. */
export function polygonsOf(boundary: Boundary): Ring[][] {
  return boundary.type === 'Polygon' ? [boundary.coordinates] : boundary.coordinates
}

/** The rings of every polygon in the map's own pixels at this zoom. */
export function pixelRings(map: Pick<LeafletMap, 'project'>, boundary: Boundary): Pixel[][][] {
  return polygonsOf(boundary).map((rings) =>
    rings.map((ring) =>
      ring.slice(0, -1).map((position): Pixel => {
        const { x, y } = map.project(toLatLng(position))
        return [x, y]
      }),
    ),
  )
}
