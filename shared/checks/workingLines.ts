import type { Message } from '../contract/common.ts'
import type { Water } from '../contract/recordContent.ts'
import type { RecordSheet, SheetComponent } from '../mix/sheetTypes.ts'
import { figureIn } from '../messages/readFigure.ts'
import { readingUnit, type UnitSystem } from '../units/readingUnit.ts'
import type { UnitCode } from '../units/unitTable.ts'
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

/** A figure that was worked out in a unit, as it is shown in the reader's. */
type Read = (value: string | number, unit: UnitCode) => number
interface Figures { read: Read; unit: (code: UnitCode) => UnitCode }

const figuresFor = (units: UnitSystem): Figures => ({
  read: (value, unit) => shown(figureIn(value, unit, units)),
  unit: (code) => readingUnit(code, units),
})

function componentWorking(component: SheetComponent, name: string, { read, unit }: Figures): Message | null {
  const { amount, measure } = component
  if (amount === null) return null
  const sum = { name, amount: read(amount.value, amount.unit), unit: unit(amount.unit), volumeUnit: unit('L') }
  const { params } = measure
  const known = (key: string, code?: UnitCode): number => (code === undefined ? shown(params[key] ?? 0) : read(params[key] ?? 0, code))
  switch (measure.id) {
    case 'sheet.measure.ratio':
      return words('records.working.ratio', { ...sum, water: known('waterL', 'L'), parts: known('parts') })
    case 'sheet.measure.perArea': {
      const rateUnit = String(params['unit']) as UnitCode
      return words('records.working.perArea', { ...sum, rate: known('value', rateUnit), rateUnit: unit(rateUnit), area: known('areaHa', 'ha'), areaUnit: unit('ha') })
    }
    case 'sheet.measure.ratioIn':
      return words('records.working.ratioIn', { ...sum, total: known('totalL', 'L'), parts: known('parts') })
    case 'sheet.measure.perEach':
      return words('records.working.perEach', { ...sum, value: known('value', amount.unit), count: known('count'), each: String(params['each']) })
    case 'sheet.measure.total':
      return words('records.working.inAll', sum)
    case 'sheet.measure.perTank':
      return words('records.working.perTank', { ...sum, value: known('value', amount.unit), count: known('loads') })
    default:
      return null
  }
}

function totalWorking({ totalL, waterL, sprayLPerHa, sprayPerEach, counts, areaHa }: RecordSheet, sizedFrom: Water['sizedFrom'], { read, unit }: Figures): Message[] {
  if (totalL === null || waterL === null || sprayLPerHa === null) return []
  const liquids = settle(totalL).minus(settle(waterL))
  const figures = {
    water: read(waterL, 'L'), liquids: read(liquids.toFixed(), 'L'), total: read(totalL, 'L'), volumeUnit: unit('L'),
    area: read(areaHa, 'ha'), areaUnit: unit('ha'), rate: read(sprayLPerHa, 'L/ha'), rateUnit: unit('L/ha'),
  }
  if (sprayPerEach) {
    const { each, litres } = sprayPerEach
    const byEach = { ...figures, each, litres: read(litres, 'L'), count: shown(counts[each] ?? 0) }
    return [words('records.working.perEachTotal', byEach), words('records.working.waterLeft', figures)]
  }
  return sizedFrom !== 'sprayRate'
    ? [words('records.working.total', figures), words('records.working.sprayRate', figures)]
    : [words('records.working.fromRate', figures), words('records.working.waterLeft', figures)]
}

function massWorking({ totalKg, kgPerHa, areaHa }: RecordSheet, { read, unit }: Figures): Message[] {
  if (totalKg === null) return []
  const figures = {
    total: read(totalKg, 'kg'), massUnit: unit('kg'), area: read(areaHa, 'ha'), areaUnit: unit('ha'), rate: read(kgPerHa ?? 0, 'kg/ha'), rateUnit: unit('kg/ha'),
  }
  return [words('records.working.totalKg', figures), ...(kgPerHa === null ? [] : [words('records.working.kgPerHa', figures)])]
}

function loadsWorking({ loads, totalL }: RecordSheet, { read, unit }: Figures): Message[] {
  if (loads === null || totalL === null) return []
  return [words('records.working.loads', { total: read(totalL, 'L'), tank: read(loads.tankL, 'L'), full: loads.full, last: read(loads.lastL, 'L'), volumeUnit: unit('L') })]
}

interface WorkingOptions {
  /** Of the components, in the sheet's order. */
  names: readonly string[]
  sizedFrom: Water['sizedFrom']
  /** What the reader reads figures in. */
  units: UnitSystem
}

/** How the figures of a sheet were worked out, one sum a line, in the order they follow from each other, every figure in the reader's measures. */
export function workingLines(sheet: RecordSheet, { names, sizedFrom, units }: WorkingOptions): Message[] {
  const figures = figuresFor(units)
  const components = sheet.components
    .map((component, index) => componentWorking(component, names[index] ?? '', figures))
    .filter((line) => line !== null)
  const total = totalWorking(sheet, sizedFrom, figures)
  const isTotalFirst = sizedFrom === 'sprayRate' || sizedFrom === 'perEach'
  return [...(isTotalFirst ? [...total, ...components] : [...components, ...total]), ...massWorking(sheet, figures), ...loadsWorking(sheet, figures)]
}
