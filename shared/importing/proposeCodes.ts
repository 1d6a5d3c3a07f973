import { lineText } from '../contract/text.ts'

const MOST = 12
const codeText = lineText(MOST)

/**
 * A code for each shape, unlike any other: what the file calls it, cut to the room a code has, with a number where it is taken.
 * @param wanted code or name of each, empty where the file says nothing; `taken` codes of the farm's blocks.
 */
export function proposeCodes(wanted: readonly string[], taken: readonly string[]): string[] {
  const used = new Set(taken.map(fold))
  return wanted.map((words, index) => {
    const start = startOf(words) || String(index + 1)
    let code = start
    for (let next = 2; used.has(fold(code)); next += 1) code = `${start.slice(0, MOST - 1 - String(next).length).trim()}-${next}`
    used.add(fold(code))
    return code
  })
}

/** Large and small letters make no other code. */
export const fold = (code: string): string => code.toLowerCase()

/** As many whole words as there is room for, or the first letters of a long one; empty where nothing of it can stand in a code. */
function startOf(words: string): string {
  const whole = words.slice(0, MOST + 1).replace(/\s+\S*$/, '')
  const cut = words.length <= MOST ? words : whole !== '' && whole.length <= MOST ? whole : [...words].slice(0, MOST).join('').slice(0, MOST)
  const asItIs = codeText.safeParse(words)
  const read = asItIs.success ? asItIs : codeText.safeParse(withoutMarks(cut))
  return read.success ? read.data : ''
}

/** Without what leaves no ink and halves of a character that was cut. */
export const withoutMarks = (words: string): string => words.replace(/[\p{Cc}\p{Cf}\p{Cs}]/gu, '')
