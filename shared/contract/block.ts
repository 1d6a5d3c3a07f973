import { z } from 'zod'
import { acknowledgedSchema, idSchema } from './common.ts'
import { lineText } from './text.ts'

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
  acknowledged: acknowledgedSchema.default([]),
})
export type CreateBlock = z.infer<typeof createBlockSchema>

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
  createdAt: z.string(),
})
export type Block = z.infer<typeof blockSchema>
