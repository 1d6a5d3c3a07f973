import { divIcon, layerGroup, marker, polygon, polyline, svg, type LatLngBounds, type LatLngTuple, type LayerGroup, type Map as LeafletMap, type Marker } from 'leaflet'
import type { CornerAt } from '../../../shared/geo/boundaryCorners.ts'
import type { Position } from '../../../shared/geo/geometryTypes.ts'
import type { MapEdit } from '../../composables/map/mapTypes.ts'
import { cornerNumbers, numbered, type NumberedCorner } from './cornerNumbers.ts'
import { crossMarker } from './draftLayer.ts'
import { toLatLng } from './leafletGeometry.ts'

/** What a hand does to a corner on the map. */
export interface EditEvents {
  dragged(at: CornerAt, to: Position, isFirst: boolean): void
  /** An edge is taken hold of in its middle: a corner comes in after this one. */
  inserted(after: CornerAt, to: Position): void
  picked(at: CornerAt): void
  /** How many corners are in sight that have no handle because they are too many; 0 where each has its own. */
  crowded(corners: number): void
}

/** An outline whose corners can be moved: ground, edges, a handle at each corner, a smaller one in the middle of each edge. */
export interface EditLayer {
  show(edit: MapEdit | null): void
}

/** More handles than this in sight would hide the outline and be too dense to meet. */
const MOST_HANDLES = 150
/** Edges shorter than this on the screen have no handle in their middle. */
const LEAST_EDGE_PX = 34
const FINGER_PX = 44
const MOUSE_PX = 20
const PANE = 'draft'

export function createEditLayer(map: LeafletMap, events: EditEvents): EditLayer {
  const renderer = svg({ padding: 0.5, pane: PANE })
  const lines = layerGroup().addTo(map)
  const handles = layerGroup().addTo(map)
  const numbers = layerGroup().addTo(map)
  let shown: MapEdit | null = null
  let isDragging = false

  function drawHandles(): void {
    handles.clearLayers()
    drawNumbers(numbers, map, shown)
    if (shown === null || !shown.handles) return events.crowded(0)
    const corners = cornersIn(shown, map.getBounds().pad(0.1))
    events.crowded(corners.length > MOST_HANDLES ? corners.length : 0)
    if (corners.length > MOST_HANDLES) return
    for (const { at, position, next } of corners) {
      if (isLong(map, position, next)) handles.addLayer(edgeHandle(at, position, next))
    }
    for (const { at, position } of corners) handles.addLayer(cornerHandle(at, position, shown))
  }

  function cornerHandle(at: CornerAt, position: Position, edit: MapEdit): Marker {
    const isChosen = edit.chosen?.part === at.part && edit.chosen.ring === at.ring && edit.chosen.corner === at.corner
    const handle = handleOf(position, `is-corner${isChosen ? ' is-chosen' : ''}${isChosen && edit.isHeld ? ' is-held' : ''}`)
    handle.on('click', () => { events.picked(at) })
    return follow(handle, () => at)
  }

  function edgeHandle(after: CornerAt, from: Position, to: Position): Marker {
    const middle: Position = [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2]
    const handle = handleOf(middle, 'is-middle')
    handle.on('click', () => { events.inserted(after, middle) })
    return follow(handle, () => ({ ...after, corner: after.corner + 1 }), () => { events.inserted(after, middle) })
  }

  /** Tells of a drag; handles stay as they are until the hand lets go. */
  function follow(handle: Marker, at: () => CornerAt, begin?: () => void): Marker {
    let isFirst = true
    handle.on('dragstart', () => {
      isDragging = true
      begin?.()
      isFirst = begin === undefined
    })
    handle.on('drag', () => {
      const { lat, lng } = handle.getLatLng()
      events.dragged(at(), [lng, lat], isFirst)
      isFirst = false
    })
    handle.on('dragend', () => {
      isDragging = false
      drawHandles()
    })
    return handle
  }

  map.on('moveend', () => { if (!isDragging) drawHandles() })
  return {
    show(edit) {
      shown = edit
      lines.clearLayers()
      if (edit !== null) drawLines(lines, edit, renderer)
      if (isDragging) drawNumbers(numbers, map, shown)
      else drawHandles()
    },
  }
}

/** Corners in sight, each with the one after it. */
function cornersIn(edit: MapEdit, sight: LatLngBounds): { at: CornerAt; position: Position; next: Position }[] {
  return ringsOf(edit).flatMap(({ part, ring, points }) => points.map((position, corner) => ({
    at: { part, ring, corner }, position, next: points[(corner + 1) % points.length] ?? position,
  }))).filter(({ position }) => sight.contains(toLatLng(position)))
}

/** Corners in sight with the numbers of the list, counted through all rings; where they are too many, the chosen one alone. */
function numbersOf(edit: MapEdit, sight: LatLngBounds): NumberedCorner[] {
  const { chosen } = edit
  let first = 1
  const corners = ringsOf(edit).flatMap(({ part, ring, points }) => {
    const found = numbered(points, first).map((corner, index) => ({ ...corner, isChosen: chosen?.part === part && chosen.ring === ring && chosen.corner === index }))
    first += points.length
    return found
  }).filter(({ position }) => sight.contains(toLatLng(position)))
  return corners.length > MOST_HANDLES ? corners.filter(({ isChosen }) => isChosen) : corners
}

function drawNumbers(group: LayerGroup, map: LeafletMap, edit: MapEdit | null): void {
  group.clearLayers()
  for (const each of edit === null ? [] : cornerNumbers(map, numbersOf(edit, map.getBounds().pad(0.1)))) group.addLayer(each)
}

const ringsOf = ({ parts }: MapEdit) => parts.flatMap((rings, part) => rings.map((points, ring) => ({ part, ring, points })))

function drawLines(group: LayerGroup, edit: MapEdit, renderer: ReturnType<typeof svg>): void {
  const common = { renderer, smoothFactor: 0, interactive: false }
  const rings = edit.parts.map((part) => part.map((points): LatLngTuple[] => points.map(toLatLng)))
  group.addLayer(polygon(rings, { ...common, className: 'map-draft-ground', stroke: false }))
  group.addLayer(polygon(rings, { ...common, className: 'map-draft-case', fill: false }))
  group.addLayer(polygon(rings, { ...common, className: 'map-draft-line', fill: false }))
  for (const { part, ring, corner } of edit.crossing) {
    const points = edit.parts[part]?.[ring] ?? []
    const [from, to] = [points[corner], points[(corner + 1) % points.length]]
    if (from !== undefined && to !== undefined) group.addLayer(polyline([toLatLng(from), toLatLng(to)], { ...common, className: 'map-draft-crossing' }))
  }
  if (edit.cross !== null) group.addLayer(crossMarker(toLatLng(edit.cross)))
}

function handleOf(position: Position, className: string): Marker {
  const size = window.matchMedia('(pointer: coarse)').matches ? FINGER_PX : MOUSE_PX
  return marker(toLatLng(position), {
    icon: divIcon({ className: `map-grip ${className}`, iconSize: [size, size] }), draggable: true, keyboard: false, bubblingMouseEvents: false,
    zIndexOffset: className.startsWith('is-corner') ? 900 : 800,
  })
}

function isLong(map: LeafletMap, from: Position, to: Position): boolean {
  return map.latLngToContainerPoint(toLatLng(from)).distanceTo(map.latLngToContainerPoint(toLatLng(to))) >= LEAST_EDGE_PX
}
