import { layerGroup, polygon, polyline, svg, type LayerGroup, type Map as LeafletMap, type Path, type PathOptions } from 'leaflet'
import type { MapGround, MapGroundFeature } from '../../composables/map/mapGround.ts'
import type { GroundKind } from '../../../shared/contract/ground.ts'
import type { PlaceGeometry } from '../../../shared/geo/geometryTypes.ts'
import { toLatLng } from './leafletGeometry.ts'

/** The ground under the blocks: water edged, lanes cased, hedges dotted, buildings. */
export interface GroundLayer {
  show(ground: MapGround): void
  /** Lines are as wide as on the ground; call it when the scale has changed. */
  rescale(): void
}

/** One stroke of a kind, from the lowest up: as wide as the thing and `over` pixels more, never under `least`. */
interface Stroke { name: string; least: number; over: number; dash?: string }

/** Under the blocks, over any imagery. */
const PANE = 'ground'
const PANE_LAYER = '350'
const STROKES: Record<GroundKind, readonly Stroke[]> = {
  water: [{ name: 'water-edge', least: 3, over: 2 }, { name: 'water', least: 1.4, over: 0 }],
  track: [{ name: 'track-edge', least: 3, over: 2 }, { name: 'track', least: 1.6, over: 0 }],
  hedge: [{ name: 'hedge', least: 2.6, over: 0, dash: '0.1 5' }],
  building: [],
  other: [{ name: 'other', least: 1.2, over: 0 }],
}
const MOST_HEDGE_PX = 5
/** Casings of all lanes lie under all lanes, so that where two meet they are one. */
const ORDER = ['site', 'water-area', 'water-edge', 'water', 'track-area', 'track-edge', 'track', 'hedge-area', 'hedge', 'building-area', 'other-area', 'other']

interface Piece { order: number; path: Path; widthM: number | null; stroke: Stroke | null; lat: number }

export function createGroundLayer(map: LeafletMap): GroundLayer {
  const pane = map.createPane(PANE)
  pane.style.zIndex = PANE_LAYER
  pane.style.pointerEvents = 'none'
  const renderer = svg({ padding: 0.5, pane: PANE })
  const group = layerGroup().addTo(map)
  let pieces: Piece[] = []

  function rescale(): void {
    for (const { path, widthM, stroke, lat } of pieces) {
      if (stroke !== null) path.setStyle({ weight: weightOf(stroke, (widthM ?? 0) / metresPerPixel(map, lat)) })
    }
  }
  return {
    show({ features, sites }) {
      group.clearLayers()
      const common: PathOptions = { renderer, interactive: false }
      pieces = [
        ...features.flatMap((feature) => piecesOf(feature, common)),
        ...sites.flatMap(({ kind, geometry }) => (geometry.type === 'Point' ? [] : [{
          order: 0, widthM: null, lat: 0, stroke: null,
          path: drawn(geometry, { ...common, weight: 1.4, fill: kind === 'pond', className: `ground-site is-${kind}`, ...(kind !== 'pond' && kind !== 'watercourse' && { dashArray: '1 5' }) }),
        }])),
      ].sort((a, b) => a.order - b.order)
      rescale()
      addAll(group, pieces)
    },
    rescale,
  }
}

function piecesOf(feature: MapGroundFeature, common: PathOptions): Piece[] {
  const { kind, geometry, widthM } = feature
  if (geometry.type === 'Point') return []
  const piece = (name: string, path: Path, stroke: Stroke | null): Piece => ({
    order: ORDER.indexOf(name), path, widthM, stroke, lat: (geometry.type === 'Polygon' ? geometry.coordinates[0]?.[0] : geometry.coordinates[0])?.[1] ?? 0,
  })
  if (geometry.type === 'Polygon') return [piece(`${kind}-area`, drawn(geometry, { ...common, fill: true, weight: 1.4, className: `ground-${kind}-area`, ...(kind === 'hedge' && { dashArray: '0.1 5' }) }), null)]
  return STROKES[kind].map((stroke) => piece(stroke.name, drawn(geometry, { ...common, fill: false, className: `ground-${stroke.name}`, ...(stroke.dash !== undefined && { dashArray: stroke.dash }) }), stroke))
}

function drawn(geometry: Exclude<PlaceGeometry, { type: 'Point' }>, options: PathOptions): Path {
  const fine = { ...options, smoothFactor: 0.4 }
  return geometry.type === 'Polygon' ? polygon(geometry.coordinates.map((ring) => ring.map(toLatLng)), fine) : polyline(geometry.coordinates.map(toLatLng), { ...fine, fill: false })
}

function addAll(group: LayerGroup, pieces: readonly Piece[]): void {
  for (const { path } of pieces) group.addLayer(path)
}

/** A hedge stays a row of dots, however near one looks. */
function weightOf({ name, least, over }: Stroke, widthPx: number): number {
  const weight = Math.max(least, widthPx + over)
  return name === 'hedge' ? Math.min(MOST_HEDGE_PX, weight) : weight
}

/** Of the web map's grid at a latitude. */
function metresPerPixel(map: LeafletMap, lat: number): number {
  return (Math.cos((lat * Math.PI) / 180) * 2 * Math.PI * 6_378_137) / (256 * 2 ** map.getZoom())
}
