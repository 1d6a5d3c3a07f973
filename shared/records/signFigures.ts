import type { Computed } from '../contract/record.ts'
import type { SignedRecord } from '../contract/signedRecord.ts'
import { decimalTextOf } from '../units/decimalTextOf.ts'

/**
 * Figures as canonical text holds them: numbers as decimal text.
 * @throws {RangeError} if a component's amount is not known: that is not signed.
 */
export function signFigures({ loads, sprayPerEach, air, lines, components, ...figures }: Computed): SignedRecord['computed'] {
  return {
    areaM2: decimalTextOf(figures.areaM2),
    counts: figures.counts,
    totalL: textOf(figures.totalL),
    totalKg: textOf(figures.totalKg),
    waterL: textOf(figures.waterL),
    sprayLPerHa: textOf(figures.sprayLPerHa),
    kgPerHa: textOf(figures.kgPerHa),
    sprayPerEach: sprayPerEach && { each: sprayPerEach.each, litres: decimalTextOf(sprayPerEach.litres) },
    loads: loads && {
      full: loads.full, tankL: decimalTextOf(loads.tankL), lastL: decimalTextOf(loads.lastL), lastAreaHa: decimalTextOf(loads.lastAreaHa),
      fullMinutes: textOf(loads.fullMinutes), lastMinutes: textOf(loads.lastMinutes),
    },
    components: components.map(({ amount }) => ({ amount: known(amount) })),
    lines: lines.map((line) => ({ ...line, areaM2: decimalTextOf(line.areaM2) })),
    air: air && {
      wetBulbC: decimalTextOf(air.wetBulbC), deltaTC: decimalTextOf(air.deltaTC), dewPointC: decimalTextOf(air.dewPointC),
      vpdKPa: decimalTextOf(air.vpdKPa), method: air.method,
    },
  }
}

const textOf = (value: number | null): string | null => (value === null ? null : decimalTextOf(value))

function known<Amount>(amount: Amount | null): Amount {
  if (amount === null) throw new RangeError('a component has no amount')
  return amount
}
