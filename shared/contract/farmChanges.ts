import { z } from 'zod'
import { acknowledgedSchema, revisionSchema } from './common.ts'
import { placeSchema, profileFields } from './farmProfile.ts'
import { seasonStartSchema } from './seasonStart.ts'
import { lineText } from './text.ts'

/** What is not sent stays as it is. */
export const updateFarmSchema = z.strictObject({
  revision: revisionSchema,
  name: lineText(120),
  /** IANA time zone of the land. */
  zone: z.string().max(60),
  seasonStart: seasonStartSchema,
  /** Where the map opens while no block is drawn. */
  home: placeSchema,
  ...profileFields,
  acknowledged: acknowledgedSchema,
}).partial().required({ revision: true })
export type UpdateFarm = z.output<typeof updateFarmSchema>
