import type { Map as LeafletMap } from 'leaflet'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import type { MapBlock, Pixel } from '../../composables/map/mapTypes.ts'
import { codeWidth } from './codeWidth.ts'
import { pixelRings, polygonsOf, toLatLng } from './leafletGeometry.ts'
import type { PixelBox } from './pixelRing.ts'
import { hasEdgeIn, isInside } from './ringsAtBox.ts'

/** Codes at most on a map of very many blocks, the largest first. */
const MOST_LABELS = 150
const HEIGHT = 18
const OUTSIDE_GAP = 9

/** What is asked of a map. */
type Projector = Pick<LeafletMap, 'project' | 'getPixelBounds'>

export interface ManyLabels {
  /** Middles of all blocks in the map's pixels: arrow keys go from one to the next. */
  middles: Map<string, Pixel>
  labels: { block: MapBlock; at: Pixel; isInside: boolean }[]
}

/** Codes for the blocks in view that have room for theirs in their middle; the chosen one is always named. */
export function findManyLabels(map: Projector, blocks: readonly MapBlock[], chosenId: string | null): ManyLabels {
  const { min, max } = map.getPixelBounds()
  if (min === undefined || max === undefined) return { middles: new Map(), labels: [] }
  const view = { minX: min.x, minY: min.y, maxX: max.x, maxY: max.y }
  const middles = new Map<string, Pixel>()
  const roomy: { block: MapBlock; box: PixelBox }[] = []
  for (const block of blocks) {
    const box = pixelBox(map, block.geometry)
    middles.set(block.id, middleOf(box))
    const isChosen = block.id === chosenId
    if (isChosen || (doMeet(box, view) && box.maxX - box.minX >= codeWidth(block.code).large && box.maxY - box.minY >= HEIGHT)) roomy.push({ block, box })
  }
  const size = ({ box }: { box: PixelBox }): number => (box.maxX - box.minX) * (box.maxY - box.minY)
  const first = roomy.sort((a, b) => Number(b.block.id === chosenId) - Number(a.block.id === chosenId) || size(b) - size(a)).slice(0, MOST_LABELS)
  const labels = first.flatMap(({ block, box }): ManyLabels['labels'] => {
    const at = middleOf(box)
    if (hasRoom(map, block, at)) return [{ block, at, isInside: true }]
    return block.id === chosenId ? [{ block, at: [at[0], box.minY - OUTSIDE_GAP], isInside: false }] : []
  })
  return { middles, labels }
}

function hasRoom(map: Projector, { geometry, code }: MapBlock, [x, y]: Pixel): boolean {
  const half = codeWidth(code).large / 2
  const label = { minX: x - half, maxX: x + half, minY: y - HEIGHT / 2, maxY: y + HEIGHT / 2 }
  return pixelRings(map, geometry).some((rings) => isInside(rings, [x, y]) && !hasEdgeIn(rings, label))
}

type Box = readonly [west: number, south: number, east: number, north: number]
const boxes = new WeakMap<Boundary, Box>()

function pixelBox(map: Projector, geometry: Boundary): PixelBox {
  const [west, south, east, north] = boxes.get(geometry) ?? findBox(geometry)
  const [low, high] = [map.project(toLatLng([west, south])), map.project(toLatLng([east, north]))]
  return { minX: low.x, maxX: high.x, minY: high.y, maxY: low.y }
}

function findBox(geometry: Boundary): Box {
  let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity]
  for (const [outer = []] of polygonsOf(geometry)) {
    for (const [lon, lat] of outer) {
      west = Math.min(west, lon)
      south = Math.min(south, lat)
      east = Math.max(east, lon)
      north = Math.max(north, lat)
    }
  }
  const box: Box = [west, south, east, north]
  boxes.set(geometry, box)
  return box
}

const middleOf = ({ minX, minY, maxX, maxY }: PixelBox): Pixel => [(minX + maxX) / 2, (minY + maxY) / 2]

function doMeet(a: PixelBox, b: PixelBox): boolean {
  return a.minX < b.maxX && b.minX < a.maxX && a.minY < b.maxY && b.minY < a.maxY
}
