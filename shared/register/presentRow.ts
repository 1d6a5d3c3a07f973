import type { RegisterRow } from '../contract/record.ts'
import { formatDayShort } from '../messages/formatDayShort.ts'
import { translate, type Language } from '../messages/translate.ts'
import { civilDateIn, civilTimeIn } from '../time/civilDate.ts'
import { formatNumber, formatRate, formatVolumeL } from '../units/formatQuantity.ts'
import type { RegisterLine } from './registerLine.ts'

export interface RegisterPlace {
  language: Language
  /** IANA zone of the farm. */
  zone: string
  /** Season whose numbers are printed without their year. */
  season: number
}

/** A row of the register in words: times in the farm's zone, figures rounded for display. */
export function presentRow(row: RegisterRow, { language, zone, season }: RegisterPlace): RegisterLine {
  const at = row.startedAt
  return {
    id: row.id,
    state: row.state,
    number: row.number === null ? null : row.season === season ? shortNumber(row.number) : row.number,
    version: row.version,
    method: row.method,
    blockIds: row.blocks.map(({ id }) => id),
    codes: row.blocks.map(({ code }) => code).join(', '),
    preparation: row.preparations.join(', '),
    lots: row.lots.join(', '),
    day: at === null ? '' : formatDayShort(language, civilDateIn(zone, at)),
    start: at === null ? '' : civilTimeIn(zone, at),
    hectares: formatNumber(row.areaHa, { digits: 2 }, language),
    litres: row.totalL === null ? '' : formatVolumeL(row.totalL, language),
    rate: presentRate(language, row.sprayLPerHa),
    by: row.by,
    lateHours: row.lateHours,
    tally: row.tally,
  }
}

/** Litres a hectare with their unit, three digits of it; empty where there is no rate. */
export function presentRate(language: Language, sprayLPerHa: string | number | null): string {
  if (sprayLPerHa === null) return ''
  return translate(language, 'register.rate', { value: formatRate(sprayLPerHa, language, 3) })
}

/** "0143" of "2026-0143". */
function shortNumber(number: string): string {
  return number.slice(number.indexOf('-') + 1)
}
