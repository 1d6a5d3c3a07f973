import { describe, expect, it } from 'vitest'
import { CALC_FUNCTIONS } from '../../../server/cli/calcFunctions.ts'
import { CALIBRATION_CASES } from '../mix/calibrationCases.ts'
import { DILUTION_CASES } from '../mix/dilutionCases.ts'
import { altered } from '../referenceCase.ts'
import { PRINTED_CONSTANTS } from '../units/constantCases.ts'
import { AIR_CASES } from '../weather/airCases.ts'

describe.each([
  { name: 'constants', cases: PRINTED_CONSTANTS },
  { name: 'calibration', cases: CALIBRATION_CASES },
  { name: 'dilution', cases: DILUTION_CASES },
  { name: 'air', cases: AIR_CASES },
])('published values: $name', ({ cases }) => {
  const errorOf = (fn: string, args: unknown, read: (answer: never) => number, expected: number): number =>
    Math.abs(read(CALC_FUNCTIONS[fn]?.run(args) as never) - expected)

  it.each(cases)('$id ($source)', ({ fn, args, read, expected, tolerance }) => {
    expect(errorOf(fn, args, read, expected)).toBeLessThanOrEqual(tolerance)
  })

  // A count of full loads stays 5 for 1 % more area: that is what a count is.
  it.each(cases.filter(({ tolerance }) => tolerance > 0))('$id: altered input fails', (reference) => {
    const { fn, read, expected, tolerance } = reference
    expect(errorOf(fn, altered(reference), read, expected)).toBeGreaterThan(tolerance)
  })
})
