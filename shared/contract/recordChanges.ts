import { z } from 'zod'
import { acknowledgedSchema, idSchema, instantSchema, revisionSchema } from './common.ts'
import { jobIdSchema } from './job.ts'
import { problemSchema } from './problem.ts'
import { recordContentSchema } from './recordContent.ts'
import { passwordSchema } from './session.ts'
import { noteText } from './text.ts'

/** Jobs of season plans that a record was opened from; signed, it does them. */
const jobsSchema = z.array(jobIdSchema).max(60)

export const createRecordSchema = recordContentSchema.extend({
  id: idSchema,
  jobs: jobsSchema.default([]),
  /** The device's own clock when it was sent; kept beside the server's, never corrected. */
  deviceAt: instantSchema.nullable().default(null),
})
export type CreateRecord = z.infer<typeof createRecordSchema>

export const updateRecordSchema = recordContentSchema.extend({
  revision: revisionSchema,
  /** Left out, it stays opened from what it was opened from. */
  jobs: jobsSchema.optional(),
  deviceAt: instantSchema.nullable().default(null),
})
export type UpdateRecord = z.infer<typeof updateRecordSchema>

export const signRecordSchema = z.strictObject({
  password: passwordSchema,
  /** The revision that the signer saw; anything else is `stale`. */
  revision: revisionSchema.optional(),
  acknowledged: acknowledgedSchema.default([]),
})
export type SignRecord = z.infer<typeof signRecordSchema>

export const signManySchema = z.strictObject({ ids: z.array(idSchema).min(1).max(60), password: passwordSchema })
export type SignMany = z.infer<typeof signManySchema>
/** What became of each: those that could be signed are, the others say why not. */
export const signManyAnswerSchema = z.object({
  signed: z.array(z.object({ id: z.string(), number: z.string() })),
  refused: z.array(z.object({ id: z.string(), problem: problemSchema })),
})
export type SignManyAnswer = z.infer<typeof signManyAnswerSchema>

/** A field that keeps what stands where nothing is sent. */
type Kept<Field> = Field extends z.ZodDefault<infer Inner extends z.ZodType> ? z.ZodOptional<Inner> : Field extends z.ZodType ? z.ZodOptional<Field> : never
function keepUnsent<Shape extends z.ZodRawShape>(shape: Shape): { [Key in keyof Shape]: Kept<Shape[Key]> } {
  const kept = Object.entries(shape).map(([key, field]) => [key, (field instanceof z.ZodDefault ? field.unwrap() as z.ZodType : field as z.ZodType).optional()])
  return Object.fromEntries(kept) as { [Key in keyof Shape]: Kept<Shape[Key]> }
}

/** A new version of a signed record: what is sent replaces what stands, the reason says why. */
export const amendRecordSchema = z.strictObject({
  ...keepUnsent(recordContentSchema.shape),
  reason: noteText(500),
  /** Judged where it is sent; our own clients ask for it. */
  password: passwordSchema.optional(),
  revision: revisionSchema.optional(),
  deviceAt: instantSchema.nullable().default(null),
  acknowledged: acknowledgedSchema.default([]),
})
export type AmendRecord = z.infer<typeof amendRecordSchema>

export const withdrawRecordSchema = z.strictObject({
  reason: noteText(500),
  password: passwordSchema.optional(),
  revision: revisionSchema.optional(),
})
export type WithdrawRecord = z.infer<typeof withdrawRecordSchema>

export const reviewRecordSchema = z.strictObject({
  /** The version that was read; another one is `stale`. */
  version: z.number().int().min(1).optional(),
  note: noteText(500).nullable().default(null),
})
export type ReviewRecord = z.infer<typeof reviewRecordSchema>

/** Takes back a draft that will not be signed. One that was started stays in the journal, whole. */
export const discardRecordSchema = z.strictObject({ reason: noteText(500).nullable().default(null) })
export type DiscardRecord = z.infer<typeof discardRecordSchema>
