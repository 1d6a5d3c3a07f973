import { divIcon, layerGroup, marker, polygon, polyline, svg, type LatLngTuple, type LayerGroup, type Map as LeafletMap, type Renderer } from 'leaflet'
import { cornerNumbers, numbered } from './cornerNumbers.ts'
import { handleMarker } from './handleMarker.ts'
import { toLatLng } from './leafletGeometry.ts'
import type { MapDraft } from '../../composables/map/mapTypes.ts'

/** Handles on more corners than this would hide the outline. */
const MOST_HANDLES = 200

/** The outline being made: casing, edges, the edge still to come dashed, edges that cross in madder, corners, cross. */
export interface DraftLayer {
  show(draft: MapDraft | null): void
}

/** Over the blocks, under the labels. */
const PANE = 'draft'
const PANE_LAYER = '450'

export function createDraftLayer(map: LeafletMap): DraftLayer {
  map.createPane(PANE).style.zIndex = PANE_LAYER
  const renderer = svg({ padding: 0.5, pane: PANE })
  const group = layerGroup().addTo(map)
  const numbers = layerGroup().addTo(map)
  let shown: MapDraft | null = null
  function drawNumbers(): void {
    numbers.clearLayers()
    if (shown === null || shown.points.length > MOST_HANDLES) return
    for (const each of cornerNumbers(map, numbered(shown.points, 1))) numbers.addLayer(each)
  }
  map.on('zoomend', drawNumbers)
  return {
    show(draft) {
      shown = draft
      group.clearLayers()
      drawNumbers()
      if (draft === null) return
      drawOutline(group, renderer, draft)
      drawCorners(group, draft)
      if (draft.cross !== null) group.addLayer(crossMarker(toLatLng(draft.cross)))
    },
  }
}

function drawOutline(group: LayerGroup, renderer: Renderer, draft: MapDraft): void {
  const corners = draft.points.map(toLatLng)
  const [first, last] = [corners[0], corners.at(-1)]
  if (first === undefined || last === undefined || corners.length < 2) return
  const common = { renderer, smoothFactor: 0, interactive: false }
  const open = draft.closed && corners.length > 2 ? [...corners, first] : corners
  const encloses = corners.length > 2 && draft.isOpen !== true
  if (encloses) group.addLayer(polygon(corners, { ...common, className: 'map-draft-ground', stroke: false }))
  group.addLayer(polyline(open, { ...common, className: 'map-draft-case' }))
  group.addLayer(polyline(open, { ...common, className: 'map-draft-line' }))
  if (!draft.closed && encloses) {
    group.addLayer(polyline([last, first], { ...common, className: 'map-draft-closing' }))
  }
  for (const edge of draft.crossingEdges) {
    const ends = edgeEnds(corners, edge)
    if (ends !== null) group.addLayer(polyline(ends, { ...common, className: 'map-draft-crossing' }))
  }
}

function edgeEnds(corners: readonly LatLngTuple[], edge: number): LatLngTuple[] | null {
  const from = corners[edge]
  const to = corners[(edge + 1) % corners.length]
  return from === undefined || to === undefined ? null : [from, to]
}

function drawCorners(group: LayerGroup, draft: MapDraft): void {
  if (draft.points.length > MOST_HANDLES) return
  draft.points.forEach((position, index) => {
    const isEnd = !draft.closed && (index === 0 || index === draft.points.length - 1)
    group.addLayer(handleMarker(toLatLng(position), isEnd ? 'map-handle is-end' : 'map-handle'))
  })
}

/** The cross that the arrow keys move. */
export function crossMarker(at: LatLngTuple) {
  const icon = divIcon({ className: 'map-cross', iconSize: [44, 44] })
  return marker(at, { icon, interactive: false, keyboard: false, zIndexOffset: 2000 })
}
