import { Decimal } from 'decimal.js'
import type { RegisterRow } from '../contract/record.ts'

export interface RegisterSums {
  /** Signed records among the rows: what the totals are made of. */
  signed: number
  withdrawn: number
  /** Started and not signed yet: in no total. */
  unsigned: number
  /** Hectares treated by the signed ones, exact decimal text. */
  areaHa: string
  /** Litres put on by the signed ones that have litres, exact decimal text. */
  totalL: string
  /** Kilograms spread by the signed ones that have kilograms, exact decimal text. */
  totalKg: string
  /** Signed records entered more than 24 h after the work. */
  late: number
}

type Summed = Pick<RegisterRow, 'state' | 'areaHa' | 'totalL' | 'totalKg' | 'lateHours'>

/**
 * What the rows of a register that were read add up to; withdrawn and unsigned ones count in no total.
 * @param rows hectares and litres as plain decimal text. @returns hectares and litres, unrounded.
 */
export function sumRegisterRows(rows: readonly Summed[]): RegisterSums {
  const signed = rows.filter((row) => row.state === 'signed')
  return {
    signed: signed.length,
    withdrawn: rows.filter((row) => row.state === 'withdrawn').length,
    unsigned: rows.filter((row) => row.state === 'started' || row.state === 'draft').length,
    areaHa: sum(signed.map((row) => row.areaHa)),
    totalL: sum(signed.map((row) => row.totalL ?? '0')),
    totalKg: sum(signed.map((row) => row.totalKg ?? '0')),
    late: signed.filter((row) => row.lateHours !== null).length,
  }
}

function sum(values: readonly string[]): string {
  return values.reduce((total, value) => total.plus(value), new Decimal(0)).toFixed()
}
