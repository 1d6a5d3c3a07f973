import { z } from 'zod'
import { noteText } from './text.ts'

/** Made by whoever made the thing; the product's own clients make UUIDv7. */
export const idSchema = z.guid({ error: 'id.format' })

/** An instant: RFC 3339 with an offset, seconds given, year 1970 to 2199. */
export const instantSchema = z.iso
  .datetime({ offset: true, error: 'time.zone_needed' })
  .refine((text) => /^(19[7-9]\d|20\d\d|21\d\d)-/.test(text), { error: 'time.range' })
  .refine((text) => !Number.isNaN(Date.parse(text)), { error: 'time.invalid' })

/** A civil date of the calendar, YYYY-MM-DD. */
export const civilDateSchema = z.iso.date({ error: 'date.invalid' })

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

/** Query of every list. */
export const pageQuerySchema = z.strictObject({
  limit: z.coerce.number().int().min(1).max(200).default(50),
  cursor: z.string().max(400).optional(),
})

/** Answer of every list. */
export const pageOf = <Item extends z.ZodType>(item: Item) =>
  z.object({ items: z.array(item), next: z.string().nullable() })

export const farmParamsSchema = z.strictObject({ farmId: idSchema })
export const thingParamsSchema = z.strictObject({ farmId: idSchema, id: idSchema })
