import bidiFactory from 'bidi-js'
import type { Canvas, TextStyle } from './canvas.ts'
import { measureRun } from './measureRun.ts'
import { toLetters, type Run } from './splitRuns.ts'

/** A run on its line. */
export interface PlacedRun {
  run: Run
  style: TextStyle
  /** Where it begins, points from the line's left. */
  left: number
  /** What was typed, where the drawing says it otherwise. */
  spoken: string | null
  /** Its letters are drawn the last one first. */
  isReversed: boolean
}

const bidi = bidiFactory()
const RIGHT_TO_LEFT = /[\u0590-\u08FF\uFB1D-\uFDFF\uFE70-\uFEFC\u{10800}-\u{10FFF}\u{1E800}-\u{1EFFF}]/u

/** Whether a text reads from right to left: its first letter says so, what is isolated in it does not. */
export function isRightToLeft(text: string): boolean {
  return RIGHT_TO_LEFT.test(text) && bidi.getEmbeddingLevels(text, 'auto').paragraphs[0]?.level === 1
}

/** Sets words that somebody typed apart, so that their direction stays their own in a sentence around them. */
export function isolate(text: string): string {
  return RIGHT_TO_LEFT.test(text) ? `\u2068${text}\u2069` : text
}

/**
 * Where the runs of one line stand, in the order of reading; a line with letters of both directions is ordered as a reader sees it.
 * @source Unicode Standard Annex #9, by the library; letters inside a run that reads from the right are shaped by the font library.
 */
export function placeRuns(canvas: Canvas, spans: readonly { text: string; style: TextStyle }[], fromRight: boolean): PlacedRun[] {
  const text = spans.map((span) => span.text).join('')
  const runs = RIGHT_TO_LEFT.test(text) ? orderedRuns(canvas, spans, { text, fromRight }) : plainRuns(canvas, spans)
  let left = 0
  for (const placed of [...runs].sort((a, b) => a.order - b.order)) {
    placed.left = left
    left += measureRun(canvas, placed.run, placed.style.size)
  }
  return runs
}

type Ordered = PlacedRun & { order: number }

function plainRuns(canvas: Canvas, spans: readonly { text: string; style: TextStyle }[]): Ordered[] {
  const runs = spans.flatMap(({ text, style }) => canvas.runsOf(text, style.weight).map((run) => ({ run, style })))
  return runs.map(({ run, style }, order) => ({ run, style, order, left: 0, spoken: run.isBox ? run.typed : null, isReversed: false }))
}

function orderedRuns(
  canvas: Canvas, spans: readonly { text: string; style: TextStyle }[], { text, fromRight }: { text: string; fromRight: boolean },
): Ordered[] {
  const embedding = bidi.getEmbeddingLevels(text, fromRight ? 'rtl' : 'ltr')
  const { levels } = embedding
  const mirrored = bidi.getMirroredCharactersMap(text, levels)
  const seenAt = new Map(bidi.getReorderedIndices(text, embedding).map((index, place) => [index, place]))
  const shown = Array.from({ length: text.length }, (_, index) => mirrored.get(index) ?? text.charAt(index)).join('')
  const runs: Ordered[] = []
  let from = 0
  for (const span of spans) {
    const end = from + span.text.length
    while (from < end) {
      let to = from + 1
      while (to < end && levels[to] === levels[from]) to += 1
      const turns = (levels[from] ?? 0) % 2 === 1
      let at = from
      for (const run of canvas.runsOf(shown.slice(from, to), span.style.weight)) {
        const places = Array.from(run.typed, (_, offset) => seenAt.get(at + offset) ?? 0)
        const typed = text.slice(at, at + run.typed.length)
        const isReversed = turns && !run.isBox && RIGHT_TO_LEFT.test(run.text)
        runs.push({
          run: turns && !isReversed ? turnSigns(run) : run, style: span.style, order: Math.min(...places), left: 0, isReversed,
          spoken: run.isBox || (turns && !isReversed) ? typed : null,
        })
        at += run.typed.length
      }
      from = to
    }
  }
  return runs
}

/** Signs between words that read from the right; letters of such a script are turned by the font library. */
function turnSigns(run: Run): Run {
  return run.isBox ? run : { ...run, text: toLetters(run.text).reverse().join('') }
}
