import type { Fonts, Weight } from './openFonts.ts'

/** Text that one face can draw; `standsFor` is what could not be drawn where a run holds replacement marks. */
export interface Run { face: string; text: string; standsFor: string | null }

const REPLACEMENT = '\uFFFD'
/** Marks that show nothing of themselves: joiners, soft hyphens, variation selectors. */
const IGNORABLE = /\p{Default_Ignorable_Code_Point}/gu
/** Spaces and hyphens that the fonts lack, as those that they have. */
const TWINS: Record<string, string> = {
  '\t': ' ', '\u2002': ' ', '\u2003': ' ', '\u2009': ' ', '\u200A': ' ', '\u3000': ' ', '\u202F': '\u00A0', '\u2010': '-', '\u2011': '-',
}
/** Letters that stand alone, each of one code point: nearly all there is to print. */
const PLAIN = /^[\p{L}\p{N}\p{P}\p{S} \u00A0]+$/u
const segmenter = new Intl.Segmenter('en', { granularity: 'grapheme' })

/** Letters as a reader counts them: a base with its marks, an emoji with its joiners. */
export function toLetters(text: string): string[] {
  return Array.from(segmenter.segment(text), ({ segment }) => segment)
}

/** Cuts text into runs of one face each. A letter that no face holds shows as a replacement mark and is never lost. */
export function splitRuns(text: string, weight: Weight, fonts: Fonts): Run[] {
  const whole = PLAIN.test(text) ? fonts.findFace(weight, text) : null
  if (whole !== null) return [{ face: whole, text, standsFor: null }]
  const runs: Run[] = []
  for (const letter of toLetters(text)) {
    const run = drawLetter(letter, weight, fonts)
    const last = runs.at(-1)
    if (run === null) continue
    if (last && last.face === run.face && (last.standsFor === null) === (run.standsFor === null)) {
      last.text += run.text
      if (last.standsFor !== null) last.standsFor += run.standsFor
    } else {
      runs.push(run)
    }
  }
  return runs
}

function drawLetter(letter: string, weight: Weight, fonts: Fonts): Run | null {
  const drawn = TWINS[letter] ?? letter.replace(IGNORABLE, '').replace(/\p{Cc}/gu, ' ')
  if (drawn === '') return null
  const face = fonts.findFace(weight, drawn)
  if (face !== null) return { face, text: drawn, standsFor: null }
  return { face: `${weight}-latin`, text: REPLACEMENT, standsFor: letter }
}
