import { writeDecimal, type ExactDecimal } from '../units/exactDecimal.ts'
import { siValue } from '../units/siValue.ts'
import type { UnitCode } from '../units/unitTable.ts'
import type { ReadBasis } from './readBasis.ts'
import type { ReadSheet } from './readSheet.ts'
import type { SheetComponent, SheetMessage } from './sheetTypes.ts'

/** What the figures of a component rest on; null where not known. */
export interface SprayFigures {
  areaM2: ExactDecimal | null
  areaHa: ExactDecimal | null
  counts: ReadSheet['counts']
  waterL: ExactDecimal | null
  totalL: ExactDecimal | null
  tankL: ExactDecimal | null
  loads: { full: number; lastL: ExactDecimal } | null
}

/** One component's amount in all, a hectare and a load. */
export function componentFigures(basis: ReadBasis, spray: SprayFigures): SheetComponent {
  const amount = amountOf(basis, spray)
  if (amount === null || basis.kind === 'unknown') return NOTHING_KNOWN
  const unit: UnitCode = basis.kind === 'ratio' ? 'L' : basis.unit
  const si = siValue(amount, unit)
  const siText = writeDecimal(si)
  return {
    amount: { value: writeDecimal(amount), unit },
    inL: basis.isLiquid ? siText : null,
    inKg: basis.isLiquid ? null : siText,
    perHa: spray.areaHa && writeDecimal(si.div(spray.areaHa)),
    ...perLoad(amount, spray),
    measure: measureOf(basis, spray),
  }
}

/** An amount's part in a full load and in the last part load, by the litres of each. */
export function perLoad(
  amount: ExactDecimal | null,
  { totalL, tankL, loads }: SprayFigures,
): { perFullLoad: string | null; perLastLoad: string | null } {
  if (amount === null || totalL === null || tankL === null || loads === null) return { perFullLoad: null, perLastLoad: null }
  return {
    perFullLoad: loads.full > 0 ? writeDecimal(amount.times(tankL).div(totalL)) : null,
    perLastLoad: loads.lastL.gt(0) ? writeDecimal(amount.times(loads.lastL).div(totalL)) : null,
  }
}

const NOTHING_KNOWN: SheetComponent = {
  amount: null,
  inL: null,
  inKg: null,
  perHa: null,
  perFullLoad: null,
  perLastLoad: null,
  measure: { id: 'sheet.measure.unknown', params: {} },
}

function amountOf(basis: ReadBasis, { areaM2, counts, waterL, totalL, tankL }: SprayFigures): ExactDecimal | null {
  switch (basis.kind) {
    case 'ratio': {
      const whole = basis.reading === 'to' ? waterL : totalL
      return whole && whole.div(basis.parts)
    }
    case 'perArea':
      return areaM2 && basis.value.times(areaM2).div(basis.groundM2)
    case 'perEach': {
      const count = counts[basis.each]
      return count && basis.value.times(count)
    }
    case 'total':
      return basis.value
    case 'perTank':
      return totalL && tankL && basis.value.times(totalL).div(tankL)
    case 'unknown':
      return null
  }
}

function measureOf(basis: ReadBasis, { areaHa, counts, waterL, totalL, tankL }: SprayFigures): SheetMessage {
  if (basis.kind === 'ratio' && basis.reading === 'in' && totalL) {
    return { id: 'sheet.measure.ratioIn', params: { parts: round(basis.parts), totalL: round(totalL) } }
  }
  if (basis.kind === 'ratio' && waterL) {
    return { id: 'sheet.measure.ratio', params: { parts: round(basis.parts), waterL: round(waterL) } }
  }
  if (basis.kind === 'perArea' && areaHa) {
    return { id: 'sheet.measure.perArea', params: { value: round(basis.value), unit: basis.rateUnit, areaHa: round(areaHa) } }
  }
  if (basis.kind === 'perTank' && totalL && tankL) {
    return { id: 'sheet.measure.perTank', params: { value: round(basis.value), unit: basis.unit, loads: round(totalL.div(tankL)) } }
  }
  if (basis.kind === 'perEach') {
    const count = counts[basis.each]
    if (count) return { id: 'sheet.measure.perEach', params: { value: round(basis.value), unit: basis.unit, each: basis.each, count: round(count) } }
  }
  if (basis.kind === 'total') return { id: 'sheet.measure.total', params: { value: round(basis.value), unit: basis.unit } }
  return NOTHING_KNOWN.measure
}

const round = (value: ExactDecimal): number => Number(writeDecimal(value))
