import { z } from 'zod'
import { messageSchema } from './common.ts'
import { ENTRIES, signedRecordSchema } from './signedRecord.ts'

/** One difference to the version before, in words; an empty list says that nothing stood there. */
const changeSchema = z.object({
  /** Where it stands in the signed text: `content.lines.0.endedAt`. */
  path: z.string(),
  label: z.array(messageSchema),
  before: z.array(messageSchema),
  after: z.array(messageSchema),
})
export type VersionChange = z.infer<typeof changeSchema>

const personRef = z.object({ id: z.string(), name: z.string() })

/** Signed versions of a record, oldest first. */
export const recordVersionsSchema = z.object({
  items: z.array(z.object({
    version: z.number().int(),
    entry: z.enum(ENTRIES),
    /** Why it was made; null for the first. */
    reason: z.string().nullable(),
    signedBy: personRef.nullable(),
    signedAt: z.string(),
    signedWith: z.enum(['password', 'pin']),
    seq: z.number().int(),
    digest: z.string(),
    canonicalText: z.string(),
    signed: signedRecordSchema,
    /** Everything that is not as it was in the version before. */
    changes: z.array(changeSchema),
  })),
  /** Names of everybody who stands in these versions, as they are now. */
  people: z.array(personRef),
  next: z.null(),
})
export type RecordVersions = z.infer<typeof recordVersionsSchema>
