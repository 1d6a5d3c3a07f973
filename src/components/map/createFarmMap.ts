import { latLngBounds, map as leafletMap, svg, tileLayer, type LatLngBounds, type LatLngExpression, type Map as LeafletMap } from 'leaflet'
import type { Position } from '../../../shared/geo/geometryTypes.ts'
import { createBlockLayer } from './blockLayer.ts'
import { createDraftLayer } from './draftLayer.ts'
import { createEditLayer, type EditEvents } from './editLayer.ts'
import { createGroundView } from './groundView.ts'
import { createLabelLayer } from './labelLayer.ts'
import { pixelRings, toLatLng } from './leafletGeometry.ts'
import { areMany } from './manyBlocks.ts'
import type { PixelBox } from './pixelRing.ts'
import { roomBeside, type Fitting, type MapRoom } from './roomBeside.ts'
import type { MapMarks } from '../../composables/map/useMapMarks.ts'
import type { MapGround } from '../../composables/map/mapGround.ts'
import type { MapBlock, MapDraft, MapEdit, MapImagery, MapView, Pixel } from '../../composables/map/mapTypes.ts'

/** What the map tells its component. */
export interface FarmMapEvents extends EditEvents {
  /** A tap or click on the ground. */
  tapped(position: Position): void
  chosen(blockId: string): void
  /** What lies over the map and is to cover no block, in the map's pixels; null where nothing does. */
  covered(): PixelBox | null
  /** The view has moved or changed scale; `byHand` unless the program moved it itself. */
  moved(view: MapView, byHand: boolean): void
}

/** The map of a farm: with its layers, the only modules that know Leaflet. */
export interface FarmMap {
  showBlocks(blocks: readonly MapBlock[], chosenId: string | null, marks: MapMarks): void
  showDraft(draft: MapDraft | null): void
  showEdit(edit: MapEdit | null): void
  setDrawing(isDrawing: boolean): void
  /** What lies under and round the blocks. */
  showGround(ground: MapGround): void
  /** Imagery under everything, or paper with the farm's own ground where there is none. */
  setImagery(imagery: MapImagery | null): void
  setView(view: MapView): void
  /** Shows all of these positions with room round them. */
  fit(positions: readonly Position[], room: MapRoom): void
  /** Moves as little as brings the position into view. */
  bringIntoView(position: Position): void
  pan(dx: number, dy: number): void
  /** Whether a position is in view. */
  sees(position: Position): boolean
  view(): MapView
  metresPerPixel(): number
  /** Middles of the labels in the map's pixels, by block. */
  middles(): ReadonlyMap<string, Pixel>
  sizeChanged(): void
  destroy(): void
}

const WORLD: MapView = { centre: [0, 20], zoom: 2 }
const ZOOM_SNAP = 0.1
const MOST_ZOOM = 22
const MOST_FIT_ZOOM = 19
const EDGE_PX: [number, number] = [56, 56]

