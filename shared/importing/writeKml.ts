import { boundaryParts } from '../geo/boundaryParts.ts'
import type { Ring } from '../geo/geometryTypes.ts'
import type { GivenBlock } from './writeGeoJson.ts'

const MARKS: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&apos;', '\t': '&#9;' }
const escape = (text: string): string => text.replace(/[&<>"'\t]/g, (mark) => MARKS[mark] ?? mark)

/** Blocks as KML 2.2 in UTF-8: a placemark each, with code, name, crop and area in square metres as its data. */
export function writeKml(blocks: readonly GivenBlock[], title: string): string {
  return [
    '<?xml version="1.0" encoding="UTF-8"?>', '<kml xmlns="http://www.opengis.net/kml/2.2">', '<Document>', `<name>${escape(title)}</name>`,
    ...blocks.map(placemark), '</Document>', '</kml>', '',
  ].join('\n')
}

function placemark({ code, name, crop, areaM2, geometry }: GivenBlock): string {
  const data = Object.entries({ code, name, crop: crop ?? '', areaM2: areaM2.toFixed(1) })
    .map(([key, value]) => `<Data name="${key}"><value>${escape(value)}</value></Data>`)
  const polygons = boundaryParts(geometry).map(polygon).join('')
  const shape = geometry.type === 'Polygon' ? polygons : `<MultiGeometry>${polygons}</MultiGeometry>`
  return `<Placemark><name>${escape(name)}</name><ExtendedData>${data.join('')}</ExtendedData>${shape}</Placemark>`
}

function polygon([outer = [], ...holes]: Ring[]): string {
  const inner = holes.map((hole) => `<innerBoundaryIs>${linearRing(hole)}</innerBoundaryIs>`).join('')
  return `<Polygon><outerBoundaryIs>${linearRing(outer)}</outerBoundaryIs>${inner}</Polygon>`
}

const linearRing = (ring: Ring): string =>
  `<LinearRing><coordinates>${ring.map(([lon, lat]) => `${plain(lon)},${plain(lat)}`).join(' ')}</coordinates></LinearRing>`

/** Seven decimals, as they are kept; never in powers of ten. */
const plain = (degrees: number): string => degrees.toFixed(7).replace(/\.?0+$/, '')
