import { readFileSync } from 'node:fs'
import type { FeatureCollection, LineString, Point, Polygon } from 'geojson'
import type { FarmMapData } from '../../server/reports/farmMapReportData.ts'
import type { CreateGround, CreateSite } from '../../shared/contract/ground.ts'
import type { PlaceGeometry } from '../../shared/geo/geometryTypes.ts'
import { measurePolygon } from '../../shared/geo/measurePolygon.ts'

interface Drawn { name: string | null; ground?: Pick<CreateGround, 'kind' | 'widthM'>; site?: Pick<CreateSite, 'kind' | 'keepClearM'> }
const read = <Shape extends LineString | Point | Polygon, Facts>(name: string) =>
  (JSON.parse(readFileSync(`server/demo/${name}.geojson`, 'utf8')) as FeatureCollection<Shape, Facts>).features
const metres = (text: string | null): number | null => (text === null ? null : Number(text))

/** Everything the map of the demo farm shows. */
export function buildFarmMap(overrides: Partial<FarmMapData> = {}): FarmMapData {
  const drawn = read<LineString | Point | Polygon, Drawn>('demoGround').map(({ geometry, properties }) => ({ ...properties, geometry: geometry as PlaceGeometry }))
  return {
    farm: { name: 'Wennick Hollow', zone: 'America/Los_Angeles' }, language: 'en', paper: 'a4', printedAt: '2026-06-16T16:15:00Z',
    blocks: read<Polygon, { code: string; name: string; crop: string }>('demoBlocks').map(({ geometry, properties: { code, name, crop } }) => {
      const outline = geometry as Extract<PlaceGeometry, { type: 'Polygon' }>
      return { code, name, crop, geometry: outline, areaM2: measurePolygon(outline).areaM2 }
    }),
    ground: drawn.flatMap(({ name, geometry, ground }) => (ground ? [{ name, geometry, kind: ground.kind, widthM: metres(ground.widthM) }] : [])),
    sites: drawn.flatMap(({ name, geometry, site }) => (site ? [{ name: name ?? '', geometry, kind: site.kind, keepClearM: metres(site.keepClearM), note: null }] : [])),
    ...overrides,
  }
}
