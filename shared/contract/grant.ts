import { z } from 'zod'
import { civilDateSchema, idSchema, revisionSchema } from './common.ts'
import { passwordSchema } from './session.ts'
import { lineText } from './text.ts'

const MOST_SEASONS = 20

/** A season, named by the year it starts in. */
const seasonYear = z.number().int().min(1970).max(2199)
/** The same as it stands in an address. */
const seasonText = z.string().regex(/^\d{4}$/).transform(Number).pipe(seasonYear).meta({ type: 'integer', minimum: 1970, maximum: 2199 })
export const seasonParamsSchema = z.strictObject({ farmId: idSchema, season: seasonText })

/** Which seasons, each once, the oldest first. */
const seasonsSchema = z.array(seasonYear).min(1, { error: 'grant.no_season' }).max(MOST_SEASONS)
  .transform((seasons) => [...new Set(seasons)].sort((one, other) => one - other))

export const giveGrantSchema = z.strictObject({
  id: idSchema,
  /** Whom it lets in; not `email`, so that a password tried beside it is counted as the owner's own. */
  certifierEmail: z.string().trim().toLowerCase().pipe(z.email({ error: 'grant.email' }).max(254, { error: 'text.too_long' })),
  /** Who reviews: the certifying body, the public office. */
  organisation: lineText(120),
  seasons: seasonsSchema,
  /** Last civil day on which the grant stands. */
  endsOn: civilDateSchema,
  password: passwordSchema,
})
export type GiveGrant = z.output<typeof giveGrantSchema>

export const changeGrantSchema = z.strictObject({
  revision: revisionSchema,
  organisation: lineText(120).optional(),
  seasons: seasonsSchema.optional(),
  endsOn: civilDateSchema.optional(),
  password: passwordSchema,
})
export type ChangeGrant = z.output<typeof changeGrantSchema>

export const endGrantSchema = z.strictObject({ revision: revisionSchema, password: passwordSchema })
export type EndGrant = z.output<typeof endGrantSchema>

export const grantSchema = z.object({
  id: z.string(),
  email: z.string(),
  organisation: z.string(),
  seasons: z.array(z.number().int()),
  endsOn: z.string(),
  /** Ended before its last day. */
  endedAt: z.string().nullable(),
  /** Whether it opens the farm now. */
  stands: z.boolean(),
  givenBy: z.string().nullable(),
  createdAt: z.string(),
  /** The report that this certifier took away last. */
  lastTaken: z.object({ at: z.string(), season: z.number().int(), seq: z.number().int() }).nullable(),
  revision: z.number().int(),
})
export type Grant = z.infer<typeof grantSchema>

/** One granted season of one farm, as the certifier sees it. */
export const grantedSeasonSchema = z.object({
  farmId: z.string(),
  farmName: z.string(),
  zone: z.string(),
  season: z.number().int(),
  records: z.number().int(),
  withdrawn: z.number().int(),
  /** Last civil day, in the farm's zone. */
  grantedTo: z.string(),
  /** What the caller took away last: up to which entry of the log, and whether all entries up to it are what they were then. */
  head: z.object({ seq: z.number().int(), checkCode: z.string(), takenAt: z.string(), agrees: z.boolean() }).nullable(),
})
export type GrantedSeason = z.infer<typeof grantedSeasonSchema>

/** What was granted to the caller and has ended. */
const endedGrantSchema = z.object({
  farmName: z.string(),
  seasons: z.array(z.number().int()),
  /** Last civil day on which it stood, in the farm's zone. */
  endedOn: z.string(),
  /** Who gave it; empty where the name is not known any more. */
  givenBy: z.string(),
})
export type EndedGrant = z.infer<typeof endedGrantSchema>
export const grantedSeasonsSchema = z.object({ items: z.array(grantedSeasonSchema), ended: z.array(endedGrantSchema) })
export type GrantedSeasons = z.infer<typeof grantedSeasonsSchema>
