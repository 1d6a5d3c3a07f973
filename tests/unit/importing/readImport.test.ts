import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { guessColumns } from '../../../shared/importing/guessColumns.ts'
import { judgeShapes } from '../../../shared/importing/judgeShapes.ts'
import type { ReadFile } from '../../../shared/importing/importTypes.ts'
import { readImport } from '../../../shared/importing/read/readImport.ts'

// The files were written by GDAL 3.6.2 (tests/fixtures/import/make.sh), a writer that is not ours.
const bytesOf = (name: string): Uint8Array => new Uint8Array(readFileSync(`tests/fixtures/import/${name}`))
const read = (name: string): ReadFile => readImport(bytesOf(name))
const judge = (file: ReadFile, close = false) =>
  judgeShapes(file, { swap: false, close, toleranceM: 0, ...guessColumns(file) }, { blocks: [], place: null })
const positions = (geometry: unknown): number[][] => {
  const flat = (nested: unknown): number[][] => (Array.isArray(nested) ? (typeof nested[0] === 'number' ? [nested as number[]] : (nested as unknown[]).flatMap(flat)) : [])
  return flat((geometry as { coordinates: unknown } | null)?.coordinates)
}

const FORMATS = [
  { file: 'blocks.geojson', format: 'geojson' }, { file: 'blocks.kml', format: 'kml' }, { file: 'blocks.kmz', format: 'kml' },
  { file: 'blocks.gpx', format: 'gpx' }, { file: 'blocks.zip', format: 'shapefile' }, { file: 'utm.zip', format: 'shapefile' },
]

describe('forty shapes as another program wrote them', () => {
  it.each(FORMATS)('$file: 38 come in with their names, the two bad ones are named', ({ file, format }) => {
    const found = read(file)
    expect(found.format).toBe(format)
    const candidates = judge(found, format === 'gpx')
    expect(candidates).toHaveLength(40)
    const refused = candidates.filter(({ geometry }) => geometry === null)
    expect(refused.map(({ number, name, refusals }) => [number, name, refusals[0]?.id])).toEqual([
      // The writer of the KMZ leaves out an outline that crosses itself, and keeps its place.
      [17, 'Crossed piece', file === 'blocks.kmz' ? 'importing.refused.empty' : 'problems.geometry.self_intersection'], [29, 'Speck', 'problems.geometry.area_range'],
    ])
    expect(candidates.slice(0, 4).map(({ name }) => name)).toEqual(['Ñandú 1', 'Süd 2', 'Kāpiti 3', 'Łąka 4'])
    expect(candidates.flatMap(({ cautions }) => cautions)).toEqual([])
  })

  it.each(FORMATS.filter(({ format }) => format !== 'gpx'))('$file: codes and crops come along, the hole stays a hole', ({ file }) => {
    const candidates = judge(read(file))
    expect(candidates[0]).toMatchObject({ code: 'N1', crop: 'Apple' })
    expect(candidates[1]).toMatchObject({ code: 'N2', crop: 'Pear' })
    expect(candidates[11]?.geometry).toMatchObject({ type: 'Polygon', coordinates: [expect.any(Array), expect.any(Array)] })
  })

  it('GPX tracks are lines: none comes in until the person closes them', () => {
    const candidates = judge(read('blocks.gpx'))
    expect(candidates.every(({ geometry }) => geometry === null)).toBe(true)
    expect(new Set(candidates.map(({ refusals }) => refusals[0]?.id))).toEqual(new Set(['importing.refused.line']))
  })
})

describe('a projected shapefile against what ogr2ogr makes of it', () => {
  it.each([
    { file: 'utm', system: 'WGS 1984 UTM Zone 10N' },
    { file: 'feet', system: 'NAD 1983 StatePlane Oregon North FIPS 3601 Feet Intl' },
  ])('$file is within 1e-7 degrees', ({ file, system }) => {
    const ours = read(`${file}.zip`)
    const theirs = read(`${file}.geojson`)
    expect(ours.system).toBe(system)
    let compared = 0
    ours.shapes.forEach((shape, index) => {
      const [a, b] = [positions(shape.geometry), positions(theirs.shapes[index]?.geometry)]
      expect(a).toHaveLength(b.length)
      // A ring may be turned round on the way: the nearest point of theirs is the same one.
      for (const [lon = 0, lat = 0] of a) {
        expect(Math.min(...b.map(([x = 0, y = 0]) => Math.max(Math.abs(x - lon), Math.abs(y - lat))))).toBeLessThan(1e-7)
        compared += 1
      }
    })
    expect(compared).toBeGreaterThan(340)
  })

  it('without its .prj metres are metres, and each shape says so', () => {
    const candidates = judge(read('bare.zip'))
    expect(new Set(candidates.map(({ refusals }) => refusals[0]?.id))).toEqual(new Set(['problems.geometry.degrees_needed']))
  })
})
