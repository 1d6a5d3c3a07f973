import { bbox, feature, featureCollection } from '@turf/turf'
import type { Reader } from '../../../shared/messages/readFigure.ts'
import { areaText, areaWords, spokenWords } from './blockWords.ts'
import type { ImportRow } from './importRows.ts'
import type { MapBlock, MapView } from '../map/mapTypes.ts'

const PREFIX = 'shape '

/** The shapes that come in, as the map draws them among the blocks that are there. */
export function comingBlocks(reader: Reader, rows: readonly ImportRow[]): MapBlock[] {
  return rows.flatMap(({ number, code, name, geometry, areaM2, taken }) => {
    if (geometry === null || !taken) return []
    const areaFigure = areaText(reader, areaM2)
    return [{
      id: `${PREFIX}${number}`, code, geometry, areaM2, areaFigure, isComing: true,
      areaText: areaWords(reader, areaM2), spoken: spokenWords(reader, { code, name, area: areaFigure }),
    }]
  })
}

/** The number of a shape on the map; null for a block that is there already. */
export function shapeNumber(id: string): number | null {
  return id.startsWith(PREFIX) ? Number(id.slice(PREFIX.length)) : null
}

const TILE_PX = 256
const NEAREST_ZOOM = 17

/** Where a map of so many pixels sees every shape that can come in; null where there is none. */
export function viewOf(rows: readonly ImportRow[], px: number): MapView | null {
  const outlines = rows.flatMap(({ geometry }) => (geometry === null ? [] : [feature(geometry)]))
  if (outlines.length === 0) return null
  const [west, south, east, north] = bbox(featureCollection(outlines))
  const middle = (south + north) / 2
  // Mercator draws a degree of latitude wider than one of longitude by this much.
  const wide = Math.max(east - west, (north - south) / Math.cos((middle * Math.PI) / 180), 1e-6)
  return { centre: [(west + east) / 2, middle], zoom: Math.min(NEAREST_ZOOM, Math.log2((360 * px) / (TILE_PX * wide))) }
}
