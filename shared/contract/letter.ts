import { z } from 'zod'
import { idSchema, messageSchema } from './common.ts'

/** A letter of the farm as its owner sees it. */
export const letterSchema = z.object({
  id: z.string(),
  /** What it is about: the name of its kind. */
  kind: z.string(),
  to: z.string(),
  toName: z.string().nullable(),
  state: z.enum(['waiting', 'failing', 'sent', 'dead']),
  tries: z.number().int(),
  createdAt: z.string(),
  sentAt: z.string().nullable(),
  /** When it is tried next, while it waits. */
  nextTryAt: z.string().nullable(),
  /** What kept it from going, in words. */
  fault: messageSchema.nullable(),
  /** One with a one-time link in it is not: its link works once. */
  canResend: z.boolean(),
})
export type Letter = z.infer<typeof letterSchema>

/** Sending a letter again makes a new one under this id. */
export const resendLetterSchema = z.strictObject({ id: idSchema })
