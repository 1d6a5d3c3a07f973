import { z } from 'zod'
import { idSchema } from './common.ts'
import { positiveDecimal } from './quantity.ts'
import { lineText } from './text.ts'

export const seasonStartSchema = z
  .string()
  .regex(/^(0[1-9]|1[0-2])-(0[1-9]|[12]\d|3[01])$/, { error: 'date.invalid', abort: true })
  .refine((text) => !Number.isNaN(Date.parse(`2023-${text}T00:00:00Z`)) && new Date(`2023-${text}T00:00:00Z`).toISOString().slice(5, 10) === text, { error: 'date.invalid' })

export const createFarmSchema = z.strictObject({
  id: idSchema,
  name: lineText(120),
  /** IANA time zone of the land. */
  zone: z.string().max(60),
  /** First day of the season's year, MM-DD; not 29 February. */
  seasonStart: seasonStartSchema,
})

export const farmSchema = z.object({
  id: z.string(),
  name: z.string(),
  zone: z.string(),
  seasonStart: z.string(),
  /** Season of today in the farm's zone. */
  currentSeason: z.number().int(),
  /** A point on the farm, [lon, lat], or null before the first block. */
  place: z.tuple([z.number(), z.number()]).nullable(),
})
export type Farm = z.infer<typeof farmSchema>

export const createSprayerSchema = z.strictObject({
  id: idSchema,
  code: lineText(12),
  name: lineText(80),
  /** Usable tank volume, litres. */
  tankL: positiveDecimal,
  /** What it puts out while spraying, litres a minute, where it was measured. */
  flowLPerMin: positiveDecimal.nullable().default(null),
})
export const sprayerSchema = z.object({
  id: z.string(),
  code: z.string(),
  name: z.string(),
  tankL: z.string(),
  flowLPerMin: z.string().nullable(),
  revision: z.number().int(),
})
export type Sprayer = z.infer<typeof sprayerSchema>
