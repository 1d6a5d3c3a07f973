import { z } from 'zod'
import { blockSchema, boundarySchema, geometryInput } from './block.ts'
import { acknowledgedSchema, civilDateSchema, idSchema, pageQuerySchema, revisionSchema } from './common.ts'
import { lineText, noteText } from './text.ts'

const code = lineText(12)
const name = lineText(80)
const crop = lineText(120).nullable()
/** The farm's today where it is left out. */
const drawnOn = civilDateSchema.optional()

/** Query of the list of blocks; those that have ended come along when asked for. */
export const blockQuerySchema = pageQuerySchema.extend({ ended: z.enum(['true', 'false']).default('false') })

/** What is left out stays as it is; another outline makes a new boundary version. */
export const updateBlockSchema = z.strictObject({
  revision: revisionSchema,
  code: code.optional(),
  name: name.optional(),
  crop: crop.optional(),
  geometry: geometryInput.optional(),
  drawnOn,
  /** Goes with the new boundary version. */
  note: noteText(500).nullable().optional(),
  acknowledged: acknowledgedSchema.default([]),
})
export type UpdateBlock = z.output<typeof updateBlockSchema>

export const splitBlockSchema = z.strictObject({
  revision: revisionSchema,
  drawnOn,
  parts: z.array(z.strictObject({ id: idSchema, code, name, crop: crop.optional(), geometry: geometryInput })).min(2).max(50),
})
export type SplitBlock = z.output<typeof splitBlockSchema>

export const mergeBlocksSchema = z.strictObject({
  blocks: z.array(z.strictObject({ id: idSchema, revision: revisionSchema })).min(2).max(50),
  block: z.strictObject({ id: idSchema, code, name, crop: crop.optional() }),
  drawnOn,
  acknowledged: acknowledgedSchema.default([]),
})
export type MergeBlocks = z.output<typeof mergeBlocksSchema>

export const reopenBlockSchema = z.strictObject({ revision: revisionSchema })

/** What a cut, a join or their undoing did: blocks that ended by it, and blocks that stand now. */
export const blocksChangedSchema = z.object({ ended: z.array(blockSchema), open: z.array(blockSchema) })
export type BlocksChanged = z.infer<typeof blocksChangedSchema>

/** One version of a block's outline, and the signed records that rest on it. */
export const boundaryVersionSchema = z.object({
  version: z.number().int(),
  geometry: boundarySchema,
  areaM2: z.number(),
  perimeterM: z.number(),
  drawnOn: z.string(),
  note: z.string().nullable(),
  /** Name of whoever drew it; null where an older schema did not say. */
  by: z.string().nullable(),
  at: z.string(),
  records: z.array(z.object({ id: z.string(), number: z.string() })),
})
export type BoundaryVersion = z.infer<typeof boundaryVersionSchema>
export const boundaryVersionsSchema = z.object({ items: z.array(boundaryVersionSchema) })
