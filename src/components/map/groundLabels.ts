import { divIcon, layerGroup, marker, type LayerGroup, type Map as LeafletMap } from 'leaflet'
import type { MapGround } from '../../composables/map/mapGround.ts'
import type { MapBlock, Pixel } from '../../composables/map/mapTypes.ts'
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
/** A name may stand so much farther from its mark where another is in the way. */
const FARTHER = 9
/** The neatline lies over the map's edge. */
const FRAME_PX = 8
/** Where along a name it is asked what lies under it. */
const SHARES = [-0.5, -0.25, 0, 0.25, 0.5]
/** How wide a watercourse is taken to be where a name is to stand clear of it. */
const BROOK_M = 7
/** From the edge of a line to the middle of the name beside it. */
const BESIDE = 10

/** What names have to keep clear of, and the scale. */
export interface OverGround {
  metresPerPixel(): number
  /** Labels of blocks, in the pixels of the whole map at this zoom. */
  taken(): readonly PixelBox[]
  /** What lies over the map, in pixels of the part that is seen. */
  covered(): PixelBox | null
}

export function createGroundLabels(map: LeafletMap, over: OverGround): GroundLabels {
  const group = layerGroup().addTo(map)
  let names: Named[] = []
  let shapes: Shape[] = []
  function replace(): void {
    group.clearLayers()
    const { min } = map.getPixelBounds()
    if (min === undefined) return
    const covered = over.covered()
    const taken = [...over.taken().map((box) => ({ minX: box.minX - min.x, maxX: box.maxX - min.x, minY: box.minY - min.y, maxY: box.maxY - min.y })), ...(covered === null ? [] : [covered])]
    for (const named of names) addName({ map, group, shapes, taken, covered, mPerPx: over.metresPerPixel() }, named)
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

interface Place {
  map: LeafletMap
  group: LayerGroup
  shapes: readonly Shape[]
  mPerPx: number
  /** Ground in pixels that something to be read covers already; each name adds its own. */
  taken: PixelBox[]
  covered: PixelBox | null
}

function addName(place: Place, named: Named): void {
  const width = named.name.length * LETTER
  const toPixel = (position: Position): Pixel => {
    const { x, y } = place.map.latLngToContainerPoint(toLatLng(position))
    return [x, y]
  }
  const [first] = named.geometries
  if (first?.type === 'Point') {
    const mark = toPixel(first.coordinates)
    const at = isSeen(place, mark) ? besideMark(place, mark, width) : null
    if (at !== null) addLabel(place, named, { at, turn: 0 })
    return
  }
  const outlines = named.geometries.filter((geometry) => geometry.type === 'Polygon')
  for (const { coordinates } of outlines) {
    const { minX, minY, maxX, maxY } = boxOf((coordinates[0] ?? []).map(toPixel))
    const at: Pixel = [(minX + maxX) / 2, (minY + maxY) / 2]
    if (maxX - minX < width + 4 || maxY - minY < BESIDE || !isFree(place, boxAt(at, width))) continue
    addLabel(place, named, { at, turn: 0 })
    return
  }
  const lines = named.geometries.flatMap((geometry) => (geometry.type === 'LineString' ? [geometry.coordinates.map(toPixel)] : []))
  for (const frame of framesOf(place)) {
    const found = findLineLabel(lines, frame, width)
    const label = found === null ? null : besideLine(place, found, { width, widthPx: named.widthM / place.mPerPx })
    if (label === null) continue
    addLabel(place, named, label)
    return
  }
}

/** The whole map, then what is left of it over and beside what covers it. */
function framesOf({ map, covered }: Place): { x: number; y: number; width: number; height: number }[] {
  const { x: width, y: height } = map.getSize()
  const whole = { x: 0, y: 0, width, height }
  return covered === null ? [whole] : [whole, { ...whole, height: covered.minY }, { ...whole, width: covered.minX }]
}

const isSeen = ({ map }: Place, [x, y]: Pixel): boolean => x >= 0 && y >= 0 && x <= map.getSize().x && y <= map.getSize().y
const boxAt = ([x, y]: Pixel, width: number): PixelBox => ({ minX: x - width / 2, maxX: x + width / 2, minY: y - LINE / 2, maxY: y + LINE / 2 })
const isFree = ({ taken }: Place, box: PixelBox): boolean => !taken.some((other) => box.minX < other.maxX && other.minX < box.maxX && box.minY < other.maxY && other.minY < box.maxY)
/** Small boxes in a row under a turned name. */
function boxesAlong(along: readonly Pixel[], width: number): PixelBox[] {
  return along.map((point) => boxAt(point, Math.max(LINE, width / along.length / 2)))
}

/** At the right of a mark, or left, over or under it: where the fewest blocks are in the way; null where other words or the map's edge are in each. */
function besideMark(place: Place, [x, y]: Pixel, width: number): Pixel | null {
  const aside = MARK_GAP + width / 2
  const size = place.map.getSize()
  const within = Math.max(FRAME_PX + width / 2, Math.min(size.x - FRAME_PX - width / 2, x))
  const over = MARK_GAP + LINE / 2
  const spots: Pixel[] = [[x + aside, y], [x - aside, y], ...[over, over + FARTHER].flatMap((by): Pixel[] => [[within, y - by], [within, y + by]])]
  const inTheWay = ([midX, midY]: Pixel): number => SHARES.filter((share) => isOnBlock(place, [midX + width * share, midY])).length
  const isIn = ([midX, midY]: Pixel): boolean => midX - width / 2 >= FRAME_PX && midX + width / 2 <= size.x - FRAME_PX && midY >= FRAME_PX && midY <= size.y - FRAME_PX
  const free = spots.filter((spot) => isIn(spot) && isFree(place, boxAt(spot, width)))
  return free.reduce<Pixel | null>((best, spot) => (best === null || inTheWay(spot) < inTheWay(best) ? spot : best), null)
}

/** On the side of the line that has fewer blocks under the name; on the line itself where it is wide enough; null where other words are in the way. */
function besideLine(place: Place, { x, y, turn }: { x: number; y: number; turn: number }, { width, widthPx }: { width: number; widthPx: number }): Label | null {
  const angle = (turn * Math.PI) / 180
  const pointsAt = ([midX, midY]: Pixel): Pixel[] => SHARES.map((share): Pixel => [midX + Math.cos(angle) * width * share, midY + Math.sin(angle) * width * share])
  const free = (at: Pixel): Label | null => {
    const boxes = boxesAlong(pointsAt(at), width)
    return boxes.every((box) => isFree(place, box)) ? { at, turn, boxes } : null
  }
  if (widthPx > 15) return free([x, y])
  const reach = widthPx / 2 + BESIDE
  const sides = [-1, 1].map((side): { at: Pixel; covered: number } => {
    const at: Pixel = [x - Math.sin(angle) * reach * side, y + Math.cos(angle) * reach * side]
    // By the letters' far edge: their middle may pass a block that they lie on.
    const far: Pixel = [x - Math.sin(angle) * (reach + LINE / 2) * side, y + Math.cos(angle) * (reach + LINE / 2) * side]
    return { at, covered: pointsAt(far).filter((point) => isOnBlock(place, point)).length }
  })
  const beside = sides.filter(({ covered }) => covered <= 2).sort((a, b) => a.covered - b.covered).map(({ at }) => free(at)).find((label) => label !== null)
  return beside ?? free([x, y])
}

function isOnBlock({ map, shapes }: Place, [x, y]: Pixel): boolean {
  const { lng, lat } = map.containerPointToLatLng([x, y])
  return shapes.some(({ rings, box }) => lng >= box.minX && lng <= box.maxX && lat >= box.minY && lat <= box.maxY && isInside(rings, [lng, lat]))
}

interface Label { at: Pixel; turn: number; boxes?: PixelBox[] }

function addLabel({ map, group, taken }: Place, { name, kind }: Named, { at, turn, boxes }: Label): void {
  taken.push(...(boxes ?? [boxAt(at, name.length * LETTER)]))
  const html = document.createElement('span')
  html.textContent = name
  if (turn !== 0) html.style.transform = `translate(-50%, -50%) rotate(${turn.toFixed(1)}deg)`
  group.addLayer(marker(map.containerPointToLatLng([at[0], at[1]]), {
    icon: divIcon({ className: `ground-name is-${kind}`, html, iconSize: [0, 0] }), interactive: false, keyboard: false, zIndexOffset: -500,
  }))
}
