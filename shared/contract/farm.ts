import { z } from 'zod'
import { fittingSchema, inForceSchema } from './calibration.ts'
import { idSchema, revisionSchema } from './common.ts'
import { profileAnswer } from './farmProfile.ts'
import { positiveDecimal } from './quantity.ts'
import { seasonStartSchema } from './seasonStart.ts'
import { lineText } from './text.ts'

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
  /** A point on the farm, [lon, lat]: of the first block, else where the map was set to open; null before either. */
  place: z.tuple([z.number(), z.number()]).nullable(),
  ...profileAnswer,
})
export type Farm = z.infer<typeof farmSchema>

const sprayerFields = {
  code: lineText(12),
  name: lineText(80),
  /** Usable tank volume, litres. */
  tankL: positiveDecimal,
  /** What it puts out while spraying, litres a minute, where it was measured. */
  flowLPerMin: positiveDecimal.nullable(),
}

export const createSprayerSchema = z.strictObject({ id: idSchema, ...sprayerFields, flowLPerMin: sprayerFields.flowLPerMin.default(null), fitting: fittingSchema.optional() })

/** What is not sent stays as it is; a fitting is sent whole. */
export const updateSprayerSchema = z.strictObject({ revision: revisionSchema, ...sprayerFields, fitting: fittingSchema }).partial().required({ revision: true })
export type UpdateSprayer = z.output<typeof updateSprayerSchema>

export const sprayerSchema = z.object({
  id: z.string(),
  code: z.string(),
  name: z.string(),
  tankL: z.string(),
  flowLPerMin: z.string().nullable(),
  fitting: fittingSchema,
  /** Null until somebody measured it. */
  calibration: inForceSchema.nullable(),
  /** The civil day on which it was put out of use, and why; null while it is in use. */
  retired: z.object({ on: z.string(), reason: z.string() }).nullable(),
  revision: z.number().int(),
})
export type Sprayer = z.infer<typeof sprayerSchema>
