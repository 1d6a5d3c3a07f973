import type { Quantity } from '../units/convertQuantity.ts'
import { dimensionOf } from '../units/dimensionOf.ts'
import { ExactDecimal, readDecimal, writeDecimal } from '../units/exactDecimal.ts'

export interface DiluteInput {
  /** The finished mix, a volume above 0. */
  total: Quantity
  /** The N of "1 to N" or "1 in N", above 0. */
  n: string
  /** `to`: 1 part product and N parts water. `in`: 1 part product in N parts of finished mix (N at least 1). */
  reading: 'to' | 'in'
}

/**
 * Product and water that make up a finished mix of a ratio.
 * @returns plain decimals in the unit of `total`; together they are the total.
 * @throws {RangeError} if the total is no volume above 0, or N is out of range.
 * @source definition of parts by volume: product = V/(N + 1) for "to", V/N for "in".
 * @example dilute({ total: { value: '31', unit: 'L' }, n: '30', reading: 'to' }) // { product: '1', water: '30' }
 */
export function dilute({ total, n, reading }: DiluteInput): { product: string; water: string } {
  if (dimensionOf(total.unit) !== 'volume') throw new RangeError(`${total.unit} is not a unit of volume`)
  const volume = readDecimal(total.value)
  const parts = readDecimal(n)
  if (volume.lte(0)) throw new RangeError(`total must be above 0, is ${total.value}`)
  if (parts.lte(0) || (reading === 'in' && parts.lt(1))) throw new RangeError(`n is out of range: ${n}`)
  const product = volume.div(reading === 'to' ? parts.plus(1) : parts)
  return { product: writeDecimal(product), water: writeDecimal(new ExactDecimal(volume).minus(product)) }
}
