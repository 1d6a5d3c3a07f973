import { convertQuantity, type Quantity } from './convertQuantity.ts'
import { UNITS, type UnitCode } from './unitTable.ts'

/** Systems of measure that figures can be read in. */
export const UNIT_SYSTEMS = ['metric', 'us'] as const
export type UnitSystem = (typeof UNIT_SYSTEMS)[number]

/** What a figure of a unit is read in; a unit that is not named is read as it is. */
const READ_IN: Readonly<Record<UnitSystem, Partial<Record<UnitCode, UnitCode>>>> = {
  metric: {
    galUS: 'L', flozUS: 'mL', tbspUS: 'mL', tspUS: 'mL', cupUS: 'L', ptUS: 'L', qtUS: 'L', galImp: 'L', flozImp: 'mL', lb: 'kg', oz: 'g',
    acre: 'ha', ft2: 'm2', ft: 'm', in: 'm', mi: 'km', mph: 'ms', knot: 'ms', degF: 'degC', diffF: 'diffC', psi: 'bar',
    'galUS/acre': 'L/ha', 'flozUS/acre': 'mL/ha', 'ptUS/acre': 'L/ha', 'galImp/acre': 'L/ha', 'lb/acre': 'kg/ha', 'galUS/min': 'L/min',
  },
  us: {
    L: 'galUS', mL: 'flozUS', galImp: 'galUS', flozImp: 'flozUS', kg: 'lb', g: 'oz',
    ha: 'acre', m2: 'ft2', m: 'ft', km: 'mi', ms: 'mph', kmh: 'mph', knot: 'mph', degC: 'degF', diffC: 'diffF', bar: 'psi',
    'L/ha': 'galUS/acre', 'mL/ha': 'flozUS/acre', 'galImp/acre': 'galUS/acre', 'kg/ha': 'lb/acre', 'L/min': 'galUS/min',
  },
}
/** Under one of these an amount is read in the smaller unit, so that it keeps its digits. */
const SMALLER: Partial<Record<UnitCode, UnitCode>> = { galUS: 'flozUS', lb: 'oz' }

/** The unit in which somebody who reads a system of measures reads a figure that was worked out in another. */
export function readingUnit(unit: UnitCode, system: UnitSystem): UnitCode {
  return READ_IN[system][unit] ?? unit
}

/**
 * The same for an amount to be measured out: under a US gallon in fluid ounces, under a pound in ounces.
 * @throws {RangeError} if the value is no plain decimal.
 */
export function readingAmountUnit(amount: Quantity, system: UnitSystem): UnitCode {
  const read = readingUnit(amount.unit, system)
  if (read === amount.unit) return read
  const value = Number(convertQuantity(amount, read))
  return value > 0 && value < 1 ? (SMALLER[read] ?? read) : read
}

/** Units to choose from with those of a system first, each group in its own order; what is no unit of the table counts as both. */
export function unitsInOrder<Code extends string>(codes: readonly Code[], system: UnitSystem): Code[] {
  const isOwn = (code: string): boolean => !Object.hasOwn(UNITS, code) || readingUnit(code as UnitCode, system) === code
  return [...codes.filter(isOwn), ...codes.filter((code) => !isOwn(code))]
}
