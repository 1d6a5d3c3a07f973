import { beforeAll, describe, expect, it } from 'vitest'
import { isLyingFarm, planGround } from '../../../server/reports/farmMap/planGround.ts'
import type { FarmMapData } from '../../../server/reports/farmMapReportData.ts'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import { buildFarmMap } from '../../support/buildFarmMap.ts'
import { contentOf, drawReport, readPdf, type ReadPdf } from '../../support/readPdf.ts'

const draw = async (overrides: Partial<FarmMapData> = {}) => drawReport({ kind: 'farmMap', data: buildFarmMap(overrides) })
/** A rectangle of so many degrees. */
const rectangle = (east: number, north: number): Boundary => ({ type: 'Polygon', coordinates: [[[0, 0], [east, 0], [east, north], [0, north], [0, 0]]] })
const block = (geometry: Boundary, code = 'A1') => ({ code, name: 'Piece', crop: null, areaM2: 12_345, geometry })

/** Letters of a turned line come one by one. */
const unspaced = (text: string) => text.replaceAll(/\s/g, '')

describe('the map of a farm on paper', () => {
  let pdf: ReadPdf
  beforeAll(async () => { pdf = readPdf(await draw()) })

  it('is a sound, tagged file with its letters in it', () => {
    expect(pdf.check).toContain('No syntax or stream encoding errors')
    expect(pdf.info).toMatchObject({ Tagged: 'yes', 'Page size': '595.28 x 841.89 pts (A4)', Title: 'Wennick Hollow, Farm map' })
    expect(pdf.fonts.every((line) => / yes yes yes /.test(line))).toBe(true)
  })

  it('writes every block and every site with its distance on the map, and says the same where it is not seen', () => {
    const [map = ''] = pdf.pages
    for (const { code } of buildFarmMap().blocks) expect(map).toMatch(new RegExp(`\\b${code}\\b`))
    for (const words of ['Yard well, 30 m', 'Hives, 18 m', 'Brook Cottage, 20 m', 'Wenn Brook, 15 m', 'Hollow Lane']) expect(unspaced(map)).toContain(unspaced(words))
    const [alt = ''] = pdf.alts
    expect(alt).toMatch(/^Map of Wennick Hollow at 1 : \d\s\d{3}, north up\. Blocks: A1 1\.00 ha; /)
    expect(alt).toContain('Yard well, 30 m')
  })

  it('has its scale, its key, north, the day, and tables of blocks and sites', () => {
    const [map = '', ...tables] = pdf.pages.map((text) => text.replaceAll(/\s+/g, ' '))
    expect(map).toMatch(/1 : \d\s\d{3} at this size/)
    for (const words of ['keep clear', 'building', '24 blocks, 23.87 ha as drawn', '16 June 2026']) expect(map).toContain(words)
    expect(tables.join(' ')).toContain('In all 23.87')
    expect(tables.join(' ')).toContain('Neighbour’s land neighbour’s crop not written down')
    expect(pdf.structure).toMatch(/Figure/)
    expect(pdf.structure.match(/\bTable\b/g)?.length).toBeGreaterThanOrEqual(2)
  })

  it('lies where the farm is wider than high, on the paper asked for', async () => {
    for (const [paper, size] of [['a4', '841.89 x 595.28'], ['a3', '1190.55 x 841.89'], ['letter', '792 x 612']] as const) {
      const { info, pages } = readPdf(await draw({ paper, language: 'es', blocks: [block(rectangle(0.02, 0.004))], sites: [], ground: [] }))
      expect(info['Page size']).toContain(size)
      expect(pages[0]).toContain('1 parcela')
      expect(pages[1]).toContain('No se sabe si los hay.')
    }
  })

  it('draws at the largest whole scale at which the blocks stand in the frame', () => {
    const ground = planGround(buildFarmMap({ blocks: [block(rectangle(0.004, 0.009))], sites: [], ground: [] }))
    expect(isLyingFarm(ground, 'a4')).toBe(false)
    // 1° of longitude on the equator is 111 319.491 m, 0.009° of latitude there 995.17 m (WGS84, NIMA TR8350.2).
    expect(ground?.whole.widthM).toBeCloseTo(445.278, 2)
    expect(ground?.whole.heightM).toBeCloseTo(995.17, 1)
  })

  it('says so where nothing is drawn yet', async () => {
    const { pages } = readPdf(await draw({ blocks: [], sites: [], ground: [] }))
    expect(pages).toHaveLength(1)
    expect(pages[0]).toContain('Nothing is drawn on this farm yet.')
  })

  it('dashes a ring for each distance and for nothing else', async () => {
    const { sites } = buildFarmMap()
    const dashes = (read: ReadPdf) => contentOf(read).filter((line) => /^\[3\.2 2\.2\] 0 d$/.test(line)).length
    // One more is in the key.
    expect(dashes(pdf)).toBe(sites.filter(({ keepClearM }) => keepClearM !== null).length + 1)
    expect(dashes(readPdf(await draw({ sites: sites.map((site) => ({ ...site, keepClearM: null })) })))).toBe(0)
  })

  it('is the same bytes for the same farm', async () => {
    expect((await draw()).equals(await draw())).toBe(true)
  })
})
