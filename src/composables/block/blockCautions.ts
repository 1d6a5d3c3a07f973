import type { Message } from '../../../shared/contract/common.ts'
import type { Problem } from '../../../shared/contract/problem.ts'
import type { Boundary, Position } from '../../../shared/geo/geometryTypes.ts'
import { distanceKm } from '../../../shared/geo/distanceKm.ts'
import { findOverlaps, type NamedBoundary } from '../../../shared/geo/findOverlaps.ts'
import { isFarFrom } from '../../../shared/geo/isFarFrom.ts'
import { looksSwapped } from '../../../shared/geo/looksSwapped.ts'
import { M2_PER_HA } from '../../../shared/units/hectare.ts'

/** Something unlikely, under the code by which it is acknowledged; its sentences are messages or ready words. */
export interface Caution {
  code: string
  sentences: (Message | string)[]
}

/** Under this share of the smaller block an overlap is the width of a pen. */
const LEAST_SHARE = 0.05

/**
 * What is unlikely about an outline, seen from this device: ground shared with other blocks, far from the farm, axes exchanged.
 * @param farmPlace a point of the farm [lon, lat], null before its first block.
 */
export function findCautions(geometry: Boundary, others: readonly NamedBoundary[], farmPlace: Position | null): Caution[] {
  const cautions: Caution[] = []
  const overlaps = findOverlaps(geometry, others).overlaps.filter(({ share }) => share > LEAST_SHARE)
  if (overlaps.length > 0) {
    cautions.push({
      code: 'geometry.overlap',
      sentences: overlaps.map(({ code, areaM2 }) => message('overlap', { code, areaHa: toShown(areaM2 / M2_PER_HA, 2) })),
    })
  }
  if (farmPlace === null || !isFarFrom(geometry, farmPlace)) return cautions
  const km = toShown(distanceKm(geometry, farmPlace), 0)
  const code = looksSwapped(geometry, farmPlace) ? 'swapped' : 'far_from_farm'
  return [...cautions, { code: `geometry.${code}`, sentences: [message(code, { km })] }]
}

function message(name: string, params: Message['params']): Message {
  return { id: `problems.geometry.${name}`, params }
}

function toShown(value: number, digits: number): number {
  return Number(value.toFixed(digits))
}

/** What the server found unlikely, code by code, in the words of its answer. */
export function cautionsOf(problem: Problem): Caution[] {
  if (problem.acknowledgeable !== true) return []
  const byCode = new Map<string, Caution>()
  for (const { code, message: words } of problem.errors) {
    const caution = byCode.get(code) ?? { code, sentences: [] }
    caution.sentences.push(words)
    byCode.set(code, caution)
  }
  return [...byCode.values()]
}
