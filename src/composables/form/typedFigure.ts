import { parseQuantityText } from '../../../shared/units/parseQuantityText.ts'

/** The plain number of a text, null where nothing is typed; what is no number stays as it is, for the contract to refuse. */
export function typedFigure(text: string): string | null {
  if (text.trim() === '') return null
  const read = parseQuantityText(text)
  return read.ok ? read.value : text
}

/** A whole number likewise. */
export function typedCount(text: string): number | string | null {
  const figure = typedFigure(text)
  return figure !== null && /^\d+$/.test(figure) ? Number(figure) : figure
}

/** Words, null where none are typed. */
export function typedWords(text: string): string | null {
  return text.trim() === '' ? null : text
}
