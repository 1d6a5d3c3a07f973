import type { Feature, FeatureCollection, LineString, Point, Polygon, Position } from 'geojson'
import type { TileSource } from './tileSource.ts'

const SIZE = 256
/** Radius of the sphere that the web map's grid is cut from, metres. */
const GRID_RADIUS_M = 6_378_137
/** Anything this close outside a square may still reach into it with its stroke, in pixels. */
const MARGIN = 64

type Ground = FeatureCollection<LineString | Point | Polygon, { kind: string; name: string; bufferM?: number }>
type GroundFeature = Ground['features'][number]

/** The local stand-in for a tile service: a farm's ground plan drawn as SVG squares in the product's own style. */
export function createGroundTiles(ground: Ground): TileSource {
  return {
    read: async (z, x, y) => ({ contentType: 'image/svg+xml', bytes: Buffer.from(drawTile(ground, z, x, y)) }),
  }
}

function drawTile(ground: Ground, z: number, x: number, y: number): string {
  const onTile = ([lon = 0, lat = 0]: Position): [number, number] => {
    const scale = SIZE * 2 ** z
    const sin = Math.sin((lat * Math.PI) / 180)
    return [
      (lon / 360 + 0.5) * scale - x * SIZE,
      (0.5 - Math.log((1 + sin) / (1 - sin)) / (4 * Math.PI)) * scale - y * SIZE,
    ]
  }
  const shapes = [...ground.features].sort((a, b) => layerOf(a) - layerOf(b)).flatMap((feature) => drawFeature(feature, onTile, metresPerPixel(feature, z)))
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${SIZE}" height="${SIZE}" viewBox="0 0 ${SIZE} ${SIZE}"><rect width="${SIZE}" height="${SIZE}" fill="#F3EEDF"/>${shapes.join('')}</svg>`
}

const LAYERS = ['stream', 'pond', 'track', 'hedge', 'building', 'well', 'dwelling', 'hives']

function layerOf(feature: Feature<LineString | Point | Polygon, { kind: string }>): number {
  return LAYERS.indexOf(feature.properties.kind)
}

/** Ground length of one pixel at the feature's latitude, metres. */
function metresPerPixel({ geometry }: GroundFeature, z: number): number {
  const first = geometry.type === 'Point' ? geometry.coordinates : geometry.type === 'LineString' ? geometry.coordinates[0] : geometry.coordinates[0]?.[0]
  const lat = ((first?.[1] ?? 0) * Math.PI) / 180
  return (Math.cos(lat) * 2 * Math.PI * GRID_RADIUS_M) / (SIZE * 2 ** z)
}

function drawFeature({ geometry, properties }: GroundFeature, onTile: (position: Position) => [number, number], mPerPx: number): string[] {
  const keepClearPx = (properties.bufferM ?? 0) / mPerPx
  if (geometry.type === 'Point') {
    const [cx, cy] = onTile(geometry.coordinates)
    if (Math.max(Math.abs(cx - SIZE / 2), Math.abs(cy - SIZE / 2)) > SIZE / 2 + MARGIN + keepClearPx) return []
    const place = `cx="${cx.toFixed(1)}" cy="${cy.toFixed(1)}"`
    return [
      ...(keepClearPx > 4 ? [`<circle ${place} r="${keepClearPx.toFixed(1)}" fill="none" stroke="#2B6A8F" stroke-width="1.4" stroke-dasharray="5 3.5"/>`] : []),
      `<circle ${place} r="3" fill="none" stroke="#2B6A8F" stroke-width="1.6"/>`,
    ]
  }
  const rings = geometry.type === 'LineString' ? [geometry.coordinates] : geometry.coordinates
  const points = rings.map((ring) => ring.map(onTile))
  if (!points.some((ring) => reaches(ring, MARGIN + keepClearPx))) return []
  const path = points.map((ring) => `M${ring.map(([px, py]) => `${px.toFixed(1)} ${py.toFixed(1)}`).join('L')}${geometry.type === 'Polygon' ? 'Z' : ''}`).join('')
  return styleOf(properties.kind, mPerPx).map((style) => `<path d="${path}" ${style}/>`)
}

function reaches(points: [number, number][], margin: number): boolean {
  const xs = points.map(([px]) => px)
  const ys = points.map(([, py]) => py)
  return Math.max(...xs) > -margin && Math.min(...xs) < SIZE + margin && Math.max(...ys) > -margin && Math.min(...ys) < SIZE + margin
}

/** Strokes from the lowest up; widths on the ground in metres become pixels, never thinner than can be seen. */
function styleOf(kind: string, mPerPx: number): string[] {
  const line = (colour: string, metres: number, least: number, more = '') =>
    `fill="none" stroke="${colour}" stroke-width="${Math.max(metres / mPerPx, least).toFixed(1)}" stroke-linejoin="round" ${more}`
  switch (kind) {
    case 'stream':
      return [line('#2B6A8F', 9, 3), line('#DCE8EA', 7, 1.4)]
    case 'track':
      return [line('#C9BEA4', 7, 2.6), line('#FBF8F0', 5.5, 1.4)]
    case 'hedge':
      return [line('#7B6E55', 2, 2, 'stroke-dasharray="0.1 5" stroke-linecap="round"')]
    case 'pond':
      return ['fill="#DCE8EA" stroke="#2B6A8F" stroke-width="1.4"']
    default:
      return ['fill="#5A4A3C"']
  }
}
