import type { z } from 'zod'
import { translate } from '../../shared/messages/translate.ts'
import { usePreferences } from '../stores/preferences.ts'

/** A code of the contract's schemas: `text.required`, `number.format`. */
const CODE = /^[a-z]+\.[a-z_]+$/

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
      const code = CODE.test(issue.message) ? issue.message : 'field.required'
      errors[issue.path.join('.')] ??= translate(preferences.language, `problems.${code}`)
    }
    return errors
  }
}
