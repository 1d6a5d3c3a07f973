import { z } from 'zod'
import { JOURNAL_KINDS } from '../journal/journalActions.ts'
import { civilDateSchema, idSchema, pageQuerySchema } from './common.ts'

/** What the journal is filtered by; every part given must fit. */
export const journalFilterSchema = z.strictObject({
  /** Who did it. */
  person: idSchema.optional(),
  kind: z.enum(JOURNAL_KINDS).optional(),
  /** The civil day, in the farm's zone. */
  day: civilDateSchema.optional(),
  /** What it was about. */
  subject: idSchema.optional(),
})
export type JournalFilter = z.infer<typeof journalFilterSchema>
export const journalQuerySchema = pageQuerySchema.extend(journalFilterSchema.shape)
export const journalCsvQuerySchema = journalFilterSchema.extend({ language: z.enum(['en', 'es']).optional() })

/** What an entry says beside the deed, by name. */
export const journalFactSchema = z.object({
  name: z.enum(['reason', 'version', 'season', 'seasons', 'endsOn', 'format', 'volume', 'role', 'roleFrom', 'roleTo', 'dayFrom', 'dayTo']),
  value: z.string(),
})
export type JournalFact = z.infer<typeof journalFactSchema>

export const journalEntrySchema = z.object({
  id: z.string(),
  at: z.string(),
  /** As the person is called now; null for the server's own work, and for a name that was blanked. */
  by: z.object({ personId: z.string().nullable(), name: z.string() }).nullable(),
  /** A certifier, who is no person of the farm. */
  isOutsider: z.boolean(),
  /** `record.signed` and its like. */
  action: z.string(),
  subjectId: z.string().nullable(),
  /** What it was about as people call it: a number, a code, a name. */
  subject: z.string().nullable(),
  facts: z.array(journalFactSchema),
  from: z.object({ network: z.string().nullable(), device: z.string().nullable() }),
})
export type JournalEntry = z.infer<typeof journalEntrySchema>
