import { z } from 'zod'
import { parseInstant } from '../time/parseInstant.ts'
import { noteText } from './text.ts'

const YEARS = /^(19[7-9]\d|20\d\d|21\d\d)-/

/** Made by whoever made the thing; the product's own clients make UUIDv7. One spelling, lower case. */
export const idSchema = z.guid({ error: 'id.format' }).toLowerCase()

/** An instant as it was sent: RFC 3339 with an offset, seconds given, at most nine decimals, year 1970 to 2199. */
export const instantSchema = z
  .string()
  .superRefine((text, context) => {
    const parsed = parseInstant(text)
    if (!parsed.ok) context.addIssue({ code: 'custom', message: parsed.problem.id })
  })
  .meta({ format: 'date-time' })

/** A civil date of the calendar, YYYY-MM-DD, year 1970 to 2199. */
export const civilDateSchema = z.iso
  .date({ error: 'date.invalid', abort: true })
  .refine((text) => YEARS.test(text), { error: 'date.years' })

/** What was unlikely and sent all the same, with the reason given. */
export const acknowledgedSchema = z
  .array(z.strictObject({ code: z.string().max(60), reason: noteText(500) }))
  .max(20)

export type Acknowledged = z.infer<typeof acknowledgedSchema>

/** A verdict, finding or label: words are rendered from shared/messages by id. */
export const messageSchema = z.object({
  id: z.string(),
  params: z.record(z.string(), z.union([z.string(), z.number()])),
})
export type Message = z.infer<typeof messageSchema>

const limitSchema = z
  .string()
  .regex(/^\d{1,3}$/)
  .transform(Number)
  .pipe(z.number().min(1).max(200))
  .meta({ type: 'integer', minimum: 1, maximum: 200, default: 50 })

/** Which state of an unsigned thing a writer saw; what no column could hold is refused. */
export const revisionSchema = z.number().int().min(1).max(2_147_483_647)

/** Query of every list. */
export const pageQuerySchema = z.strictObject({
  limit: limitSchema.default(50),
  cursor: z.string().max(400).optional(),
})

/** Which part of a list is asked for. */
export type Page = z.output<typeof pageQuerySchema>

/** Answer of every list. */
export const pageOf = <Item extends z.ZodType>(item: Item) =>
  z.object({ items: z.array(item), next: z.string().nullable() })

export const farmParamsSchema = z.strictObject({ farmId: idSchema })
export const thingParamsSchema = z.strictObject({ farmId: idSchema, id: idSchema })
