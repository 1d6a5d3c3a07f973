import { dimensionOf } from '../units/dimensionOf.ts'
import { ExactDecimal } from '../units/exactDecimal.ts'
import { siValue } from '../units/siValue.ts'
import { UNITS, type UnitCode } from '../units/unitTable.ts'
import { readBasis, type ReadBasis } from './readBasis.ts'
import { readPositive } from './readPositive.ts'
import type { SheetFinding, SheetInput } from './sheetTypes.ts'

/** A sheet's input with every figure exact; null where it is missing or cannot be read. */
export interface ReadSheet {
  lineAreasM2: ExactDecimal[]
  /** Null unless every line has an area. */
  areaM2: ExactDecimal | null
  /** Litres, or litres a hectare where the water is sized from the spray rate. */
  water: { sizedFrom: 'water' | 'sprayRate'; si: ExactDecimal } | null
  tankL: ExactDecimal | null
  bases: ReadBasis[]
  findings: SheetFinding[]
}

/** Reads a half-typed sheet; what is missing or not allowed becomes a finding, nothing throws. */
export function readSheet(input: SheetInput): ReadSheet {
  const findings: SheetFinding[] = []
  const lineAreasM2 = input.lines.map((line, index) => readArea(line.areaM2, index, findings))
  const hasEveryArea = lineAreasM2.length > 0 && lineAreasM2.every((area) => area.gt(0))
  if (lineAreasM2.length === 0) findings.push({ code: 'sheet.no_area', params: {} })
  const water = readWater(input.water, findings)
  const bases = input.components.map(({ basis }, index) => readBasis(basis, `components.${index}`, findings))
  const tankL = readPositive(input.tankL)
  if (tankL === null && bases.some((basis) => basis.kind === 'perTank')) {
    findings.push({ code: 'sheet.tank_needed', params: {}, path: 'sprayerId' })
  }
  const areaM2 = hasEveryArea ? lineAreasM2.reduce((sum, area) => sum.plus(area)) : null
  return { lineAreasM2, areaM2, water, tankL, bases, findings }
}

function readArea(areaM2: number, index: number, findings: SheetFinding[]): ExactDecimal {
  if (Number.isFinite(areaM2) && areaM2 > 0) return new ExactDecimal(areaM2)
  findings.push({ code: 'sheet.no_area', params: {}, path: `lines.${index}` })
  return new ExactDecimal(0)
}

function readWater(water: SheetInput['water'], findings: SheetFinding[]): ReadSheet['water'] {
  const value = water && readPositive(water.value)
  if (water && !isUnitOf(water.unit, water.sizedFrom === 'water' ? 'volume' : 'volumePerArea')) {
    findings.push({ code: 'unit.not_allowed', params: { unit: water.unit }, path: 'water' })
    return null
  }
  if (!water || !value) {
    findings.push({ code: 'sheet.no_water', params: {}, path: 'water' })
    return null
  }
  return { sizedFrom: water.sizedFrom, si: siValue(value, water.unit as UnitCode) }
}

function isUnitOf(unit: string, dimension: string): boolean {
  return Object.hasOwn(UNITS, unit) && dimensionOf(unit) === dimension
}
