import { ExactDecimal, readDecimal } from './exactDecimal.ts'

/** A figure of a column: its plain decimal text and the decimals it is printed with, null where it stands as typed; never more than `most`. */
export interface ColumnFigure { value: string; digits: number | null; most?: number }

const MOST = 3

/**
 * How many decimals more the rounded figures of a column need so that, added up as printed, they round to the total as printed.
 * @returns 0 to 3; null where that is not enough: then nothing but the unrounded figures add up.
 * @example extraDigits([{ value: '0.88154', digits: 2 }, { value: '0.99455', digits: 2 }], { value: '1.87609', digits: 2 }) // 1
 */
export function extraDigits(figures: readonly ColumnFigure[], total: { value: string; digits: number }): number | null {
  const wanted = readDecimal(total.value).toDecimalPlaces(total.digits)
  for (let extra = 0; extra <= MOST; extra += 1) {
    const sum = figures.reduce((all, figure) => all.plus(asPrinted(figure, extra)), new ExactDecimal(0))
    if (sum.toDecimalPlaces(total.digits).eq(wanted)) return extra
  }
  return null
}

function asPrinted({ value, digits, most = Infinity }: ColumnFigure, extra: number): ExactDecimal {
  const exact = readDecimal(value)
  return digits === null ? exact : exact.toDecimalPlaces(Math.min(digits + extra, most))
}
