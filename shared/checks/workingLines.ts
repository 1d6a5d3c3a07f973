import type { Message } from '../contract/common.ts'
import type { Water } from '../contract/recordContent.ts'
import type { RecordSheet, SheetComponent } from '../mix/sheetTypes.ts'
import { settle } from './settle.ts'
import { words } from './buildCheck.ts'

const DIGITS = 6
const MOST_DECIMALS = 4

/** Six digits, rounded once: enough that the sums on the page add up when done again by hand. */
function shown(value: string | number): number {
  const exact = settle(value)
  const whole = exact.trunc().isZero() ? 0 : exact.trunc().toFixed().length
  return exact.toDecimalPlaces(Math.min(MOST_DECIMALS, Math.max(0, DIGITS - whole))).toNumber()
}

function componentWorking(component: SheetComponent, name: string): Message | null {
  const { amount, measure } = component
  if (amount === null) return null
  const sum = { name, amount: shown(amount.value) }
  const { params } = measure
  const known = (key: string): number => shown(params[key] ?? 0)
  switch (measure.id) {
    case 'sheet.measure.ratio':
      return words('records.working.ratio', { ...sum, water: known('waterL'), parts: known('parts') })
    case 'sheet.measure.perArea':
      return words('records.working.perArea', { ...sum, rate: known('value'), rateUnit: String(params['unit']), hectares: known('areaHa'), unit: amount.unit })
    case 'sheet.measure.ratioIn':
      return words('records.working.ratioIn', { ...sum, total: known('totalL'), parts: known('parts') })
    case 'sheet.measure.perEach':
      return words('records.working.perEach', { ...sum, value: known('value'), unit: amount.unit, count: known('count'), each: String(params['each']) })
    case 'sheet.measure.total':
      return words('records.working.inAll', { ...sum, unit: amount.unit })
    case 'sheet.measure.perTank':
      return words('records.working.perTank', { ...sum, value: known('value'), unit: amount.unit, count: known('loads') })
    default:
      return null
  }
}

function totalWorking({ totalL, waterL, sprayLPerHa, sprayPerEach, counts, areaHa }: RecordSheet, sizedFrom: Water['sizedFrom']): Message[] {
  if (totalL === null || waterL === null || sprayLPerHa === null) return []
  const liquids = settle(totalL).minus(settle(waterL))
  const figures = { water: shown(waterL), liquids: shown(liquids.toFixed()), total: shown(totalL), hectares: shown(areaHa), rate: shown(sprayLPerHa) }
  if (sprayPerEach) {
    const { each, litres } = sprayPerEach
    const byEach = { ...figures, each, litres: shown(litres), count: shown(counts[each] ?? 0) }
    return [words('records.working.perEachTotal', byEach), words('records.working.waterLeft', figures)]
  }
  return sizedFrom !== 'sprayRate'
    ? [words('records.working.total', figures), words('records.working.sprayRate', figures)]
    : [words('records.working.fromRate', figures), words('records.working.waterLeft', figures)]
}

function massWorking({ totalKg, kgPerHa, areaHa }: RecordSheet): Message[] {
  if (totalKg === null) return []
  const figures = { total: shown(totalKg), hectares: shown(areaHa), rate: shown(kgPerHa ?? 0) }
  return [words('records.working.totalKg', figures), ...(kgPerHa === null ? [] : [words('records.working.kgPerHa', figures)])]
}

function loadsWorking({ loads, totalL }: RecordSheet): Message[] {
  if (loads === null || totalL === null) return []
  return [words('records.working.loads', { total: shown(totalL), tank: shown(loads.tankL), full: loads.full, last: shown(loads.lastL) })]
}

/**
 * How the figures of a sheet were worked out, one sum a line, in the order they follow from each other.
 * @param names of the components, in the sheet's order.
 */
export function workingLines(sheet: RecordSheet, { names, sizedFrom }: { names: readonly string[]; sizedFrom: Water['sizedFrom'] }): Message[] {
  const components = sheet.components
    .map((component, index) => componentWorking(component, names[index] ?? ''))
    .filter((line) => line !== null)
  const total = totalWorking(sheet, sizedFrom)
  const isTotalFirst = sizedFrom === 'sprayRate' || sizedFrom === 'perEach'
  return [...(isTotalFirst ? [...total, ...components] : [...components, ...total]), ...massWorking(sheet), ...loadsWorking(sheet)]
}
