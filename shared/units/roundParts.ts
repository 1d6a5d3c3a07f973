import { ExactDecimal, readDecimal } from './exactDecimal.ts'
import { roundDecimal } from './roundDecimal.ts'

/**
 * Parts rounded so that they still come to their rounded sum: each is what the rounded sum grows by with it, and so off by at most one
 * in the last place.
 * @param parts plain decimals, none below 0. @throws {RangeError} if one is no plain decimal.
 */
export function roundParts(parts: readonly string[], decimals: number): string[] {
  let sum = new ExactDecimal(0)
  let written = '0'
  return parts.map((part) => {
    sum = sum.plus(readDecimal(part))
    const before = written
    written = roundDecimal(sum.toFixed(), decimals)
    return new ExactDecimal(written).minus(before).toFixed()
  })
}
