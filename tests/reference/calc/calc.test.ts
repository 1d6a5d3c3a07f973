import { spawnSync } from 'node:child_process'
import { describe, expect, it } from 'vitest'
import { CANONICAL_CASES } from '../evidence/canonicalCases.ts'
import { REFERENCE_POLYGONS } from '../geo/referencePolygons.ts'
import { CALIBRATION_CASES } from '../mix/calibrationCases.ts'
import { DILUTION_CASES } from '../mix/dilutionCases.ts'
import { EXACT_CONSTANTS, PRINTED_CONSTANTS } from '../units/constantCases.ts'

const PUBLISHED = [...PRINTED_CONSTANTS, ...CALIBRATION_CASES, ...DILUTION_CASES]

function calc(input: string, ...options: string[]): { lines: string[]; status: number | null; stderr: string } {
  const run = spawnSync(process.execPath, ['--import', 'tsx', 'server/cli/calc.ts', ...options], {
    cwd: new URL('../../..', import.meta.url), input, encoding: 'utf8', maxBuffer: 64 * 1024 * 1024,
  })
  return { lines: run.stdout.split('\n').slice(0, -1), status: run.status, stderr: run.stderr }
}

const toLine = (request: unknown): string => `${JSON.stringify(request)}\n`

describe('calc', { timeout: 60_000 }, () => {
  it('reproduces every published value, one answer a line, in order', () => {
    const requests = [
      ...PUBLISHED.map(({ fn, args }) => toLine({ fn, args })),
      ...EXACT_CONSTANTS.map(({ from, to }) => toLine({ fn: 'convert', args: { value: 1, from, to } })),
      ...REFERENCE_POLYGONS.map(({ geometry }) => toLine({ fn: 'area', args: { geometry } })),
      ...CANONICAL_CASES.map(({ json }) => `{"fn":"canonical","args":{"value":${json}}}\n`),
    ]
    const { lines, status, stderr } = calc(requests.join(''))
    const answers = lines.map((line) => (JSON.parse(line) as { value: never }).value)
    expect({ status, stderr, count: answers.length }).toEqual({ status: 0, stderr: '', count: requests.length })
    for (const { id, read, expected, tolerance } of PUBLISHED) {
      expect(Math.abs(read(answers.shift() as never) - expected), id).toBeLessThanOrEqual(tolerance)
    }
    for (const { text } of EXACT_CONSTANTS) expect(answers.shift()).toBe(Number(text))
    for (const { id, areaM2, perimeterM } of REFERENCE_POLYGONS) {
      const measure = answers.shift() as unknown as { areaM2: number; perimeterM: number }
      expect(Math.abs(measure.areaM2 / areaM2 - 1), id).toBeLessThan(20e-6)
      expect(Math.abs(measure.perimeterM / perimeterM - 1), id).toBeLessThan(1e-6)
    }
    for (const { text, sha256 } of CANONICAL_CASES) expect(answers.shift()).toEqual({ text, sha256 })
  })

  it('answers what it cannot use with an error and goes on', () => {
    const bad = [
      '{bad', '', 'null', '[]', '3', '{"fn":"nope"}', '{"fn":"constructor"}', '{"fn":"area"}', '{"fn":"area","args":{"geometry":{"type":"Point"}}}',
      '{"fn":"area","args":{"geometry":{"type":"Polygon","coordinates":[[[0,0],[0,1],[1,1],[1,0]]]}}}',
      '{"fn":"convert","args":{"value":"1","from":"L","to":"mL"}}', '{"fn":"convert","args":{"value":1,"from":"L","to":"kg"}}',
      '{"fn":"convert","args":{"value":1,"from":"toString","to":"kg"}}', '{"fn":"convert","args":{"value":1e400,"from":"L","to":"mL"}}',
      '{"fn":"dilute","args":{"total":{"value":1,"unit":"kg"},"n":30,"reading":"to"}}', '{"fn":"dilute","args":{"total":{"value":1,"unit":"L"},"n":0,"reading":"to"}}',
      '{"fn":"loads","args":{"areaHa":1,"rateLPerHa":300,"tankL":0}}', '{"fn":"calibrate","args":{"kind":"flow","flowLPerMin":-1,"speedKmH":1,"widthM":1}}',
      '{"fn":"area","args":{"geometry":{"type":"Polygon","coordinates":[]}}}', '{"fn":"area","args":{"geometry":{"type":"Polygon","coordinates":[[]]}}}',
      '{"fn":"area","args":{"geometry":{"type":"MultiPolygon","coordinates":[]}}}', '{"fn":"area","args":{"geometry":{"type":"MultiPolygon","coordinates":[[]]}}}',
      '{"fn":"convert","args":{"value":-273.16,"from":"degC","to":"degF"}}', '{"fn":"convert","args":{"value":-459.68,"from":"degF","to":"degF"}}',
      '{"fn":"canonical","args":{}}', '{"fn":"canonical","args":{"value":"\\ud800"}}',
      `{"fn":"canonical","args":{"value":${'['.repeat(50_000)}${']'.repeat(50_000)}}}`,
    ]
    const { lines, status, stderr } = calc(`${bad.join('\n')}\n${toLine({ fn: 'convert', args: { value: 1, from: 'L', to: 'mL' } })}`)
    expect({ status, stderr, count: lines.length }).toEqual({ status: 0, stderr: '', count: bad.length + 1 })
    for (const line of lines.slice(0, -1)) expect(JSON.parse(line)).toEqual({ error: expect.stringMatching(/./) as string })
    expect(lines.at(-1)).toBe('{"value":1000}')
  })

  it('takes a stream of 100 000 lines', () => {
    const input = Array.from({ length: 100_000 }, (_, value) => toLine({ fn: 'convert', args: { value, from: 'L', to: 'mL' } })).join('')
    const { lines, status } = calc(input)
    expect(status).toBe(0)
    expect(lines).toHaveLength(100_000)
    expect(lines.at(-1)).toBe('{"value":99999000}')
  })

  it('lists its functions with --help and reads nothing', () => {
    const { lines, status } = calc('', '--help')
    expect(status).toBe(0)
    expect(lines.map((line) => line.split(' ')[0])).toEqual(['area', 'convert', 'dilute', 'loads', 'calibrate', 'air', 'canonical'])
  })
})
