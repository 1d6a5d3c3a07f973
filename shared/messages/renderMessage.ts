import type { Message } from '../contract/common.ts'
import { formatNumber } from '../units/formatQuantity.ts'
import { formatDay } from './formatDay.ts'
import { translate, type Language } from './translate.ts'

/**
 * A verdict, finding or label in words. Numbers take the language's marks, params whose name ends in `On` are
 * civil dates, `unit` and those whose name ends in `Unit` are codes of units; every other string stands as it is. A number named `count`
 * chooses between the forms for one and for several. Figures are read in the unit they came in: see `messageFor` for a reader's own.
 * @throws {RangeError} if there is no message of that id.
 */
export function renderMessage(language: Language, message: Message): string {
  const { count } = message.params
  return translate(language, message.id, localiseParams(language, message.params), typeof count === 'number' ? count : undefined)
}

/** The params of a message as words of a language; see `renderMessage`. */
export function localiseParams(language: Language, params: Message['params']): Record<string, string> {
  return Object.fromEntries(
    Object.entries({ ...WORKED_OUT_IN, ...params }).map(([name, value]) => [name, localise(language, name, value)]),
  )
}

/** Units of figures whose makers name none: the words name them all the same. */
const WORKED_OUT_IN = { areaUnit: 'ha', groundUnit: 'm2', farUnit: 'km', volumeUnit: 'L' }

function localise(language: Language, name: string, value: string | number): string {
  if (typeof value === 'number') return formatNumber(value, { digits: decimalsOf(value) }, language)
  if (name.endsWith('On')) return formatDay(language, value)
  if (name === 'unit' || name.endsWith('Unit')) return translate(language, `units.${value}`)
  const signed = name === 'value' ? SIGNED.exec(value) : null
  return signed ? `${signed[1] ?? ''}${localise(language, name, Number(signed[2]))}` : value
}

/** A difference, which says its sign. */
const SIGNED = /^([+-])(\d+(?:\.\d+)?)$/

/** Digits after the point that the number already carries: its maker has rounded it for display. */
function decimalsOf(value: number): number {
  return String(value).split('.')[1]?.length ?? 0
}
