import { z } from 'zod'

/** What the labels in a signed record set for one of its block lines. */
const holdSchema = z.object({
  blockId: z.string(),
  recordId: z.string(),
  /** `2026-0143`. */
  number: z.string(),
  /** Civil day of the farm on which the work began. */
  on: z.string(),
  /** When the work ended: the instant from which its labels hold. */
  from: z.string(),
  /** Nobody goes in before that instant, and first civil day for picking; null where no label says so. */
  reEntryUntil: z.string().nullable(),
  pickFrom: z.string().nullable(),
  /** The last civil day of both. */
  heldTo: z.string(),
})
export type Hold = z.infer<typeof holdSchema>

/** Holds in the order in which their work began. */
export const holdsSchema = z.object({ items: z.array(holdSchema) })
