import geodesic from 'geographiclib-geodesic'
import { describe, expect, it } from 'vitest'
import type { Boundary, Position } from '../../../shared/geo/geometryTypes.ts'
import { fitPlan } from '../../../server/reports/parts/planScale.ts'
import { findLabelPlace, type PagePoint } from '../../../server/reports/parts/labelPlace.ts'
import { findLineLabel } from '../../../shared/geo/findLineLabel.ts'
import { buildRecordReportData } from '../../support/buildRecordReportData.ts'
import { buildSignedBlock, buildSignedRecord } from '../../support/buildSignedRecord.ts'
import { contentOf, drawRecord, readPdf, type ReadPdf } from '../../support/readPdf.ts'

const base = buildSignedRecord()

function box([lon, lat]: Position, width: number, height: number): Position[] {
  return [[lon, lat], [lon + width, lat], [lon + width, lat + height], [lon, lat + height], [lon, lat]]
}

async function drawBlock(geometry: Boundary): Promise<ReadPdf> {
  const signed = buildSignedRecord({ blocks: [buildSignedBlock({ geometry })], content: { ...base.content, lines: [base.content.lines[0]!] } })
  return readPdf(await drawRecord(buildRecordReportData({ signed, neighbours: [], sites: [] })))
}

/** Corners of the outline of 1.4 points, as drawn, points. */
function outlineOf(pdf: ReadPdf): PagePoint[][] {
  const lines = contentOf(pdf)
  const from = lines.indexOf('1.4 w')
  const rings: PagePoint[][] = []
  for (const line of lines.slice(from, lines.indexOf('S', from))) {
    const [, x, y, operator] = /^(-?[\d.]+) (-?[\d.]+) ([ml])$/.exec(line) ?? []
    if (operator === 'm') rings.push([])
    if (operator) rings.at(-1)?.push([Number(x), Number(y)])
  }
  return rings
}

const printedScale = ({ text }: ReadPdf): number => Number(/1 : ([\d\s\u00A0]+?) at this size/.exec(text)?.[1]?.replace(/\D/g, ''))

describe('block to scale', () => {
  it.each([
    { name: 'a bed of 5 m', width: 0.000063, height: 0.0000108 },
    { name: 'a block of 1 ha', width: 0.0013, height: 0.0009 },
    { name: '500 ha', width: 0.0284, height: 0.02 },
  ])('$name: paper times the printed scale is the ground (oracle: geodesic of GeographicLib)', async ({ width, height }) => {
    const corner: Position = [-123.33, 44.6]
    const pdf = await drawBlock({ type: 'Polygon', coordinates: [box(corner, width, height)] })
    const [southWest, southEast, northEast] = outlineOf(pdf)[0] ?? []
    const paperM = (a?: PagePoint, b?: PagePoint): number =>
      (Math.hypot((a?.[0] ?? 0) - (b?.[0] ?? 0), (a?.[1] ?? 0) - (b?.[1] ?? 0)) / 72) * 0.0254
    const ground = (a: Position, b: Position): number => geodesic.Geodesic.WGS84.Inverse(a[1], a[0], b[1], b[0]).s12 ?? 0
    const east: Position = [corner[0] + width, corner[1]]
    const scale = printedScale(pdf)
    expect(scale).toBeGreaterThan(1)
    expect((paperM(southWest, southEast) * scale) / ground(corner, east)).toBeCloseTo(1, 3)
    expect((paperM(southEast, northEast) * scale) / ground(east, [east[0], east[1] + height])).toBeCloseTo(1, 3)
  })

  it('lays a lane under it as wide as on the ground at the printed scale, and no site a second time', async () => {
    const signed = buildSignedRecord({ blocks: [buildSignedBlock({ geometry: { type: 'Polygon', coordinates: [box([-123.33, 44.6], 0.0013, 0.0009)] } })], content: { ...base.content, lines: [base.content.lines[0]!] } })
    const lane = { kind: 'track' as const, name: 'Hollow Lane', geometry: { type: 'LineString' as const, coordinates: [[-123.3303, 44.5995], [-123.3303, 44.6015]] as Position[] } }
    const pdf = readPdf(await drawRecord(buildRecordReportData({ signed, neighbours: [], ground: [{ ...lane, widthM: 30 }], sites: [lane] })))
    const strokes = contentOf(pdf).flatMap((line) => (/^[\d.]+ w$/.test(line) ? [Number(line.slice(0, -2))] : []))
    const metre = 72 / 0.0254 / printedScale(pdf)
    expect(strokes.some((width) => Math.abs(width - 30 * metre) < 0.01)).toBe(true)
    // What a site that is no ground would be drawn with.
    expect(strokes).not.toContain(3.8)
  })

  it('draws every part and hole', async () => {
    const pdf = await drawBlock({
      type: 'MultiPolygon',
      coordinates: [[box([-123.3157, 44.6089], 0.0015, 0.001), box([-123.3153, 44.6092], 0.0006, 0.0004)], [box([-123.3138, 44.6092], 0.0004, 0.0003)]],
    })
    expect(outlineOf(pdf)).toHaveLength(3)
    expect(contentOf(pdf)).toContain('W* n')
  })

  it('names what lies beside it', async () => {
    const { text, alts } = readPdf(await drawRecord(buildRecordReportData()))
    for (const name of ['A1', 'P2', 'Yard well', 'treated 0.88 ha']) expect(text).toContain(name)
    expect(alts.join('\n')).toMatch(/north up\. Treated: A3, 0\.88 ha as drawn and A2, 0\.99 ha as drawn\. Beside it: A1 and P2\./)
  })
})

