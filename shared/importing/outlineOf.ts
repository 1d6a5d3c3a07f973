import type { Message } from '../contract/common.ts'
import type { ImportOptions } from './importTypes.ts'

/** Figures of a polygon or several as they came, longitude first. */
type Positions = unknown[][]

/** What of a geometry may become an outline; it is still to be judged. */
export interface FoundOutline {
  /** GeoJSON of a polygon or several; null where it is refused. */
  geometry: unknown
  refusal: Message | null
  notes: Message[]
}

interface Pieces { polygons: Positions[]; lines: Positions; points: number; other: string | null }

/** Geometries inside each other beyond this are nobody's field. */
const MOST_NESTED = 1_000

/**
 * The outline in any GeoJSON geometry: polygons as they are, several in one placemark as parts of one block, lines only where the
 * person closes them, points never. Nothing is closed or left out without a note. Never throws.
 */
export function outlineOf(geometry: unknown, { swap, close }: Pick<ImportOptions, 'swap' | 'close'>): FoundOutline {
  const { polygons, lines, points, other } = piecesOf(geometry)
  if (other !== null) return refused(other === '' ? 'empty' : 'type', { type: other })
  const notes: Message[] = []
  const closed = close ? [...polygons, ...lines.map((line) => [line])].map((rings) => rings.map(closeRing)) : polygons
  if (closed.length === 0) return refused(lines.length > 0 ? 'line' : points > 0 ? 'point' : 'empty')
  if (close && hasOpened(polygons, lines)) notes.push(note('closed'))
  const left = (close ? 0 : lines.length) + points
  if (left > 0) notes.push(note('left', { count: left }))
  const turned = swap ? closed.map((rings) => rings.map((ring) => ring.map(swapPosition))) : closed
  if (swap) notes.push(note('swapped'))
  const isOne = turned.length === 1 && !isMulti(geometry)
  return { geometry: isOne ? { type: 'Polygon', coordinates: turned[0] } : { type: 'MultiPolygon', coordinates: turned }, refusal: null, notes }
}

const isMulti = (geometry: unknown): boolean => typeOf(geometry) === 'MultiPolygon'
const typeOf = (geometry: unknown): string => String(member(geometry, 'type') ?? '').slice(0, 40)
const member = (thing: unknown, name: string): unknown => (typeof thing === 'object' && thing !== null ? Reflect.get(thing, name) as unknown : undefined)
const listOf = (thing: unknown): unknown[] => (Array.isArray(thing) ? thing : [])

/** What a geometry is made of; collections are walked in a list of what is left, so that no nesting is too deep. */
function piecesOf(geometry: unknown): Pieces {
  const pieces: Pieces = { polygons: [], lines: [], points: 0, other: null }
  const left: unknown[] = [geometry]
  for (let seen = 0; left.length > 0; seen += 1) {
    const next = left.shift()
    const coordinates = member(next, 'coordinates')
    if (next === null || next === undefined || seen > MOST_NESTED) return { ...pieces, other: '' }
    switch (typeOf(next)) {
      case 'Polygon': pieces.polygons.push(listOf(coordinates).map(listOf)); break
      case 'MultiPolygon': pieces.polygons.push(...listOf(coordinates).map((rings) => listOf(rings).map(listOf))); break
      case 'LineString': pieces.lines.push(listOf(coordinates)); break
      case 'MultiLineString': pieces.lines.push(...listOf(coordinates).map(listOf)); break
      case 'Point': pieces.points += 1; break
      case 'MultiPoint': pieces.points += listOf(coordinates).length; break
      case 'GeometryCollection': left.push(...listOf(member(next, 'geometries'))); break
      default: return { ...pieces, other: typeOf(next) || 'null' }
    }
  }
  return pieces
}

function closeRing(ring: unknown[]): unknown[] {
  return isClosed(ring) ? ring : [...ring, ring[0]]
}

/** Whether anything had to be closed: an open ring, or a line of any kind. */
function hasOpened(polygons: readonly Positions[], lines: Positions): boolean {
  return lines.length > 0 || polygons.some((rings) => rings.some((ring) => !isClosed(ring)))
}

function isClosed(ring: readonly unknown[]): boolean {
  const [first, last] = [listOf(ring[0]), listOf(ring.at(-1))]
  return ring.length === 0 || (first[0] === last[0] && first[1] === last[1])
}

function swapPosition(position: unknown): unknown {
  const [first, second] = listOf(position)
  return [second, first]
}

const note = (name: string, params: Message['params'] = {}): Message => ({ id: `importing.note.${name}`, params })
const refused = (name: string, params: Message['params'] = {}): FoundOutline => ({ geometry: null, refusal: { id: `importing.refused.${name}`, params }, notes: [] })
