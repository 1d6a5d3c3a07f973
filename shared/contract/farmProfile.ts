import { z } from 'zod'
import { UNIT_SYSTEMS } from '../units/readingUnit.ts'
import { certificateSchema } from './certificate.ts'
import { lineText, noteText } from './text.ts'

/** Public law that a farm may say it works under; named only, nothing is judged by it yet. Titles and citations stand in the messages. */
export const RULE_SETS = ['usOrganic', 'usProduceSafety', 'usWorkerProtection', 'euOrganic'] as const
export type RuleSet = (typeof RULE_SETS)[number]

/** Who is asked about the farm, and how. */
export const contactSchema = z.strictObject({
  person: lineText(120).nullable().default(null),
  address: noteText(300).nullable().default(null),
  phone: lineText(40).nullable().default(null),
  email: lineText(254).nullable().default(null),
})
export type Contact = z.output<typeof contactSchema>

/** A point on the farm, [lon, lat]. */
export const placeSchema = z.tuple([z.number().min(-180).max(180), z.number().min(-90).max(90)])

/** Days from one calibration of a sprayer to the next. */
export const calibrationDaysSchema = z.number().int().min(1).max(1830)

export const profileFields = {
  units: z.enum(UNIT_SYSTEMS),
  contact: contactSchema.nullable(),
  ruleSets: z.array(z.enum(RULE_SETS)).max(RULE_SETS.length),
  calibrationDays: calibrationDaysSchema,
}

/** The profile as it is answered, beside the farm's name and season. */
export const profileAnswer = {
  ...profileFields,
  /** Oldest first, those taken back among them. */
  certificates: z.array(certificateSchema),
  /** Where somebody set the map to open; null where nobody did. */
  home: placeSchema.nullable(),
  /** Made to try things on: nothing on it is a record of a farm. */
  practice: z.boolean(),
  revision: z.number().int(),
}
