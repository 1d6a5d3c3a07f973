import { z } from 'zod'

/** A certificate as it is answered. */
export const certificateSchema = z.object({
  id: z.string(),
  number: z.string(),
  body: z.string(),
  scope: z.string().nullable(),
  /** Null of those written down before it was asked. */
  validFrom: z.string().nullable(),
  validUntil: z.string().nullable(),
  withdrawn: z.object({ at: z.string(), reason: z.string() }).nullable(),
  revision: z.number().int(),
})
export type Certificate = z.infer<typeof certificateSchema>
