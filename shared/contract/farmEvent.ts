import { z } from 'zod'
import { civilDateSchema, idSchema } from './common.ts'
import { ofBlockQuerySchema } from './planting.ts'
import { noteText } from './text.ts'

/** What is done on a farm besides applications. */
export const FARM_EVENT_KINDS = ['mulched', 'planted', 'mown', 'watered', 'first_pick', 'other'] as const
export type FarmEventKind = (typeof FARM_EVENT_KINDS)[number]

export const createFarmEventSchema = z
  .strictObject({
    id: idSchema,
    kind: z.enum(FARM_EVENT_KINDS),
    blockIds: z.array(idSchema).min(1).max(500),
    on: civilDateSchema,
    note: noteText(500).nullable().default(null),
  })
  // Nobody can read "other" later on without a word beside it.
  .refine(({ kind, note }) => kind !== 'other' || note !== null, { error: 'text.required', path: ['note'] })
export type CreateFarmEvent = z.output<typeof createFarmEventSchema>

export const withdrawFarmEventSchema = z.strictObject({ reason: noteText(500) })

/** Query of the list, newest first: of one block, from one day to another. */
export const farmEventQuerySchema = ofBlockQuerySchema.extend({ from: civilDateSchema.optional(), to: civilDateSchema.optional() })
export type FarmEventQuery = z.output<typeof farmEventQuerySchema>

export const farmEventSchema = z.object({
  id: z.string(),
  kind: z.enum(FARM_EVENT_KINDS),
  blockIds: z.array(z.string()),
  on: z.string(),
  note: z.string().nullable(),
  by: z.object({ id: z.string(), name: z.string() }),
  at: z.string(),
  /** Taken back, by whom and why; null while it stands. */
  withdrawn: z.object({ at: z.string(), by: z.object({ id: z.string(), name: z.string() }), reason: z.string() }).nullable(),
})
export type FarmEvent = z.infer<typeof farmEventSchema>
