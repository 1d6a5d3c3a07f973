import { z } from 'zod'
import { civilDateSchema, revisionSchema } from './common.ts'
import { lineText, noteText } from './text.ts'

export const LAND_STATUSES = ['certified', 'transition', 'uncertified', 'buffer'] as const
export type LandStatus = (typeof LAND_STATUSES)[number]
export const TENURES = ['own', 'rented', 'lent'] as const

/** How the land of a block stands, as the farm says it. */
export const landSchema = z.strictObject({
  status: z.enum(LAND_STATUSES),
  /** First day of that status; null where it is not known. */
  statusSince: civilDateSchema.nullable().default(null),
  /** The last prohibited substance that is known of; null where none is written down. */
  lastProhibited: z.strictObject({
    substance: lineText(120),
    on: civilDateSchema,
    /** What proves it, in words. */
    proof: noteText(500),
  }).nullable().default(null),
  tenure: z.enum(TENURES).nullable().default(null),
  tenureUntil: civilDateSchema.nullable().default(null),
  tenureNote: noteText(500).nullable().default(null),
})
export type Land = z.output<typeof landSchema>

export const putLandSchema = landSchema.extend({ revision: revisionSchema })
export type PutLand = z.output<typeof putLandSchema>
