import { formatDay } from '../../../shared/messages/formatDay.ts'
import { translate, type Language } from '../../../shared/messages/translate.ts'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'
import { formatHectares, formatNumber } from '../../../shared/units/formatQuantity.ts'
import { isolate } from '../parts/placeRuns.ts'
import { STYLES } from '../parts/styles.ts'
import type { Span } from '../parts/wrapText.ts'
import type { PlainName } from '../../../shared/records/plainFields.ts'

/** Under this an area needs four decimals of a hectare, square metres. */
const SMALL_AREA_M2 = 1000

/** A report's words and figures in its language and the farm's time zone. */
export interface ReportWords {
  language: Language
  /** A message of the PDF by its id under `pdf`. */
  say(id: string, params?: Record<string, string | number>): string
  unit(code: string): string
  /** The label of a plain field of the record, and what is said where nothing was written. */
  plainLabel(name: PlainName): string
  plainNone(name: PlainName): string
  hectares(areaM2: string | number): string
  /** A figure worked out, with as many decimals as its size asks for. */
  amount(value: string): string
  /** A figure without needless zeros. */
  short(value: string): string
  /** A figure as it was typed, with the language's decimal mark. */
  typed(value: string): string
  /** A figure as it was typed, with its unit. */
  quantity(value: string, unit: string): string
  /** A figure worked out, with its unit. */
  worked(value: string, unit: string): string
  day(instant: string, options?: { weekday?: boolean }): string
  time(instant: string): string
  /** Day and time to the minute, or to the second. */
  moment(instant: string, options?: { seconds?: boolean }): string
  isSameDay(a: string, b: string): boolean
  join(items: readonly string[]): string
}

export function openWords(language: Language, zone: string): ReportWords {
  const say: ReportWords['say'] = (id, params = {}) =>
    translate(language, `pdf.${id}`, Object.fromEntries(Object.entries(params).map(([name, value]) => [name, typeof value === 'string' ? isolate(value) : value])))
  const unit = (code: string): string => translate(language, `units.${code}`)
  const typed = (value: string): string => formatNumber(value, { digits: value.split('.')[1]?.length ?? 0 }, language)
  const amount = (value: string): string => formatNumber(value, roundingOf(Number(value)), language)
  // The figure keeps to the unit's first word; a long unit may break after that.
  const withUnit = (value: string, code: string): string =>
    say('mix.quantity', { value, unit: unit(code) }).replace(' ', '\u00A0')
  const day: ReportWords['day'] = (instant, options = {}) => formatDay(language, civilDateIn(zone, instant), options)
  const time = (instant: string): string => civilTimeIn(zone, instant)
  return {
    language, say, unit,
    plainLabel: (name) => translate(language, `records.plain.${name}.label`),
    plainNone: (name) => translate(language, `records.plain.${name}.none`),
    typed, amount, day, time,
    hectares: (areaM2) => formatHectares(areaM2, language, Number(areaM2) < SMALL_AREA_M2 ? 4 : 2),
    short: (value) => formatNumber(value, {}, language),
    quantity: (value, code) => withUnit(typed(value), code),
    worked: (value, code) => withUnit(amount(value), code),
    moment: (instant, { seconds = false } = {}) =>
      say('moment', { day: day(instant), time: seconds ? `${time(instant)}:${secondsOf(instant)}` : time(instant) }),
    isSameDay: (a, b) => civilDateIn(zone, a) === civilDateIn(zone, b),
    join: (items) => joinWords(items, say),
  }
}

function roundingOf(value: number): { digits: number } | { significant: number } {
  if (value >= 10_000) return { digits: 0 }
  if (value >= 100 || value === 0) return { digits: 1 }
  return value >= 1 ? { digits: 2 } : { significant: 3 }
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
