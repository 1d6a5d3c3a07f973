import { readDecimal, type ExactDecimal } from '../units/exactDecimal.ts'

/** A decimal above 0, or null: a half-typed figure is not there yet. */
export function readPositive(text: string | null): ExactDecimal | null {
  if (text === null || !/^\d{1,20}(\.\d{1,20})?$/.test(text)) return null
  const value = readDecimal(text)
  return value.gt(0) ? value : null
}
