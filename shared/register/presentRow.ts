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

/** Rates from here up are read without decimals. */
const WHOLE_FROM = 100

/** A row of the register in words: times in the farm's zone, figures rounded for display. */
export function presentRow(row: RegisterRow, { language, zone, season }: RegisterPlace): RegisterLine {
  const at = row.startedAt
  return {
    id: row.id,
    state: row.state,
    number: row.number === null ? null : row.season === season ? shortNumber(row.number) : row.number,
    fullNumber: row.number,
    onDevice: false,
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
    mass: row.totalKg === null ? '' : translate(language, 'register.kilogramsUnit', { value: formatNumber(row.totalKg, { digits: 1 }, language) }),
    rate: presentRate(language, row.sprayLPerHa) || presentRate(language, row.kgPerHa, 'register.massRate'),
    by: row.by,
    lateHours: row.lateHours,
    tally: row.tally,
  }
}

/** Litres (or, by another message, kilograms) a hectare with their unit, whole from 100 up, else three digits of it; empty where there is no rate. */
export function presentRate(language: Language, perHa: string | number | null, message: 'register.rate' | 'register.massRate' = 'register.rate'): string {
  if (perHa === null) return ''
  const value = Number(perHa) >= WHOLE_FROM ? formatNumber(perHa, { digits: 0 }, language) : formatRate(perHa, language, 3)
  return translate(language, message, { value })
}

/** "0143" of "2026-0143". */
function shortNumber(number: string): string {
  return number.slice(number.indexOf('-') + 1)
}
