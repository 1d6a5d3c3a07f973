import { parseQuantityText } from '../../../shared/units/parseQuantityText.ts'

/** The plain decimal a person meant, or the text as it stands so that the contract says what is wrong with it. */
export function understood(text: string): string {
  const read = parseQuantityText(text)
  return read.ok ? read.value : text.trim()
}

/** The same, null where nothing was typed. */
export function understoodOrNull(text: string): string | null {
  return text.trim() === '' ? null : understood(text)
}
