const MARKS = /[\u0300-\u036f]/g
const ENDS = /^[^\p{L}\p{N}]+|[^\p{L}\p{N}]+$/gu
const BETWEEN = /[^\p{L}\p{N}]+/u
const LONGEST = 40

/**
 * The words of a text as they are compared: compatibility forms, letter case and diacritics do not tell words apart.
 * @returns words in the order of the text, without what stands around them, at most 40 characters of each.
 * @example foldWords('Lot “NF-31”, Piña') // ['lot', 'nf-31', 'pina']
 */
export function foldWords(text: string): string[] {
  const folded = text.toLowerCase().normalize('NFKD').replace(MARKS, '').normalize('NFC')
  return folded.split(/\s+/u).flatMap((word) => {
    const bare = cut(word.replace(ENDS, ''))
    return bare === '' ? [] : [bare]
  })
}

/**
 * Every word a text can be found by: its words, the parts of joined ones, and numbers without their leading noughts.
 * @example wordsToFindBy('2026-0143') // ['2026-0143', '2026', '0143', '143']
 */
export function wordsToFindBy(text: string): string[] {
  const whole = foldWords(text)
  const pieces = [...whole, ...whole.flatMap((word) => word.split(BETWEEN).filter((piece) => piece !== ''))]
  const bareNumbers = pieces.flatMap((piece) => (/^0+\d/.test(piece) ? [piece.replace(/^0+/, '')] : []))
  return [...new Set([...pieces, ...bareNumbers])]
}

function cut(word: string): string {
  return [...word].slice(0, LONGEST).join('')
}
