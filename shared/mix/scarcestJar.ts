import { convertQuantity } from '../units/convertQuantity.ts'
import { dimensionOf } from '../units/dimensionOf.ts'
import { ExactDecimal, writeDecimal } from '../units/exactDecimal.ts'
import type { UnitCode } from '../units/unitTable.ts'
import { recordSheet } from './recordSheet.ts'
import type { RecordSheet, SheetInput } from './sheetTypes.ts'

/** What is left of one lot, and the components (their places in the list) that come from it. */
export interface Jar {
  components: readonly number[]
  left: { value: string; unit: UnitCode }
}

/** How far one jar goes: what sizes the mix by it, and the water and the mix that come of it, litres. */
export interface JarReach {
  /** Place of the component that sizes the mix, and how much of it is taken, in the unit of the lot. */
  component: number
  amount: { value: string; unit: UnitCode }
  waterL: number
  totalL: number
}

/** Two amounts of water at which the sheet is read: between and beyond them every amount lies on a straight line. */
const NEAR_L = 1_000
const FAR_L = 2_000
const DECIMALS = 4

/**
 * How far each jar goes if all of it is taken, the scarcest first. A jar that does not depend on the water (an amount by area, by count
 * or in all), that is empty or measured another way sizes nothing and is left out.
 * @param sheet lines, tank and components; its water is not read.
 * @source the amount of every component is a straight line of the water: a fixed part, and a part of each litre (see `solveSpray`).
 */
export function scarcestJar(sheet: Omit<SheetInput, 'water'>, jars: readonly Jar[]): JarReach[] {
  const [near, far] = [NEAR_L, FAR_L].map((litres) => recordSheet({ ...sheet, water: { sizedFrom: 'water', value: String(litres), unit: 'L' } }))
  if (near === undefined || far === undefined) return []
  return jars
    .flatMap((jar) => reachOf(sheet, jar, near, far) ?? [])
    .sort((one, other) => one.waterL - other.waterL)
}

function reachOf(sheet: Omit<SheetInput, 'water'>, { components, left }: Jar, near: RecordSheet, far: RecordSheet): JarReach | null {
  const [component] = components
  const [atNear, atFar] = [taken(components, near, left.unit), taken(components, far, left.unit)]
  if (component === undefined || atNear === null || atFar === null) return null
  const perLitre = atFar.minus(atNear).div(FAR_L - NEAR_L)
  if (perLitre.lte(0)) return null
  const waterL = new ExactDecimal(left.value).minus(atNear).div(perLitre).plus(NEAR_L)
  const alone = [taken([component], near, left.unit), taken([component], far, left.unit)] as const
  if (waterL.lte(0) || alone[0] === null || alone[1] === null) return null
  const own = alone[0].plus(alone[1].minus(alone[0]).div(FAR_L - NEAR_L).times(waterL.minus(NEAR_L)))
  // Never more than there is: what does not fit into the decimals stays in the jar.
  const amount = { value: own.toDecimalPlaces(DECIMALS, ExactDecimal.ROUND_DOWN).toFixed(), unit: left.unit }
  const sized = recordSheet({ ...sheet, water: { sizedFrom: 'jar', component, ...amount } })
  return sized.waterL === null || sized.totalL === null ? null : { component, amount, waterL: sized.waterL, totalL: sized.totalL }
}

/** What some components take together, in a unit; null where one is not known or is measured another way. */
function taken(components: readonly number[], sheet: RecordSheet, unit: UnitCode): InstanceType<typeof ExactDecimal> | null {
  let sum = new ExactDecimal(0)
  for (const index of components) {
    const amount = sheet.components[index]?.amount
    if (!amount || dimensionOf(amount.unit) !== dimensionOf(unit)) return null
    sum = sum.plus(convertQuantity({ value: writeDecimal(new ExactDecimal(amount.value)), unit: amount.unit }, unit))
  }
  return sum
}
