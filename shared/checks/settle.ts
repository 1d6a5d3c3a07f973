import type Decimal from 'decimal.js'
import { ExactDecimal } from '../units/exactDecimal.ts'

/** Digits that conversion and division leave sound; what lies beyond them is rounding, not spray. */
const SOUND_DIGITS = 12

/**
 * A worked-out figure ready to be held against a limit: a rate typed at the label's own limit must not come out of two
 * conversions a hair above it.
 */
export function settle(value: Decimal.Value): Decimal {
  return new ExactDecimal(value).toSignificantDigits(SOUND_DIGITS)
}
