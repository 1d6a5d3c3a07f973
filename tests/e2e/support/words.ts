import { en } from '../../../shared/messages/en.ts'
import '../../../shared/messages/everyLanguage.ts'
import { translate } from '../../../shared/messages/translate.ts'

/** The words a message has on the screen, so that a test finds a control by what a person reads. @throws {RangeError} for no such message. */
export function say(id: string, params: Record<string, string | number> = {}): string {
  return translate('en', id, params)
}

/** The words of a message with anything in the place of each param. @throws {RangeError} for no such message. */
export function saying(id: string): RegExp {
  const words = id.split('.').reduce<unknown>((found, name) => (typeof found === 'object' && found !== null ? Object.entries(found).find(([key]) => key === name)?.[1] : undefined), en)
  if (typeof words !== 'string') throw new RangeError(`No message "${id}"`)
  return new RegExp(words.split(/\{\w+\}/).map((part) => part.replace(/[.*+?^${}()|[\]\\]/g, '\\$&')).join('.+'))
}
