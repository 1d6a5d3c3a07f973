import { z } from 'zod'

/** A problem (RFC 9457): what was wrong, where, and whether it passes when acknowledged. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  code: z.string(),
  detail: z.string(),
  errors: z.array(
    z.object({
      path: z.string(),
      code: z.string(),
      message: z.string(),
      params: z.record(z.string(), z.union([z.string(), z.number()])).optional(),
    }),
  ),
  acknowledgeable: z.boolean().optional(),
  current: z.unknown().optional(),
  requestId: z.string(),
})
export type Problem = z.infer<typeof problemSchema>
