import { z } from 'zod'

/** First day of the season's year, MM-DD; not 29 February. */
export const seasonStartSchema = z
  .string()
  .regex(/^(0[1-9]|1[0-2])-(0[1-9]|[12]\d|3[01])$/, { error: 'date.invalid', abort: true })
  .refine((text) => !Number.isNaN(Date.parse(`2023-${text}T00:00:00Z`)) && new Date(`2023-${text}T00:00:00Z`).toISOString().slice(5, 10) === text, { error: 'date.invalid' })