describe('fitPlan', () => {
  const frame = { x: 10, y: 20, width: 200, height: 100 }
  it('takes the largest whole scale at which the plan leaves white around it', () => {
    const view = fitPlan({ minX: -50, minY: -20, widthM: 100, heightM: 40 }, frame)
    const drawn = 100 * view.pointsPerMetre
    expect(drawn).toBeLessThanOrEqual(160)
    expect(drawn * (view.denominator / (view.denominator - 1))).toBeGreaterThan(160)
    expect(view.toPage([0, 0])).toEqual([110, 70])
    expect(view.toPage([0, 10])[1]).toBeLessThan(70)
  })
})

describe('findLabelPlace', () => {
  const square: PagePoint[] = [[0, 0], [90, 0], [90, 90], [0, 90]]
  const clip = { x: -100, y: -100, width: 400, height: 400 }
  it('takes the middle of a plain area', () => {
    expect(findLabelPlace([square], clip, 10)).toEqual({ x: 45, y: 45, width: 90 })
  })
  it('keeps out of a hole', () => {
    const place = findLabelPlace([square, [[20, 25], [70, 25], [70, 65], [20, 65]]], clip, 10)
    expect(place?.y === undefined || place.y + 5 <= 25 || place.y - 5 >= 65 || place.width === 20).toBe(true)
    expect(place).not.toBeNull()
  })
  it('finds none outside the frame or in what is lower than the label', () => {
    expect(findLabelPlace([square], { x: 200, y: 0, width: 50, height: 50 }, 10)).toBeNull()
    expect(findLabelPlace([[[0, 0], [90, 0], [90, 4], [0, 4]]], clip, 10)).toBeNull()
  })
})

describe('findLineLabel', () => {
  const frame = { x: 0, y: 0, width: 200, height: 200 }
  it('runs along the line and is never upside down', () => {
    const along = findLineLabel([[[100, 300], [100, -100]]], frame, 40)
    expect(along?.x).toBe(100)
    expect(Math.abs(along?.turn ?? 0)).toBeLessThanOrEqual(90)
    expect(findLineLabel([[[190, 100], [10, 100]]], frame, 40)?.turn).toBeCloseTo(0)
  })
  it('is left out where the line is too short in the frame', () => {
    expect(findLineLabel([[[10, 10], [30, 10]]], frame, 40)).toBeNull()
  })
})
