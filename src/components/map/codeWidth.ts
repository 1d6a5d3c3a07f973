import type { CodeWidth } from './labelSpot.ts'

/** Room in pixels that each small letter of a code needs. */
const LETTER = 8
/** The same in the letters of a label with room in its block. */
const LARGE_LETTER = 9.5

/** Room in pixels that a code needs, in the letters of a label inside its block and in the small ones. */
export function codeWidth({ length }: string): CodeWidth {
  return { large: length * LARGE_LETTER, small: length * LETTER + 2 }
}
