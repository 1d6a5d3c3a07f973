import { z } from 'zod'
import { UNIT_SYSTEMS } from '../units/readingUnit.ts'
import { amountUnit, positiveDecimal } from './quantity.ts'
import { lineText } from './text.ts'

export const measuresSchema = z.array(z.strictObject({ name: lineText(24).nullable(), value: positiveDecimal, unit: amountUnit })).max(20)

/** What follows a person from device to device; a device that was told otherwise keeps its own choice. */
export const preferencesSchema = z.strictObject({
  /** Measures at hand. */
  measures: measuresSchema.optional(),
  /** What figures are read in; without a choice, as the farm reads them. */
  units: z.enum(UNIT_SYSTEMS).optional(),
  /** Day, or dark for the cab before sunrise. */
  light: z.enum(['day', 'dawn']).optional(),
  /** The morning letter of jobs due and late on farms that one leads: written unless this says `off`. */
  jobsByMail: z.enum(['on', 'off']).optional(),
})
export type Preferences = z.infer<typeof preferencesSchema>
