import type { Each } from '../contract/each.ts'
import { dimensionOf } from '../units/dimensionOf.ts'
import type { ExactDecimal } from '../units/exactDecimal.ts'
import { UNITS, type UnitCode } from '../units/unitTable.ts'
import { readPositive } from './readPositive.ts'
import type { SheetBasis, SheetFinding } from './sheetTypes.ts'

/** A basis with exact figures. `perArea` holds the amount's unit and the ground its rate is over. */
export type ReadBasis =
  | { kind: 'ratio'; parts: ExactDecimal; reading: 'to' | 'in'; isLiquid: true }
  | { kind: 'perArea'; value: ExactDecimal; rateUnit: UnitCode; unit: UnitCode; groundM2: string; isLiquid: boolean }
  | { kind: 'perEach'; value: ExactDecimal; unit: UnitCode; each: Each; isLiquid: boolean }
  | { kind: 'perTank' | 'total'; value: ExactDecimal; unit: UnitCode; isLiquid: boolean }
  | { kind: 'unknown'; isLiquid: boolean }

/** Units of a rate: the unit of its amount and the square metres it is over. */
const RATES: Readonly<Record<string, readonly [unit: UnitCode, groundM2: string]>> = {
  'L/ha': ['L', UNITS.ha.toSi[0]],
  'mL/ha': ['mL', UNITS.ha.toSi[0]],
  'galUS/acre': ['galUS', UNITS.acre.toSi[0]],
  'flozUS/acre': ['flozUS', UNITS.acre.toSi[0]],
  'ptUS/acre': ['ptUS', UNITS.acre.toSi[0]],
  'galImp/acre': ['galImp', UNITS.acre.toSi[0]],
  'kg/ha': ['kg', UNITS.ha.toSi[0]],
  'lb/acre': ['lb', UNITS.acre.toSi[0]],
}

/**
 * Reads how a component is measured out. A figure still missing is `sheet.component_incomplete`, a unit that does not fit
 * `unit.not_allowed`; both give an unknown basis.
 */
export function readBasis(basis: SheetBasis, path: string, findings: SheetFinding[]): ReadBasis {
  if (basis.kind === 'ratio') {
    const parts = readPositive(basis.parts)
    const reading = basis.reading ?? 'to'
    const isRead = parts !== null && (reading === 'to' || parts.gte(1))
    return isRead ? { kind: 'ratio', parts, reading, isLiquid: true } : incomplete(true, path, findings)
  }
  const rate = Object.hasOwn(RATES, basis.unit) ? RATES[basis.unit] : undefined
  const unit = basis.kind === 'perArea' ? rate?.[0] : amountUnit(basis.unit)
  if (unit === undefined) {
    findings.push({ code: 'unit.not_allowed', params: { unit: basis.unit }, path })
    return { kind: 'unknown', isLiquid: true }
  }
  const isLiquid = dimensionOf(unit) === 'volume'
  const value = readPositive(basis.value)
  if (value === null) return incomplete(isLiquid, path, findings)
  if (basis.kind === 'perEach') return { kind: 'perEach', value, unit, each: basis.each, isLiquid }
  if (basis.kind !== 'perArea') return { kind: basis.kind, value, unit, isLiquid }
  return rate ? { kind: 'perArea', value, rateUnit: basis.unit as UnitCode, unit, groundM2: rate[1], isLiquid } : { kind: 'unknown', isLiquid }
}

function amountUnit(unit: string): UnitCode | undefined {
  if (!Object.hasOwn(UNITS, unit)) return undefined
  const dimension = dimensionOf(unit)
  return dimension === 'volume' || dimension === 'mass' ? (unit as UnitCode) : undefined
}

function incomplete(isLiquid: boolean, path: string, findings: SheetFinding[]): ReadBasis {
  findings.push({ code: 'sheet.component_incomplete', params: {}, path })
  return { kind: 'unknown', isLiquid }
}
