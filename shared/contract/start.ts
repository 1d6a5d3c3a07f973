import { z } from 'zod'

/** The steps of a new farm's first hour, in their order. */
export const START_STEPS = ['place', 'profile', 'block', 'material', 'record', 'person'] as const
export type StartStep = (typeof START_STEPS)[number]

/** Which steps are done is read off the farm itself; only what was skipped or put away is kept. */
export const startSchema = z.object({
  steps: z.array(z.object({ step: z.enum(START_STEPS), state: z.enum(['done', 'skipped', 'open']) })),
  /** Not offered on Today any more. */
  away: z.boolean(),
})
export type Start = z.infer<typeof startSchema>

/** What is not sent stays as it is. */
export const updateStartSchema = z.strictObject({
  skipped: z.array(z.enum(START_STEPS)).max(START_STEPS.length),
  away: z.boolean(),
}).partial()
export type UpdateStart = z.output<typeof updateStartSchema>
