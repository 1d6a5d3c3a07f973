import fc from 'fast-check'
import { execFileSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { lineText } from '../../../shared/contract/text.ts'
import { checkBoundary } from '../../../shared/geo/checkBoundary.ts'
import type { Boundary, Ring } from '../../../shared/geo/geometryTypes.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import { guessColumns } from '../../../shared/importing/guessColumns.ts'
import { judgeShapes } from '../../../shared/importing/judgeShapes.ts'
import { writeGeoJson, type GivenBlock } from '../../../shared/importing/writeGeoJson.ts'
import { writeKml } from '../../../shared/importing/writeKml.ts'
import { readImport } from '../../../shared/importing/read/readImport.ts'

/** A ring round a place, as far from its middle in each direction as it happens to be. */
const ringAt = (lon: number, lat: number, reach: number, spans: readonly number[]): Ring => {
  const open = spans.map((span, index): [number, number] => {
    const angle = (2 * Math.PI * index) / spans.length
    return [lon + reach * span * Math.cos(angle), lat + reach * span * Math.sin(angle)]
  })
  return [...open, ...open.slice(0, 1)]
}
const spans = fc.array(fc.double({ min: 0.5, max: 1, noNaN: true }), { minLength: 3, maxLength: 40 })
const boundary: fc.Arbitrary<Boundary> = fc
  .record({ lon: fc.double({ min: -179, max: 178, noNaN: true }), lat: fc.double({ min: -80, max: 80, noNaN: true }), outer: spans, hole: fc.option(spans), second: fc.option(spans) })
  .map(({ lon, lat, outer, hole, second }) => {
    const rings = [ringAt(lon, lat, 0.002, outer), ...(hole === null ? [] : [ringAt(lon, lat, 0.0002, hole)])]
    const shape = second === null ? { type: 'Polygon', coordinates: rings } : { type: 'MultiPolygon', coordinates: [rings, [ringAt(lon + 0.01, lat, 0.001, second)]] }
    return checkBoundary(shape).geometry
  })
  .filter((geometry) => geometry !== null)
const words = (most: number) => fc.string({ unit: 'grapheme', maxLength: most }).map((text) => lineText(most).safeParse(text)).filter(({ success }) => success).map(({ data }) => data ?? '')
const block: fc.Arbitrary<GivenBlock> = fc
  .record({ code: words(12), name: words(80), crop: fc.option(words(120)), geometry: boundary })
  .map((each) => ({ ...each, areaM2: measurePolygon(each.geometry).areaM2 }))
const blocks = fc.uniqueArray(block, { minLength: 1, maxLength: 6, selector: ({ code }) => code.toLowerCase() })

function readBack(text: string): Omit<GivenBlock, 'areaM2'>[] {
  const file = readImport(new TextEncoder().encode(text))
  return judgeShapes(file, { swap: false, close: false, toleranceM: 0, ...guessColumns(file) }, { blocks: [], place: null })
    .map(({ code, name, crop, geometry }) => ({ code, name, crop: crop === '' ? null : crop, geometry: geometry ?? { type: 'Polygon', coordinates: [] } }))
}
const withoutArea = (list: readonly GivenBlock[]) => list.map(({ code, name, crop, geometry }) => ({ code, name, crop, geometry }))

describe('what goes out comes back the same', () => {
  it('by GeoJSON', () => {
    fc.assert(fc.property(blocks, (list) => { expect(readBack(writeGeoJson(list))).toEqual(withoutArea(list)) }), { numRuns: 200 })
  })

  it('by KML', () => {
    fc.assert(fc.property(blocks, fc.string(), (list, title) => {
      const farm = lineText(80).safeParse(title).data ?? 'Farm'
      expect(readBack(writeKml(list, farm))).toEqual(withoutArea(list))
    }), { numRuns: 200 })
  })
})

describe('another program reads what goes out', () => {
  const list: GivenBlock[] = [
    { code: 'A<1>', name: 'Ñandú & “Süd” \'1\'', crop: null, areaM2: 100, geometry: checkedSquare(10) },
    { code: 'B"2', name: '園 = ]]>', crop: 'Apple', areaM2: 100, geometry: checkedSquare(11) },
  ]

  // By Debian's gdal-bin (3.6.2).
  it.each([
    { name: 'a.geojson', text: writeGeoJson(list), table: 'a' },
    { name: 'a.kml', text: writeKml(list, 'Farm & Co'), table: 'Farm & Co' },
  ])('$name', ({ name, text }) => {
    const folder = mkdtempSync(join(tmpdir(), 'export-'))
    try {
      writeFileSync(join(folder, name), text)
      const said = execFileSync('ogrinfo', ['-ro', '-al', join(folder, name)], { encoding: 'utf8' })
      expect(said).toContain('Feature Count: 2')
      for (const { code, name: title } of list) {
        expect(said).toContain(code)
        expect(said).toContain(title)
      }
      expect(said).toMatch(/POLYGON (?:Z )?\(\(10 45/)
    } finally {
      rmSync(folder, { recursive: true })
    }
  })
})

function checkedSquare(lon: number): Boundary {
  const { geometry } = checkBoundary({ type: 'Polygon', coordinates: [[[lon, 45], [lon + 0.001, 45], [lon + 0.001, 45.001], [lon, 45.001], [lon, 45]]] })
  if (geometry === null) throw new RangeError('a square is a boundary')
  return geometry
}
