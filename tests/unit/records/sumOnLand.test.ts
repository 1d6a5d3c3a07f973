import { expect, it } from 'vitest'
import { sumOnLand } from '../../../shared/records/sumOnLand.ts'

const line = (value: string, unit: 'L' | 'mL' | 'galUS' | 'kg' | 'g') => ({ amount: { value, unit, known: 'measured' as const } })

it.each([
  [[line('400', 'L'), line('410.5', 'L'), line('500', 'mL')], { value: '811', unit: 'L' }],
  // A US gallon is 231 cubic inches, 3.785411784 L exactly (NIST Handbook 44, appendix C).
  [[line('1', 'galUS'), line('1', 'galUS')], { value: '7.570823568', unit: 'L' }],
  [[line('2', 'kg'), line('250', 'g')], { value: '2.25', unit: 'kg' }],
  [[line('2', 'kg'), line('1', 'L')], null],
  [[line('2', 'L'), { amount: null }], null],
  [[], null],
])('adds up what is written on the lines: %#', (lines, sum) => {
  expect(sumOnLand(lines)).toEqual(sum)
})
