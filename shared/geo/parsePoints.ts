import type { Position } from './geometryTypes.ts'
import { parsePointLine, type PointProblem } from './parsePointLine.ts'
import { MAX_POINTS } from './readRings.ts'

/** What is wrong in one line, counted from 1. */
export interface LineFinding extends PointProblem { line: number }
export interface ParsedPoints {
  /** [longitude, latitude] of every line that could be read, in order. */
  points: Position[]
  findings: LineFinding[]
}

/**
 * Points as a person types or pastes them, one a line, latitude first: decimal degrees (`-37.1234, 175.5`) or degrees, minutes and
 * seconds with their letters (`37°7'24"S 175°30'0"E`). Empty lines are passed over. Never throws; lines beyond 5 000 points are
 * one finding, `points.too_many`.
 */
export function parsePoints(text: string): ParsedPoints {
  const points: Position[] = []
  const findings: LineFinding[] = []
  for (const [index, typed] of text.split(/\r\n|[\n\r]/).entries()) {
    if (typed.trim() === '') continue
    if (points.length + findings.length >= MAX_POINTS) {
      findings.push({ line: index + 1, code: 'points.too_many', params: { max: MAX_POINTS } })
      break
    }
    const read = parsePointLine(typed)
    if (Array.isArray(read)) points.push(read)
    else findings.push({ line: index + 1, ...read })
  }
  return { points, findings }
}
