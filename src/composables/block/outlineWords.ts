import type { GeometryFinding } from '../../../shared/geo/geometryTypes.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import { translate, type Language } from '../../../shared/messages/translate.ts'

const OWN_WORDS: Partial<Record<string, string>> = {
  'geometry.self_intersection': 'blocks.draw.crossing',
  'geometry.area_range': 'blocks.geometry.area_range',
  'geometry.hole_outside': 'shapes.finding.hole_outside',
  'geometry.holes_overlap': 'shapes.finding.holes_overlap',
  'geometry.parts_overlap': 'shapes.finding.parts_overlap',
}
/** Codes whose words the refusals hold already. */
const KNOWN = new Set([
  'geometry.type', 'geometry.out_of_range', 'geometry.maybe_swapped', 'geometry.degrees_needed', 'geometry.crs', 'geometry.not_closed', 'geometry.too_few_points',
  'geometry.area_zero', 'geometry.spike', 'geometry.too_many_points', 'geometry.crosses_antimeridian', 'geometry.too_fine',
  'split.too_short', 'split.crosses_itself', 'split.ends_inside', 'split.misses', 'split.not_possible',
])

/** What is impossible in an outline, in words. */
export function outlineWords(language: Language, finding: GeometryFinding): string {
  const { code, params } = finding
  const own = OWN_WORDS[code]
  if (own !== undefined) return renderMessage(language, { id: own, params })
  if (!KNOWN.has(code)) return translate(language, 'blocks.geometry.other')
  return renderMessage(language, { id: `problems.${code}`, params })
}

/** Numbers (from 0) of the edges that cross, as found. */
export function crossingEdges(findings: readonly GeometryFinding[]): number[] {
  return findings
    .filter(({ code }) => code === 'geometry.self_intersection')
    .flatMap(({ params }) => [params['edgeA'], params['edgeB']])
    .filter((edge) => typeof edge === 'number')
    .map((edge) => edge - 1)
}
