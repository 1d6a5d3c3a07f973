import { z } from 'zod'
import { civilDateSchema, idSchema, revisionSchema } from './common.ts'
import { positiveDecimal } from './quantity.ts'
import { lineText } from './text.ts'

export const BED_KINDS = ['bed', 'row'] as const
export type BedKind = (typeof BED_KINDS)[number]

const number = z.number().int().min(1).max(9999)
const content = {
  kind: z.enum(BED_KINDS),
  /** What they are called where they carry no numbers, or beside them. */
  name: lineText(40).nullable().default(null),
  fromNumber: number.nullable().default(null),
  toNumber: number.nullable().default(null),
  /** How many; beside numbers it is what they come to. */
  count: number,
  /** Of each, metres. */
  lengthM: positiveDecimal.nullable().default(null),
  /** Of each, metres. */
  widthM: positiveDecimal.nullable().default(null),
  /** In all of them together. */
  plants: z.number().int().min(1).max(10_000_000).nullable().default(null),
  endedOn: civilDateSchema.nullable().default(null),
}

interface Named { name: string | null; fromNumber: number | null; toNumber: number | null; count: number }
/** Numbers come in pairs, in order, and make the count; without numbers there is a name. */
function judge({ name, fromNumber, toNumber, count }: Named, context: z.RefinementCtx): void {
  const issue = (path: string, message: string) => context.addIssue({ code: 'custom', path: [path], message })
  if (fromNumber === null && toNumber === null) {
    if (name === null) issue('name', 'bed.named')
    return
  }
  if (fromNumber === null) issue('fromNumber', 'field.required')
  else if (toNumber === null) issue('toNumber', 'field.required')
  else if (fromNumber > toNumber) issue('toNumber', 'bed.span')
  else if (count !== toNumber - fromNumber + 1) issue('count', 'bed.count')
}

export const createBedSchema = z.strictObject({ id: idSchema, blockId: idSchema, ...content }).superRefine(judge)
export type CreateBed = z.output<typeof createBedSchema>

/** Beds or rows written anew; the block stays. */
export const updateBedSchema = z.strictObject({ revision: revisionSchema, ...content }).superRefine(judge)
export type UpdateBed = z.output<typeof updateBedSchema>

export const bedSchema = z.object({
  id: z.string(),
  blockId: z.string(),
  kind: z.enum(BED_KINDS),
  name: z.string().nullable(),
  fromNumber: z.number().int().nullable(),
  toNumber: z.number().int().nullable(),
  count: z.number().int(),
  lengthM: z.string().nullable(),
  widthM: z.string().nullable(),
  plants: z.number().int().nullable(),
  endedOn: z.string().nullable(),
  revision: z.number().int(),
})
export type Bed = z.infer<typeof bedSchema>
