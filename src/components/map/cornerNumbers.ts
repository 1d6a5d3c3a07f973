import { divIcon, marker, type Map as LeafletMap, type Marker } from 'leaflet'
import type { Position } from '../../../shared/geo/geometryTypes.ts'
import type { Pixel } from '../../composables/map/mapTypes.ts'
import { toLatLng } from './leafletGeometry.ts'

/** A corner with the number that it has in the list beside the map. */
export interface NumberedCorner {
  number: number
  position: Position
  /** The corners before and after it; the number stands on the side away from them. */
  before: Position
  after: Position
  isChosen: boolean
}

/** Numbers nearer to each other than this would be read as one. */
const APART_PX = 19
/** From the corner to the middle of its number. */
const ASIDE_PX = 15

/** The corners of a ring with their numbers. @param first number of its first corner. */
export function numbered(points: readonly Position[], first: number): NumberedCorner[] {
  return points.map((position, index) => ({
    number: first + index, position, isChosen: false,
    before: points[(index + points.length - 1) % points.length] ?? position, after: points[(index + 1) % points.length] ?? position,
  }))
}

/** Numbers beside corners, as many as have room at this zoom; the chosen corner always has its own. */
export function cornerNumbers(map: LeafletMap, corners: readonly NumberedCorner[]): Marker[] {
  const taken: Pixel[] = []
  return [...corners].sort((a, b) => Number(b.isChosen) - Number(a.isChosen)).flatMap((corner) => {
    const at = besideCorner(map, corner)
    if (taken.some(([x, y]) => Math.hypot(x - at[0], y - at[1]) < APART_PX)) return []
    taken.push(at)
    const html = document.createElement('span')
    html.textContent = String(corner.number)
    return [marker(map.unproject([at[0], at[1]]), {
      icon: divIcon({ className: `map-corner-number${corner.isChosen ? ' is-chosen' : ''}`, html, iconSize: [0, 0] }),
      interactive: false, keyboard: false, zIndexOffset: 700,
    })]
  })
}

function besideCorner(map: LeafletMap, { position, before, after }: NumberedCorner): Pixel {
  const [at, from, to] = [position, before, after].map((each) => map.project(toLatLng(each)))
  if (at === undefined || from === undefined || to === undefined) throw new RangeError('A corner has no place on the map')
  let [x, y] = [at.x - (from.x + to.x) / 2, at.y - (from.y + to.y) / 2]
  // On a straight edge there is no outside to point to: across the edge then.
  if (Math.hypot(x, y) < 1) [x, y] = [to.y - from.y, from.x - to.x]
  const length = Math.hypot(x, y)
  return length === 0 ? [at.x, at.y - ASIDE_PX] : [at.x + (x / length) * ASIDE_PX, at.y + (y / length) * ASIDE_PX]
}
