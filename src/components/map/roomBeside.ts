import type { Pixel } from '../../composables/map/mapTypes.ts'
import type { PixelBox } from './pixelRing.ts'
import { boxOf } from './pixelRing.ts'
import { coversBox } from './ringsAtBox.ts'

/** Pixels left free at each edge. */
export interface MapRoom { top: number; right: number; bottom: number; left: number }

/** What is to be seen, in pixels of the whole world at zoom 0, and through what. */
export interface Fitting {
  polygons: readonly (readonly (readonly Pixel[])[])[]
  /** Around everything that is to be seen. */
  bounds: PixelBox
  /** Width and height of the map in pixels. */
  size: Pixel
  /** Zoom goes in steps of this. */
  zoomSnap: number
  mostZoom: number
}

const STEP_PX = 8
/** A plan that is drawn smaller than this beside the key had better lie under it. */
const MOST_LOSS = 0.4

/**
 * Room to leave so that what lies over the map covers no polygon, drawn as large as that allows.
 * @param covered what lies over the map, in its pixels. @returns the room as it was where nothing is covered, or where it cannot be helped in good measure.
 */
export function roomBeside(fitting: Fitting, room: MapRoom, covered: PixelBox): MapRoom {
  const plain = placeIn(fitting, room)
  if (!isCovered(fitting, plain, covered)) return room
  const most = Math.max(fitting.size[0], fitting.size[1]) / 2
  const wider = (by: number): MapRoom[] => [{ ...room, right: room.right + by }, { ...room, bottom: room.bottom + by }, { ...room, right: room.right + by, bottom: room.bottom + by }]
  let best: { room: MapRoom; zoom: number } | null = null
  for (let by = STEP_PX; by <= most; by += STEP_PX) {
    for (const candidate of wider(by)) {
      const place = placeIn(fitting, candidate)
      if (place.zoom < plain.zoom - MOST_LOSS || (best !== null && place.zoom <= best.zoom)) continue
      if (!isCovered(fitting, place, covered)) best = { room: candidate, zoom: place.zoom }
    }
  }
  return best?.room ?? room
}

interface Place { zoom: number; scale: number; at: Pixel }

/** Where the world at zoom 0 comes to lie in the map when the bounds are fitted into it. */
function placeIn({ bounds, size, zoomSnap, mostZoom }: Fitting, { top, right, bottom, left }: MapRoom): Place {
  const across = (size[0] - left - right) / Math.max(bounds.maxX - bounds.minX, Number.MIN_VALUE)
  const down = (size[1] - top - bottom) / Math.max(bounds.maxY - bounds.minY, Number.MIN_VALUE)
  const zoom = Math.min(mostZoom, Math.floor(Math.log2(Math.max(Math.min(across, down), Number.MIN_VALUE)) / zoomSnap) * zoomSnap)
  const scale = 2 ** zoom
  const middle: Pixel = [(bounds.minX + bounds.maxX) / 2, (bounds.minY + bounds.maxY) / 2]
  return { zoom, scale, at: [(size[0] + left - right) / 2 - middle[0] * scale, (size[1] + top - bottom) / 2 - middle[1] * scale] }
}

function isCovered({ polygons }: Fitting, { scale, at }: Place, covered: PixelBox): boolean {
  const onMap = ([x, y]: Pixel): Pixel => [x * scale + at[0], y * scale + at[1]]
  return polygons.some((rings) => {
    const box = boxOf((rings[0] ?? []).map(onMap))
    if (box.minX > covered.maxX || box.maxX < covered.minX || box.minY > covered.maxY || box.maxY < covered.minY) return false
    return coversBox([rings.map((ring) => ring.map(onMap))], covered)
  })
}
