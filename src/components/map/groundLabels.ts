import { divIcon, layerGroup, marker, type LayerGroup, type Map as LeafletMap } from 'leaflet'
import type { MapGround } from '../../composables/mapGround.ts'
import type { MapBlock, Pixel } from '../../composables/mapTypes.ts'
import { findLineLabel } from '../../../shared/geo/findLineLabel.ts'
import type { PlaceGeometry, Position } from '../../../shared/geo/geometryTypes.ts'
import { polygonsOf, toLatLng } from './leafletGeometry.ts'
import { boxOf, type PixelBox } from './pixelRing.ts'
import { isInside } from './ringsAtBox.ts'

/** Names of sites beside their marks, of brooks and lanes along them, where there is room. */
export interface GroundLabels {
  show(ground: MapGround, blocks: readonly MapBlock[]): void
  /** Sets the names anew where the map looks now. */
  replace(): void
}

/** One name, and everything on the map that bears it. */
interface Named { name: string; kind: 'site' | 'water' | 'ground'; geometries: PlaceGeometry[]; widthM: number }
interface Shape { rings: readonly (readonly Position[])[]; box: PixelBox }

/** Width in pixels of a letter of a name, about. */
const LETTER = 6.6
const MARK_GAP = 11
const LINE = 15
/** The neatline lies over the map's edge. */
const FRAME_PX = 8
/** Where along a name it is asked what lies under it. */
const SHARES = [-0.5, -0.25, 0, 0.25, 0.5]
/** How wide a watercourse is taken to be where a name is to stand clear of it. */
const BROOK_M = 7
/** From the edge of a line to the middle of the name beside it. */
const BESIDE = 10

export function createGroundLabels(map: LeafletMap, metresPerPixel: () => number): GroundLabels {
  const group = layerGroup().addTo(map)
  let names: Named[] = []
  let shapes: Shape[] = []
  function replace(): void {
    group.clearLayers()
    for (const named of names) addName({ map, group, shapes, mPerPx: metresPerPixel() }, named)
  }
  return {
    show(ground, blocks) {
      names = namesOf(ground)
      shapes = blocks.flatMap(({ geometry }) => polygonsOf(geometry).map((rings) => ({ rings, box: boxOf(rings[0] ?? []) })))
      replace()
    },
    replace,
  }
}

/** Pieces that bear one name, as a lane in parts does, are named once. */
function namesOf({ features, sites }: MapGround): Named[] {
  const found = new Map<string, Named>()
  const take = (named: Named): void => {
    const known = found.get(`${named.kind} ${named.name}`)
    if (known === undefined) found.set(`${named.kind} ${named.name}`, named)
    else known.geometries.push(...named.geometries)
  }
  for (const { name, kind, geometry, widthM } of features) {
    if (name !== null) take({ name, kind: kind === 'water' ? 'water' : 'ground', geometries: [geometry], widthM: widthM ?? 0 })
  }
  for (const { id, kind, name, geometry } of sites) {
    if (geometry.type === 'Point') found.set(id, { name, kind: 'site', geometries: [geometry], widthM: 0 })
    else take({ name, kind: kind === 'watercourse' || kind === 'pond' ? 'water' : 'ground', geometries: [geometry], widthM: kind === 'watercourse' ? BROOK_M : 0 })
  }
  return [...found.values()]
}

interface Place { map: LeafletMap; group: LayerGroup; shapes: readonly Shape[]; mPerPx: number }

function addName(place: Place, named: Named): void {
  const width = named.name.length * LETTER
  const toPixel = (position: Position): Pixel => {
    const { x, y } = place.map.latLngToContainerPoint(toLatLng(position))
    return [x, y]
  }
  const [first] = named.geometries
  if (first?.type === 'Point') {
    addLabel(place, named, { at: besideMark(place, toPixel(first.coordinates), width), turn: 0 })
    return
  }
  const outlines = named.geometries.filter((geometry) => geometry.type === 'Polygon')
  for (const { coordinates } of outlines) {
    const { minX, minY, maxX, maxY } = boxOf((coordinates[0] ?? []).map(toPixel))
    if (maxX - minX < width + 4 || maxY - minY < BESIDE) continue
    addLabel(place, named, { at: [(minX + maxX) / 2, (minY + maxY) / 2], turn: 0 })
    return
  }
  const lines = named.geometries.flatMap((geometry) => (geometry.type === 'LineString' ? [geometry.coordinates.map(toPixel)] : []))
  const { x: across, y: down } = place.map.getSize()
  const found = findLineLabel(lines, { x: 0, y: 0, width: across, height: down }, width)
  if (found !== null) addLabel(place, named, besideLine(place, found, { width, widthPx: named.widthM / place.mPerPx }))
}

/** At the right of a mark, or left, over or under it: where the fewest blocks and the map's edge are least in the way. */
function besideMark(place: Place, [x, y]: Pixel, width: number): Pixel {
  const aside = MARK_GAP + width / 2
  const size = place.map.getSize()
  const within = Math.max(FRAME_PX + width / 2, Math.min(size.x - FRAME_PX - width / 2, x))
  const spots: Pixel[] = [[x + aside, y], [x - aside, y], [within, y - MARK_GAP - LINE / 2], [within, y + MARK_GAP + LINE / 2]]
  const inTheWay = ([midX, midY]: Pixel): number => {
    const isOut = midX - width / 2 < FRAME_PX || midX + width / 2 > size.x - FRAME_PX || midY < FRAME_PX || midY > size.y - FRAME_PX
    return (isOut ? 10 : 0) + SHARES.filter((share) => isOnBlock(place, [midX + width * share, midY])).length
  }
  return spots.reduce((best, spot) => (inTheWay(spot) < inTheWay(best) ? spot : best))
}

/** On the side of the line that has fewer blocks under the name; on the line itself where it is wide enough. */
function besideLine(place: Place, { x, y, turn }: { x: number; y: number; turn: number }, { width, widthPx }: { width: number; widthPx: number }): { at: Pixel; turn: number } {
  if (widthPx > 15) return { at: [x, y], turn }
  const angle = (turn * Math.PI) / 180
  const reach = widthPx / 2 + BESIDE
  const sides = [-1, 1].map((side): { at: Pixel; covered: number } => {
    const at: Pixel = [x - Math.sin(angle) * reach * side, y + Math.cos(angle) * reach * side]
    const along = SHARES.map((share): Pixel => [at[0] + Math.cos(angle) * width * share, at[1] + Math.sin(angle) * width * share])
    return { at, covered: along.filter((point) => isOnBlock(place, point)).length }
  })
  const [best] = sides.sort((a, b) => a.covered - b.covered)
  return best === undefined || best.covered > 2 ? { at: [x, y], turn } : { at: best.at, turn }
}

function isOnBlock({ map, shapes }: Place, [x, y]: Pixel): boolean {
  const { lng, lat } = map.containerPointToLatLng([x, y])
  return shapes.some(({ rings, box }) => lng >= box.minX && lng <= box.maxX && lat >= box.minY && lat <= box.maxY && isInside(rings, [lng, lat]))
}

function addLabel({ map, group }: Place, { name, kind }: Named, { at, turn }: { at: Pixel; turn: number }): void {
  const html = document.createElement('span')
  html.textContent = name
  if (turn !== 0) html.style.transform = `translate(-50%, -50%) rotate(${turn.toFixed(1)}deg)`
  group.addLayer(marker(map.containerPointToLatLng([at[0], at[1]]), {
    icon: divIcon({ className: `ground-name is-${kind}`, html, iconSize: [0, 0] }), interactive: false, keyboard: false, zIndexOffset: -500,
  }))
}
