import { useI18n } from 'vue-i18n'
import type { z } from 'zod'

/** What the contract says against a body before it is sent: dotted path of the field → sentence. Empty when it may go. */
export function useBodyErrors(): (schema: z.ZodType, body: unknown) => Record<string, string> {
  const { t, te } = useI18n()
  const wordsOf = (code: string): string => t(te(`problems.${code}`) ? `problems.${code}` : 'problems.field.format')
  return (schema, body) => {
    const read = schema.safeParse(body)
    if (read.success) return {}
    const found: Record<string, string> = {}
    for (const issue of read.error.issues) found[issue.path.join('.')] ??= wordsOf(issue.message)
    return found
  }
}
