import type { Message } from '../contract/common.ts'
import { lineText } from '../contract/text.ts'
import { checkBoundary } from '../geo/checkBoundary.ts'
import type { Position } from '../geo/geometryTypes.ts'
import { measurePolygon } from '../geo/measurePolygon.ts'
import type { NamedBoundary } from '../geo/findOverlaps.ts'
import { countPoints } from './countPoints.ts'
import { findDoubts, placed, type Placed } from './findDoubts.ts'
import type { Candidate, ImportOptions, ReadFile, ReadShape } from './importTypes.ts'
import { outlineOf } from './outlineOf.ts'
import { proposeCodes, withoutMarks } from './proposeCodes.ts'
import { thinOutline } from './thinOutline.ts'

/** What stands on the farm already. */
export interface ImportGround {
  blocks: (NamedBoundary & { name: string })[]
  /** A point of the farm [lon, lat]; null before its first block. */
  place: Position | null
}

/** Findings at most said of one shape. */
const MOST_FINDINGS = 3
const nameText = lineText(80)
const cropText = lineText(120)

/**
 * Every shape of a file as a block to be, or as refused with its reasons: as many as there are shapes, in their order. Codes are
 * proposed so that no two are alike; what lies on other blocks, on each other or far away is doubted.
 */
export function judgeShapes(file: Pick<ReadFile, 'shapes'>, options: ImportOptions, ground: ImportGround): Candidate[] {
  const judged = file.shapes.map((shape, index) => judgeOutline(shape, index + 1, options))
  const names = file.shapes.map(({ properties }) => words(nameText, valueOf(properties, options.nameColumn), 80))
  const wanted = file.shapes.map(({ properties }, index) => valueOf(properties, options.codeColumn) || (names[index] ?? ''))
  const standing = judged.flatMap(({ geometry }, index) => (geometry === null ? [] : [index]))
  const proposed = proposeCodes(standing.map((index) => wanted[index] ?? ''), ground.blocks.map(({ code }) => code))
  const codes = new Map(standing.map((index, place) => [index, proposed[place] ?? '']))
  const candidates = judged.map((candidate, index): Candidate => {
    const code = codes.get(index) ?? ''
    return { ...candidate, code, name: names[index] || code, crop: words(cropText, valueOf(file.shapes[index]?.properties ?? {}, options.cropColumn), 120) }
  })
  return addDoubts(candidates, ground)
}

function judgeOutline({ geometry, refusal }: ReadShape, number: number, options: ImportOptions): Candidate {
  const found = refusal === null ? outlineOf(geometry, options) : { geometry: null, refusal, notes: [] }
  const base = { number, name: '', code: '', crop: '', geometry: null, areaM2: 0, points: 0, pointsRead: 0, refusals: [], cautions: [], notes: found.notes, twin: null }
  if (found.refusal !== null) return { ...base, refusals: [found.refusal] }
  const pointsRead = countPoints(found.geometry)
  const { geometry: outline, findings } = checkBoundary(thinOutline(found.geometry, options.toleranceM))
  if (outline === null) {
    const refusals = findings.slice(0, MOST_FINDINGS).map(({ code, params }) => ({ id: `problems.${code}`, params: rounded(params) }))
    return { ...base, pointsRead, refusals }
  }
  const points = countPoints(outline)
  const thinned: Message[] = options.toleranceM > 0 && points < pointsRead ? [{ id: 'importing.note.thinned', params: { points, from: pointsRead } }] : []
  return { ...base, geometry: outline, areaM2: measurePolygon(outline).areaM2, points, pointsRead, notes: [...found.notes, ...thinned] }
}

function addDoubts(candidates: readonly Candidate[], ground: ImportGround): Candidate[] {
  const there = ground.blocks.map(placed)
  const before: Placed[] = []
  return candidates.map((candidate) => {
    const { geometry, code, name, number } = candidate
    if (geometry === null) return candidate
    const shape = placed({ id: `shape ${number}`, code, name, geometry })
    const doubts = findDoubts(shape, there, before, ground.place)
    before.push(shape)
    return { ...candidate, ...doubts }
  })
}

const valueOf = (properties: Record<string, string>, column: string | null): string => (column === null ? '' : (properties[column] ?? ''))

/** Words that a block can hold: as they are, or else without marks that do not show and cut to their room. */
function words(schema: typeof nameText, found: string, most: number): string {
  const asItIs = schema.safeParse(found)
  const read = asItIs.success ? asItIs : schema.safeParse(withoutMarks(withoutMarks(found).slice(0, most)))
  return read.success ? read.data : ''
}

/** Areas of a square metre in words need no more. */
function rounded(params: Message['params']): Message['params'] {
  return Object.fromEntries(Object.entries(params).map(([name, value]) => [name, typeof value === 'number' ? Number(value.toPrecision(9)) : value]))
}
