import { readDecimal, writeDecimal, type ExactDecimal } from '../units/exactDecimal.ts'
import { divideIntoLoads } from './divideIntoLoads.ts'

export interface LoadsInput {
  areaHa: string
  rateLPerHa: string
  /** Usable litres of the tank. */
  tankL: string
}

export interface Loads {
  totalL: string
  /** Loads that fill the tank. */
  full: number
  /** Litres of the last part load, 0 where the tank divides the total. */
  lastL: string
  lastAreaHa: string
}

/**
 * Tank loads that spray an area at a rate.
 * @throws {RangeError} if one of the three is not above 0.
 * @source checks F1.10: total = A·V, full = floor(total/T), last = total − full·T, its area last/V.
 * @example splitLoads({ areaHa: '7.3', rateLPerHa: '300', tankL: '400' }) // 2190 L: 5 full and 190 L over 0.6333 ha
 */
export function splitLoads({ areaHa, rateLPerHa, tankL }: LoadsInput): Loads {
  const rate = readPositive('rateLPerHa', rateLPerHa)
  const total = readPositive('areaHa', areaHa).times(rate)
  const { full, lastL } = divideIntoLoads(total, readPositive('tankL', tankL))
  return { totalL: writeDecimal(total), full, lastL: writeDecimal(lastL), lastAreaHa: writeDecimal(lastL.div(rate)) }
}

function readPositive(name: string, text: string): ExactDecimal {
  const value = readDecimal(text)
  if (value.lte(0)) throw new RangeError(`${name} must be above 0, is ${text}`)
  return value
}
