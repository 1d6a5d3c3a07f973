import { z } from 'zod'
import { boundarySchema, geometryInput } from './block.ts'
import { civilDateSchema, idSchema, pageQuerySchema, revisionSchema } from './common.ts'
import { lineText } from './text.ts'

/** How what is eaten meets the soil: not at all, by splashes, by lying on it, or growing in it. */
export const SOIL_CONTACTS = ['none', 'splash', 'touches', 'in_soil'] as const
export type SoilContact = (typeof SOIL_CONTACTS)[number]

/** When a harvest is planned, first and last day. */
export const harvestSchema = z
  .strictObject({ from: civilDateSchema, to: civilDateSchema, note: lineText(120).nullable().default(null) })
  .refine(({ from, to }) => from <= to, { error: 'date.to_before_from', path: ['to'] })
export type Harvest = z.output<typeof harvestSchema>

const content = {
  /** An outline inside the block; null for all of it. */
  part: geometryInput.nullable().default(null),
  crop: lineText(80),
  /** EPPO code: five or six letters and digits, kept in capitals. */
  eppo: z.string().trim().toUpperCase().regex(/^[A-Z0-9]{5,6}$/, { error: 'planting.eppo' }).nullable().default(null),
  variety: lineText(80).nullable().default(null),
  plantedOn: civilDateSchema.nullable().default(null),
  removedOn: civilDateSchema.nullable().default(null),
  ediblePart: lineText(80).nullable().default(null),
  soilContact: z.enum(SOIL_CONTACTS).nullable().default(null),
  harvests: z.array(harvestSchema).max(40).default([]),
  plants: z.number().int().min(1).max(10_000_000).nullable().default(null),
}
const inOrder = ({ plantedOn, removedOn }: { plantedOn: string | null; removedOn: string | null }) => plantedOn === null || removedOn === null || plantedOn <= removedOn
const ORDER = { error: 'date.to_before_from', path: ['removedOn'] }

export const createPlantingSchema = z.strictObject({ id: idSchema, blockId: idSchema, ...content }).refine(inOrder, ORDER)
export type CreatePlanting = z.output<typeof createPlantingSchema>

/** A planting written anew; the block stays. */
export const updatePlantingSchema = z.strictObject({ revision: revisionSchema, ...content }).refine(inOrder, ORDER)
export type UpdatePlanting = z.output<typeof updatePlantingSchema>

export const plantingSchema = z.object({
  id: z.string(),
  blockId: z.string(),
  part: boundarySchema.nullable(),
  crop: z.string(),
  eppo: z.string().nullable(),
  variety: z.string().nullable(),
  plantedOn: z.string().nullable(),
  removedOn: z.string().nullable(),
  ediblePart: z.string().nullable(),
  soilContact: z.enum(SOIL_CONTACTS).nullable(),
  harvests: z.array(harvestSchema),
  plants: z.number().int().nullable(),
  revision: z.number().int(),
})
export type Planting = z.infer<typeof plantingSchema>

/** Query of lists of what belongs to blocks. */
export const ofBlockQuerySchema = pageQuerySchema.extend({ blockId: idSchema.optional() })
export type OfBlockQuery = z.output<typeof ofBlockQuerySchema>
