import type { JournalFact } from '../../../shared/contract/journal.ts'
import { translate, type Language } from '../../../shared/messages/translate.ts'

/** A deed in words. */
export const actionWords = (language: Language, action: string): string => translate(language, `journal.action.${action}`)

/** A fact of a deed in words. */
export function factWords(language: Language, { name, value }: JournalFact): string {
  const isRole = name === 'role' || name === 'roleFrom' || name === 'roleTo'
  const text = name === 'format' ? translate(language, `journal.format.${value}`) : isRole ? translate(language, `session.role.${value}`) : value
  return translate(language, `journal.fact.${name}`, { value: text })
}
