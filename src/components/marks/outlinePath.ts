import type { Boundary } from '../../../shared/contract/block.ts'

const MARGIN = 2
/** More corners than this cannot be seen in a glyph. */
const MOST_CORNERS = 120

/**
 * The outline of a boundary as an SVG path that fills a square, north up, shape kept.
 * Degrees of longitude are narrowed by the cosine of the latitude, which is enough for a drawing of this size.
 * @param size side of the square, pixels.
 */
export function outlinePath(geometry: Boundary, size: number): string {
  const polygons = geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates
  const rings = polygons.flat()
  const latitudes = rings.flat().map(([, lat]) => lat)
  if (latitudes.length === 0) return ''
  const narrow = Math.cos(((Math.min(...latitudes) + Math.max(...latitudes)) / 2) * (Math.PI / 180))
  const flat = rings.map((ring) => thin(ring).map(([lon, lat]) => [lon * narrow, -lat] as const))
  const xs = flat.flat().map(([x]) => x)
  const ys = flat.flat().map(([, y]) => y)
  const [minX, maxX, minY, maxY] = [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)]
  const scale = (size - 2 * MARGIN) / Math.max(maxX - minX, maxY - minY, Number.EPSILON)
  const place = ([x, y]: readonly [number, number]): string =>
    `${(size / 2 + (x - (minX + maxX) / 2) * scale).toFixed(2)} ${(size / 2 + (y - (minY + maxY) / 2) * scale).toFixed(2)}`
  return flat.map((ring) => `M${ring.map(place).join('L')}Z`).join('')
}

function thin<Point>(ring: Point[]): Point[] {
  const step = Math.ceil(ring.length / MOST_CORNERS)
  return step <= 1 ? ring : ring.filter((_, index) => index % step === 0)
}