/** Makes the map in its host element. */
export function createFarmMap(host: HTMLElement, events: FarmMapEvents): FarmMap {
  let ownMove = false
  const map = makeMap(host)
  const renderer = svg({ padding: 0.5 })
  const blocks = createBlockLayer(map, renderer, events.chosen)
  const draft = createDraftLayer(map)
  const edit = createEditLayer(map, events)
  const labels = createLabelLayer(map)
  const ground = createGroundView(map, { metresPerPixel: () => metresPerPixel(map), taken: () => labels.taken(), covered: events.covered })
  let shown: { blocks: readonly MapBlock[]; chosenId: string | null; jobs: MapMarks['jobs'] } = { blocks: [], chosenId: null, jobs: new Map() }
  let tiles: ReturnType<typeof tileLayer> | null = null

  function move(act: () => void): void {
    ownMove = true
    act()
    ownMove = false
  }
  map.on('move', () => events.moved(viewOf(map), !ownMove))
  const label = (): void => labels.show(shown.blocks, shown.chosenId, shown.jobs)
  map.on('zoomend', () => { if (!areMany(shown.blocks)) label() })
  // Of very many, only those in view are named.
  map.on('moveend', () => { if (areMany(shown.blocks)) label() })
  map.on('click', ({ latlng, originalEvent }) => {
    // The second click of a double tap would set the same corner twice.
    if (originalEvent.detail > 1) return
    const { lat, lng } = latlng.wrap()
    events.tapped([lng, lat])
  })

  return {
    showBlocks(list, chosenId, marks) {
      shown = { blocks: list, chosenId, jobs: marks.jobs }
      blocks.show(list, chosenId, marks)
      label()
      ground.setBlocks(list)
    },
    showDraft: draft.show,
    showEdit: edit.show,
    setDrawing(isDrawing) {
      if (isDrawing) map.doubleClickZoom.disable()
      else map.doubleClickZoom.enable()
    },
    showGround: ground.show,
    setImagery(imagery) {
      tiles?.remove()
      blocks.setImagery(imagery !== null)
      tiles = imagery === null ? null : tileLayer(imagery.url, { maxZoom: MOST_ZOOM, maxNativeZoom: imagery.maxZoom }).addTo(map)
    },
    setView: ({ centre, zoom }) => move(() => map.setView(toLatLng(centre), zoom, { animate: false })),
    fit: (positions, room) => move(() => fitTo(map, positions, { room, blocks: shown.blocks, covered: events.covered() })),
    bringIntoView: (position) => move(() => map.panInside(toLatLng(position), { padding: EDGE_PX, animate: false })),
    pan: (dx, dy) => move(() => map.panBy([dx, dy], { animate: false })),
    sees: (position) => map.getBounds().contains(toLatLng(position)),
    view: () => viewOf(map),
    metresPerPixel: () => metresPerPixel(map),
    middles: labels.middles,
    sizeChanged: () => move(() => map.invalidateSize({ animate: false })),
    destroy: () => void map.remove(),
  }
}

function makeMap(host: HTMLElement): LeafletMap {
  return leafletMap(host, {
    attributionControl: false, zoomControl: false, keyboard: false, fadeAnimation: false, boxZoom: false,
    zoomAnimation: !window.matchMedia('(prefers-reduced-motion: reduce)').matches,
    // Its component watches the size. Leaflet's own watch ends a moment after a map that is gone, and errs.
    trackResize: false, zoomSnap: ZOOM_SNAP, minZoom: 2, maxZoom: MOST_ZOOM, maxBounds: [[-86, -200], [86, 200]],
  }).setView(toLatLng(WORLD.centre), WORLD.zoom)
}

function fitTo(map: LeafletMap, positions: readonly Position[], { room, blocks, covered }: { room: MapRoom; blocks: readonly MapBlock[]; covered: PixelBox | null }): void {
  if (positions.length === 0) return
  const bounds = latLngBounds(positions.map(toLatLng))
  const { top, right, bottom, left } = covered === null ? room : roomBeside(fittingOf(map, bounds, blocks), room, covered)
  map.fitBounds(bounds, { paddingTopLeft: [left, top], paddingBottomRight: [right, bottom], maxZoom: MOST_FIT_ZOOM, animate: false })
}

function fittingOf(map: LeafletMap, bounds: LatLngBounds, blocks: readonly MapBlock[]): Fitting {
  const [low, high] = [map.project(bounds.getSouthWest(), 0), map.project(bounds.getNorthEast(), 0)]
  const { x, y } = map.getSize()
  const world = { project: (at: LatLngExpression) => map.project(at, 0) }
  return {
    polygons: blocks.flatMap(({ geometry }) => pixelRings(world, geometry)), bounds: { minX: low.x, maxX: high.x, minY: high.y, maxY: low.y },
    size: [x, y], zoomSnap: ZOOM_SNAP, mostZoom: MOST_FIT_ZOOM,
  }
}

function viewOf(map: LeafletMap): MapView {
  const { lat, lng } = map.getCenter()
  return { centre: [lng, lat], zoom: map.getZoom() }
}

/** Across the middle of the map, where its scale bar holds. */
function metresPerPixel(map: LeafletMap): number {
  const { x, y } = map.getSize().divideBy(2)
  return map.distance(map.containerPointToLatLng([x - 50, y]), map.containerPointToLatLng([x + 50, y])) / 100
}
