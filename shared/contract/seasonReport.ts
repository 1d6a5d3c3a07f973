import { z } from 'zod'

/** A season of a farm that has records. */
export const seasonSchema = z.object({
  season: z.number().int(),
  /** Signed records; withdrawn ones are counted beside them. */
  records: z.number().int(),
  withdrawn: z.number().int(),
  /** It has not ended. */
  isRunning: z.boolean(),
})
export type Season = z.infer<typeof seasonSchema>
export const seasonsSchema = z.object({ items: z.array(seasonSchema) })

const language = z.enum(['en', 'es']).optional()
const volume = z.string().regex(/^[1-9]\d{0,3}$/).transform(Number).meta({ type: 'integer', minimum: 1, default: 1 }).default(1)
export const reportQuerySchema = z.strictObject({ language })
export const reportVolumeQuerySchema = z.strictObject({ language, volume })

/** Into how many volumes the report goes, and the sheets of its records. */
export const reportVolumesSchema = z.object({
  records: z.number().int(),
  report: z.object({ volumes: z.number().int() }),
  sheets: z.object({ volumes: z.number().int() }),
})
export type ReportVolumes = z.infer<typeof reportVolumesSchema>
