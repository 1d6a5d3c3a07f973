import { z } from 'zod'
import { geometryInput } from './block.ts'
import { civilDateSchema, idSchema, revisionSchema } from './common.ts'
import { positiveDecimal } from './quantity.ts'
import { lineText, noteText } from './text.ts'

/** What a spray is kept away from. */
export const SITE_KINDS = ['well', 'spring', 'watercourse', 'pond', 'hives', 'dwelling', 'school', 'neighbourCrop', 'other'] as const
export type SiteKind = (typeof SITE_KINDS)[number]
/** What the farm's own ground plan is drawn of. */
export const GROUND_KINDS = ['track', 'water', 'building', 'hedge', 'other'] as const
export type GroundKind = (typeof GROUND_KINDS)[number]

const MOST_M = 5_000
const metres = positiveDecimal.refine((text) => Number(text) <= MOST_M, { error: 'number.metres' })

const position = z.tuple([z.number(), z.number()])
const placeGeometrySchema = z.discriminatedUnion('type', [
  z.object({ type: z.literal('Point'), coordinates: position }),
  z.object({ type: z.literal('LineString'), coordinates: z.array(position) }),
  z.object({ type: z.literal('Polygon'), coordinates: z.array(z.array(position)) }),
])

const siteFacts = {
  kind: z.enum(SITE_KINDS),
  name: lineText(80),
  geometry: geometryInput,
  /** Distance kept clear round it, metres; null where none is written down. */
  keepClearM: metres.nullable(),
  note: noteText(500).nullable(),
  /** First civil day on which it is there no more. */
  endedOn: civilDateSchema.nullable(),
}
export const createSiteSchema = z.strictObject({
  id: idSchema, ...siteFacts, keepClearM: siteFacts.keepClearM.default(null), note: siteFacts.note.default(null), endedOn: siteFacts.endedOn.default(null),
})
export type CreateSite = z.infer<typeof createSiteSchema>
export const changeSiteSchema = z.strictObject(siteFacts).partial().extend({ revision: revisionSchema })
export type ChangeSite = z.infer<typeof changeSiteSchema>
export const siteSchema = z.object({ ...siteFacts, id: z.string(), geometry: placeGeometrySchema, revision: z.number().int(), createdAt: z.string() })
export type Site = z.infer<typeof siteSchema>

const groundFacts = {
  kind: z.enum(GROUND_KINDS),
  /** Null for what has no name: a hedge among hedges. */
  name: lineText(80).nullable(),
  geometry: geometryInput,
  /** How wide a line is on the ground, metres; null where that is not known, and for what is drawn as an outline. */
  widthM: metres.nullable(),
  /** First civil day on which it is there no more. */
  endedOn: civilDateSchema.nullable(),
}
export const createGroundSchema = z.strictObject({
  id: idSchema, ...groundFacts, name: groundFacts.name.default(null), widthM: groundFacts.widthM.default(null), endedOn: groundFacts.endedOn.default(null),
})
export type CreateGround = z.infer<typeof createGroundSchema>
export const changeGroundSchema = z.strictObject(groundFacts).partial().extend({ revision: revisionSchema })
export type ChangeGround = z.infer<typeof changeGroundSchema>
export const groundSchema = z.object({ ...groundFacts, id: z.string(), geometry: placeGeometrySchema, revision: z.number().int(), createdAt: z.string() })
export type GroundFeature = z.infer<typeof groundSchema>
