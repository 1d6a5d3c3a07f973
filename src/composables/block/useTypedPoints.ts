import { computed, type ComputedRef } from 'vue'
import type { Position } from '../../../shared/geo/geometryTypes.ts'
import type { PointProblem } from '../../../shared/geo/parsePointLine.ts'
import { parsePoints } from '../../../shared/geo/parsePoints.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import { translate, type Language } from '../../../shared/messages/translate.ts'
import { isSameCorner } from '../../../shared/geo/isSameCorner.ts'
import { isLatitudeOut, swapLines } from './swapLines.ts'

/** Typed points, read line by line. */
export interface TypedPoints {
  points: ComputedRef<readonly Position[]>
  /** What could not be read, one sentence a line; at most five, then how many more. Exchanged axes are said once. */
  errors: ComputedRef<readonly string[]>
  /** The text with latitude and longitude exchanged in every line; null unless longitude seems to come first. */
  swapped: ComputedRef<string | null>
}

const MOST_SHOWN = 5
const WORDS: Partial<Record<PointProblem['code'], string>> = {
  'points.minutes_out_of_range': 'blocks.points.minutes',
  'points.lat_out_of_range': 'blocks.points.outOfRange',
  'points.lon_out_of_range': 'blocks.points.outOfRange',
  'points.too_many': 'blocks.points.tooMany',
}
/** No degree is as large: such numbers are metres of a map grid. */
const MOST_DEGREES = 360

/** Reads typed points as they are typed; a last line that repeats the first closes the ring and is dropped. */
export function useTypedPoints(text: () => string, language: () => Language): TypedPoints {
  const read = computed(() => parsePoints(text()))
  const swapped = computed(() => swapLines(text(), read.value.findings))
  return {
    swapped,
    points: computed(() => withoutClosing(read.value.points)),
    errors: computed(() => {
      const isSwapped = swapped.value !== null
      const found = read.value.findings.filter((finding) => !isSwapped || !isLatitudeOut(finding))
      const order = isSwapped ? [translate(language(), 'blocks.points.lonFirst')] : []
      const shown = found.slice(0, MOST_SHOWN).map((finding) => {
        const words = translate(language(), wordsFor(finding))
        return renderMessage(language(), { id: 'blocks.points.line', params: { line: finding.line, words } })
      })
      const rest = found.length - shown.length
      const more = rest > 0 ? [renderMessage(language(), { id: 'blocks.points.more', params: { count: rest } })] : []
      return [...order, ...shown, ...more]
    }),
  }
}

function wordsFor({ code, params }: PointProblem): string {
  const isMetres = [params['lat'], params['lon']].some((value) => typeof value === 'number' && Math.abs(value) > MOST_DEGREES)
  return isMetres ? 'blocks.points.degreesNeeded' : (WORDS[code] ?? 'blocks.points.unreadable')
}

function withoutClosing(points: readonly Position[]): readonly Position[] {
  const [first, last] = [points[0], points.at(-1)]
  const closes = first !== undefined && last !== undefined && points.length > 3 && isSameCorner(first, last)
  return closes ? points.slice(0, -1) : points
}
