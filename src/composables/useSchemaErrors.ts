import type { z } from 'zod'
import { translate } from '../../shared/messages/translate.ts'
import { usePreferences } from '../stores/preferences.ts'

/** A code of the contract's schemas: `text.required`, `number.format`. */
const CODE = /^[a-z]+\.[a-z_]+$/

/** What the library itself found, as a code of ours. */
function codeOf({ code, message }: z.core.$ZodIssue): string {
  if (CODE.test(message)) return message
  if (code === 'invalid_value') return 'field.choose'
  return code === 'invalid_type' ? 'field.required' : 'field.format'
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
    for (const issue of read.error.issues) errors[issue.path.join('.')] ??= translate(preferences.language, `problems.${codeOf(issue)}`)
    return errors
  }
}
