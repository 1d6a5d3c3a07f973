import { z } from 'zod'
import { acknowledgedSchema, civilDateSchema, idSchema } from './common.ts'
import { landSchema } from './land.ts'
import { lineText, noteText } from './text.ts'

/** GeoJSON geometry as it comes in, whatever it is: shared/geo/checkBoundary judges it and says what is wrong in words. */
export const geometryInput = z.looseObject({ type: z.string().max(40), coordinates: z.unknown().optional() })

const position = z.tuple([z.number(), z.number()])
const polygonSchema = z.object({ type: z.literal('Polygon'), coordinates: z.array(z.array(position)) })
const multiPolygonSchema = z.object({ type: z.literal('MultiPolygon'), coordinates: z.array(z.array(z.array(position))) })
export const boundarySchema = z.union([polygonSchema, multiPolygonSchema])
export type Boundary = z.infer<typeof boundarySchema>

export const createBlockSchema = z.strictObject({
  id: idSchema,
  code: lineText(12),
  name: lineText(80),
  crop: lineText(120).nullable().default(null),
  geometry: geometryInput,
  /** The day the outline was drawn or walked; today on the farm where it is left out. */
  drawnOn: civilDateSchema.optional(),
  /** What the outline rests on: walked, off a survey, off a picture. */
  note: noteText(500).nullable().optional(),
  acknowledged: acknowledgedSchema.default([]),
})
export type CreateBlock = z.infer<typeof createBlockSchema>

/** How a block ended: cut into parts, put together with others, or made by a cut or join that was undone. */
export const BLOCK_ENDS = ['split', 'merge', 'undone'] as const
export type BlockEnd = (typeof BLOCK_ENDS)[number]

export const blockSchema = z.object({
  id: z.string(),
  code: z.string(),
  name: z.string(),
  crop: z.string().nullable(),
  geometry: boundarySchema,
  /** Plan area on the WGS84 ellipsoid, square metres. */
  areaM2: z.number(),
  /** Length of all rings on the ellipsoid, metres. */
  perimeterM: z.number(),
  version: z.number().int(),
  revision: z.number().int(),
  /** The farm's day on which it ceased to be a block of its own; null while it is one. */
  endedOn: z.string().nullable(),
  endedBy: z.enum(BLOCK_ENDS).nullable(),
  /** Blocks it was cut from or put together from. */
  fromIds: z.array(z.string()),
  /** Blocks that came of it when it ended. */
  intoIds: z.array(z.string()),
  /** Null where nobody has said how the land stands. */
  land: landSchema.nullable(),
  /** What is counted on it: plants of the plantings that stand, beds, rows and metres of row; null where nobody counted. */
  counts: z.object({ plants: z.number().nullable(), beds: z.number().nullable(), rows: z.number().nullable(), rowM: z.number().nullable() }),
  createdAt: z.string(),
})
export type Block = z.infer<typeof blockSchema>
