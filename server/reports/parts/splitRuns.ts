import type { Weight } from './fontFiles.ts'
import type { Fonts } from './openFonts.ts'

/** Text that one face draws. */
export interface Run {
  face: string
  /** What is drawn: letters, or the code points of one letter that no face holds, `U+0E01`, for its box. */
  text: string
  /** The stretch of what was typed that it draws. */
  typed: string
  isBox: boolean
}

/** Marks that show nothing of themselves: joiners, soft hyphens, variation selectors. */
const IGNORABLE = /\p{Default_Ignorable_Code_Point}/gu
/** Spaces and hyphens that the fonts lack, as those that they have. */
const TWINS: Record<string, string> = {
  '\t': ' ', '\u2002': ' ', '\u2003': ' ', '\u2009': ' ', '\u200A': ' ', '\u3000': ' ', '\u202F': '\u00A0', '\u2010': '-', '\u2011': '-',
}
/** Letters that stand alone, each of one code point: nearly all there is to print. */
const PLAIN = /^[\p{L}\p{N}\p{P}\p{S} \u00A0]+$/u
/** What a box holds of a letter of many marks. */
const MOST_CODES = 2
const segmenter = new Intl.Segmenter('en', { granularity: 'grapheme' })

/** Letters as a reader counts them: a base with its marks, an emoji with its joiners. */
export function toLetters(text: string): string[] {
  return Array.from(segmenter.segment(text), ({ segment }) => segment)
}

/** Cuts text into runs of one face each. A letter that no face holds gets a box with its code points and is never lost. */
export function splitRuns(text: string, weight: Weight, fonts: Fonts): Run[] {
  const whole = PLAIN.test(text) ? fonts.findFace(weight, text) : null
  if (whole !== null) return [{ face: whole, text, typed: text, isBox: false }]
  const runs: Run[] = []
  /** Typed and not drawn, before anything is. */
  let unseen = ''
  for (const letter of toLetters(text)) {
    const drawn = drawLetter(letter, weight, fonts)
    const last = runs.at(-1)
    if (drawn === null) {
      if (last) last.typed += letter
      else unseen += letter
    } else if (last && last.face === drawn.face && !last.isBox && !drawn.isBox) {
      last.text += drawn.text
      last.typed += letter
    } else {
      runs.push({ ...drawn, typed: unseen + letter })
      unseen = ''
    }
  }
  return runs.flatMap((run) => (fonts.canSet(run.face, run.text) ? [run] : setApart(run, fonts)))
}

/** The letters of a run that cannot be set whole, each on its own or boxed. */
function setApart(run: Run, fonts: Fonts): Run[] {
  return toLetters(run.typed).map((typed) => (fonts.canSet(run.face, typed) ? { ...run, text: typed, typed } : { ...boxOf(typed, fonts), typed }))
}

function drawLetter(letter: string, weight: Weight, fonts: Fonts): Omit<Run, 'typed'> | null {
  const bare = TWINS[letter] ?? letter.replace(IGNORABLE, '').replace(/\p{Cc}/gu, ' ')
  if (bare === '') return null
  const face = fonts.findFace(weight, bare)
  if (face !== null) return { face, text: bare, isBox: false }
  // Elsewhere a joiner decides on the letter's shape: with it where the face knows it.
  for (const text of [letter, bare]) {
    const other = fonts.findFallback(weight, text)
    if (other !== null) return { face: other, text, isBox: false }
  }
  return boxOf(bare, fonts)
}

function boxOf(letter: string, fonts: Fonts): Omit<Run, 'typed'> {
  const codes = Array.from(letter, (character) => (character.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, '0'))
  return { face: boxFace(fonts), text: `U+${codes.slice(0, MOST_CODES).join('+')}${codes.length > MOST_CODES ? '…' : ''}`, isBox: true }
}

function boxFace(fonts: Fonts): string {
  const face = fonts.findFace('regular', 'U+0123456789ABCDEF…')
  if (face === null) throw new Error('The fonts lack the letters of a box')
  return face
}
