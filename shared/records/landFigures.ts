import type { Computed, RegisterRow } from '../contract/record.ts'
import type { RecordContent } from '../contract/recordContent.ts'
import { readAmount } from '../mix/sheetLines.ts'
import type { RecordSheet } from '../mix/sheetTypes.ts'
import { ExactDecimal, writeDecimal } from '../units/exactDecimal.ts'
import { sumOnLand } from './sumOnLand.ts'

type Lines = readonly Pick<RecordContent['lines'][number], 'amount'>[]
type Mix = Pick<RecordSheet, 'areaHa' | 'totalL' | 'totalKg' | 'sprayPerEach'>
export type LandFigures = Pick<RegisterRow, 'totalL' | 'totalKg' | 'sprayLPerHa' | 'kgPerHa' | 'sprayPerEach'>

/**
 * What went on the land: litres, kilograms by mass, and both on a hectare; of a mix counted out by plants or beds also on each. What was
 * weighed into a tank counts by the share of the mix that went on. Where nothing was measured on the lines, or all was worked out from
 * the mix, it is the whole mix.
 * @param mix litres, kilograms, hectares. @returns unrounded decimal text.
 */
export function landFigures(lines: Lines, mix: Mix): LandFigures {
  const onLand = sumMeasured(lines)
  const mixL = exact(mix.totalL)
  const litres = onLand?.unit === 'L' ? new ExactDecimal(onLand.value) : mixL
  const share = litres && mixL?.gt(0) ? litres.div(mixL) : new ExactDecimal(1)
  const kilograms = onLand?.unit === 'kg' && mixL === null ? new ExactDecimal(onLand.value) : exact(mix.totalKg)?.times(share) ?? null
  const perHa = (total: ExactDecimal | null): string | null => (total && mix.areaHa > 0 ? writeDecimal(total.div(mix.areaHa)) : null)
  const each = mix.sprayPerEach
  return {
    totalL: litres && writeDecimal(litres), totalKg: kilograms && writeDecimal(kilograms),
    sprayLPerHa: perHa(litres), kgPerHa: perHa(kilograms),
    sprayPerEach: each && { each: each.each, litres: writeDecimal(new ExactDecimal(each.litres).times(share)) },
  }
}

/** The same of each line: what was measured on it, or its share of the mix. They come to what the record's figures are. */
export function landShares(lines: Lines, { totalL, totalKg, lines: shares }: Pick<Computed, 'totalL' | 'totalKg' | 'lines'>): { litres: string | null; kg: string | null }[] {
  const onLand = sumMeasured(lines)
  return shares.map(({ shareL, shareKg }, index) => {
    const { amountL, amountKg } = readAmount(lines[index]?.amount, '', [])
    if (onLand?.unit === 'L' && amountL !== null) {
      const kg = totalKg !== null && totalL ? writeDecimal(new ExactDecimal(totalKg).times(amountL).div(totalL)) : shareKg
      return { litres: amountL, kg }
    }
    return onLand?.unit === 'kg' && totalL === null ? { litres: null, kg: amountKg } : { litres: shareL, kg: shareKg }
  })
}

/** What was measured on the lines, all together; null where it says no more than the mix does. */
function sumMeasured(lines: Lines): ReturnType<typeof sumOnLand> {
  return lines.some(({ amount }) => amount !== null && amount.known !== 'workedOut') ? sumOnLand(lines) : null
}

const exact = (value: number | null): ExactDecimal | null => (value === null ? null : new ExactDecimal(value))
