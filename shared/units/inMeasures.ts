import { dimensionOf } from './dimensionOf.ts'
import { ExactDecimal } from './exactDecimal.ts'
import { siValue } from './siValue.ts'
import type { UnitCode } from './unitTable.ts'

/** A measure at hand: a bucket, a jug, a cup. `value` and `unit` say what one of it holds; `unit` alone may be its name. */
export interface Measure {
  /** Words of its owner, "blue bucket"; null where the unit is its name. */
  name: string | null
  value: string
  unit: UnitCode
}

/** So many of one measure. */
export interface Scoop { measure: Measure; count: number }

interface InMeasures {
  scoops: Scoop[]
  /** What the measures hold less what was asked, percent of what was asked: below 0 is under. */
  errorPct: number
}

/** Nobody counts further without losing count. */
const MOST_COUNT = 20
/** Under this a coarser way with fewer scoops is as good, percent. */
const GOOD_PCT = 0.5

/**
 * An amount in the measures a person has at hand: whole counts of at most two of them, with the error that leaves. Of the ways that are
 * within 0.5 % the one with the fewest scoops is taken, else the nearest.
 * @param amount plain decimal text above 0 and its unit.
 * @returns null where no measure of that dimension comes within a half of it.
 * @throws {RangeError} if the amount is no plain decimal.
 * @source what a unit holds is its defining constant (`UNITS`); the error is arithmetic.
 * @example inMeasures({ value: '750', unit: 'mL' }, [cup, tbsp]) // 3 cups and 3 tbsp, 0.5 % over
 */
export function inMeasures(amount: { value: string; unit: UnitCode }, measures: readonly Measure[]): InMeasures | null {
  const asked = siValue(new ExactDecimal(amount.value), amount.unit)
  if (asked.lte(0)) return null
  const fitting = measures
    .filter(({ unit }) => dimensionOf(unit) === dimensionOf(amount.unit))
    .map((measure) => ({ measure, size: siValue(new ExactDecimal(measure.value), measure.unit) }))
    .filter(({ size }) => size.gt(0))
    .sort((one, other) => other.size.cmp(one.size))
  const ways = fitting.flatMap((big, index) => {
    const alone = wayOf(asked, [[big, asked.div(big.size).round().toNumber()]])
    const whole = asked.div(big.size).floor().toNumber()
    const rest = asked.minus(big.size.times(whole))
    const paired = whole === 0 ? [] : fitting.slice(index + 1).map((small) => wayOf(asked, [[big, whole], [small, rest.div(small.size).round().toNumber()]]))
    return [alone, ...paired].filter((way) => way !== null)
  })
  return ways.sort(byUse)[0] ?? null
}

type Sized = { measure: Measure; size: InstanceType<typeof ExactDecimal> }

/** Counts of measures as a way to measure out; null where one is too many to count, or nothing is left of it. */
function wayOf(asked: InstanceType<typeof ExactDecimal>, counted: readonly (readonly [Sized, number])[]): InMeasures | null {
  const used = counted.filter(([, count]) => count > 0)
  if (used.length === 0 || used.some(([, count]) => count > MOST_COUNT)) return null
  const held = used.reduce((sum, [{ size }, count]) => sum.plus(size.times(count)), new ExactDecimal(0))
  const errorPct = held.minus(asked).div(asked).times(100).toNumber()
  if (Math.abs(errorPct) > 50) return null
  return { scoops: used.map(([{ measure }, count]) => ({ measure, count })), errorPct }
}

const scoopsOf = ({ scoops }: InMeasures): number => scoops.reduce((sum, { count }) => sum + count, 0)

function byUse(one: InMeasures, other: InMeasures): number {
  const [a, b] = [Math.abs(one.errorPct), Math.abs(other.errorPct)]
  const [isGood, isOtherGood] = [a <= GOOD_PCT, b <= GOOD_PCT]
  if (isGood && isOtherGood) return scoopsOf(one) - scoopsOf(other) || a - b
  return a - b
}
