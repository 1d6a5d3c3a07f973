import { formatDay } from '../../../shared/messages/formatDay.ts'
import { translate, type Language } from '../../../shared/messages/translate.ts'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'
import { ExactDecimal } from '../../../shared/units/exactDecimal.ts'
import { formatHectares, formatNumber } from '../../../shared/units/formatQuantity.ts'
import { isolate } from '../parts/placeRuns.ts'
import { STYLES } from '../parts/styles.ts'
import type { Span } from '../parts/wrapText.ts'
import type { PlainName } from '../../../shared/records/plainFields.ts'
import { M2_PER_HA } from '../../../shared/units/hectare.ts'

/** Under this an area needs four decimals of a hectare, square metres. */
const SMALL_AREA_M2 = 1000

/** A report's words and figures in its language and the farm's time zone. */
export interface ReportWords {
  language: Language
  /** A message of the PDF by its id under `pdf`. */
  say(id: string, params?: Record<string, string | number>, plural?: number): string
  unit(code: string): string
  /** The label of a plain field of the record, and what is said where nothing was written. */
  plainLabel(name: PlainName): string
  plainNone(name: PlainName): string
  /** Decimals that an area's size asks for, in hectares. */
  hectareDigits(areaM2: string | number): number
  /** An area as unrounded hectares, plain decimal text. */
  inHectares(areaM2: string | number): string
  /** Hectares as they are read, at most four decimals: a boundary is drawn no better than a square metre. */
  hectares(areaM2: string | number, extraDigits?: number): string
  /** Decimals that a worked-out figure's size asks for. */
  digits(value: string): number
  /** A figure worked out, with as many decimals as its size asks for, or some more. */
  amount(value: string, extraDigits?: number): string
  /** A figure without needless zeros. */
  short(value: string): string
  /** A figure as it was typed, with the language's decimal mark. */
  typed(value: string): string
  /** A figure as it was typed, with its unit. */
  quantity(value: string, unit: string): string
  /** A figure worked out, with its unit. */
  worked(value: string, unit: string, extraDigits?: number): string
  /** Litres of a tank, exactly as they were given and at least as fine as a figure of that size. */
  tank(litres: string): string
  /** To a tenth: what a thermometer is read to. */
  tenths(value: string): string
  /** Minutes as they are read off a clock: tenths under ten. */
  minutes(value: string): string
  /** A civil date in words. */
  civilDay(date: string): string
  day(instant: string, options?: { weekday?: boolean }): string
  time(instant: string): string
  /** Day and time to the minute, or to the second. */
  moment(instant: string, options?: { seconds?: boolean }): string
  isSameDay(a: string, b: string): boolean
  join(items: readonly string[]): string
}

export function openWords(language: Language, zone: string): ReportWords {
  const say: ReportWords['say'] = (id, params = {}, plural) => {
    const isolated = Object.entries(params).map(([name, value]): [string, string | number] => [name, typeof value === 'string' ? isolate(value) : value])
    return translate(language, `pdf.${id}`, Object.fromEntries(isolated), plural)
  }
  const unit = (code: string): string => translate(language, `units.${code}`)
  const typed = (value: string): string => formatNumber(value, { digits: value.split('.')[1]?.length ?? 0 }, language)
  const amount: ReportWords['amount'] = (value, extra = 0) => {
    const digits = digitsOf(value)
    return formatNumber(value, extra === 0 && digits > 2 ? { significant: 3 } : { digits: digits + extra }, language)
  }
  // The figure keeps to the unit's first word; a long unit may break after that.
  const withUnit = (value: string, code: string): string =>
    say('mix.quantity', { value, unit: unit(code) }).replace(' ', '\u00A0')
  const day: ReportWords['day'] = (instant, options = {}) => formatDay(language, civilDateIn(zone, instant), options)
  const time = (instant: string): string => civilTimeIn(zone, instant)
  return {
    language, say, unit,
    plainLabel: (name) => translate(language, `records.plain.${name}.label`),
    plainNone: (name) => translate(language, `records.plain.${name}.none`),
    typed, amount, day, time, hectareDigits,
    digits: digitsOf,
    inHectares: (areaM2) => new ExactDecimal(areaM2).div(M2_PER_HA).toFixed(),
    hectares: (areaM2, extra = 0) => formatHectares(areaM2, language, hectareDigits(areaM2) + extra),
    tank: (litres) => formatNumber(litres, { digits: Math.max(digitsOf(litres), litres.split('.')[1]?.length ?? 0) }, language),
    tenths: (value) => formatNumber(value, { digits: 1 }, language),
    minutes: (value) => formatNumber(value, { digits: Number(value) < 10 ? 1 : 0 }, language),
    civilDay: (date) => formatDay(language, date),
    short: (value) => formatNumber(value, {}, language),
    quantity: (value, code) => withUnit(typed(value), code),
    worked: (value, code, extra) => withUnit(amount(value, extra), code),
    moment: (instant, { seconds = false } = {}) =>
      say('moment', { day: day(instant), time: seconds ? `${time(instant)}:${secondsOf(instant)}` : time(instant) }),
    isSameDay: (a, b) => civilDateIn(zone, a) === civilDateIn(zone, b),
    join: (items) => joinWords(items, say),
  }
}

function digitsOf(text: string): number {
  const value = Number(text)
  if (value >= 10_000) return 0
  if (value >= 100 || value === 0) return 1
  // Under 1, three significant digits.
  return value >= 1 ? 2 : 2 - Math.floor(Math.log10(value))
}

function hectareDigits(areaM2: string | number): number {
  return Number(areaM2) < SMALL_AREA_M2 ? 4 : 2
}

/** Zones shift by whole minutes, so the seconds of an instant are the same everywhere. */
function secondsOf(instant: string): string {
  return new Date(instant).toISOString().slice(17, 19)
}

function joinWords(items: readonly string[], say: ReportWords['say']): string {
  return items.reduce((first, last, index) => {
    if (index === 0) return last
    return say(index === items.length - 1 ? 'list.and' : 'list.next', { first, last })
  }, '')
}

/** Words in the body's setting. */
export const plain = (text: string): Span[] => [{ text, style: STYLES.body }]
export const bold = (text: string): Span[] => [{ text, style: STYLES.bodyBold }]
