import type { z } from 'zod'
import { translate } from '../../../shared/messages/translate.ts'
import { usePreferences } from '../../stores/preferences.ts'

/** A code of the contract's schemas: `text.required`, `number.format`. */
const CODE = /^[a-z]+\.[a-z_]+$/

const isEmpty = (typed: unknown): boolean => typed === undefined || typed === null || typed === ''

/** What stands at a path of a value. */
const at = (value: unknown, path: readonly PropertyKey[]): unknown => path.reduce<unknown>((inside, key) => (inside as Record<PropertyKey, unknown> | null | undefined)?.[key], value)

/** A finding in words for whoever types: an id is something chosen, and an empty field is empty, whatever it should have been. */
function wordsOf(issue: z.core.$ZodIssue, typed: unknown): [code: string, params?: Record<string, number>] {
  if (issue.message === 'id.format') return ['field.choose']
  if (issue.message === 'date.invalid' && isEmpty(typed)) return ['field.required']
  if (CODE.test(issue.message)) return [issue.message]
  if (issue.code === 'invalid_value') return ['field.choose']
  if (issue.code === 'invalid_type') return isEmpty(typed) ? ['field.required'] : [issue.expected === 'int' ? 'number.whole' : issue.expected === 'number' ? 'number.format' : 'field.required']
  if (issue.code === 'too_small') return issue.origin === 'array' ? ['field.choose'] : ['field.too_small', { minimum: Number(issue.minimum) }]
  if (issue.code === 'too_big' && issue.origin !== 'array') return ['field.too_big', { maximum: Number(issue.maximum) }]
  return ['field.format']
}

/**
 * What a schema of the contract says about a value, field by field, in the person's language:
 * path of the field → sentence. Empty when it fits; the first finding of a field stands.
 */
export function useSchemaErrors(): (schema: z.ZodType, value: unknown) => Record<string, string> {
  const preferences = usePreferences()
  return (schema, value) => {
    const read = schema.safeParse(value)
    if (read.success) return {}
    const errors: Record<string, string> = {}
    for (const issue of read.error.issues) {
      const [code, params] = wordsOf(issue, at(value, issue.path))
      errors[issue.path.join('.')] ??= translate(preferences.language, `problems.${code}`, params)
    }
    return errors
  }
}
