import { parseQuantityText } from '../../../shared/units/parseQuantityText.ts'

/**
 * The next figure for minus and plus: the text plus `step`, at most four decimals; an empty text counts from 0.
 * A text that cannot be read stays as it is; without `signed` it never falls under 0.
 */
export function stepQuantity(text: string, step: number, { signed = false }: { signed?: boolean } = {}): string {
  const read = text.trim() === '' ? { ok: true as const, value: '0' } : parseQuantityText(text, { signed })
  if (!read.ok) return text
  const tenThousandths = Math.round(Number(read.value) * 10_000) + Math.round(step * 10_000)
  return String((signed ? tenThousandths : Math.max(0, tenThousandths)) / 10_000)
}
