import { z } from 'zod'
import { idSchema, pageQuerySchema } from './common.ts'
import { RECORD_STATES } from './record.ts'
import { METHODS, methodSchema } from './recordContent.ts'
import { foldWords } from '../register/foldWords.ts'
import { lineText } from './text.ts'

/** How the register is ordered: by first start (newest first unless said otherwise), number or area; `-` is downwards. */
export const REGISTER_SORTS = ['-when', 'when', '-number', 'number', '-area', 'area'] as const
export type RegisterSort = (typeof REGISTER_SORTS)[number]

/** Whether somebody has read the version that stands, and said so. */
export const REVIEWS = ['waiting', 'done'] as const
export type Review = (typeof REVIEWS)[number]

const MOST_WORDS = 8

/** Words that each stand in a record, whole or by their beginning. */
const searchText = lineText(100)
  .refine((text) => foldWords(text).length > 0, { error: 'text.required' })
  .refine((text) => foldWords(text).length <= MOST_WORDS, { error: 'text.too_many_words' })

const seasonYear = z.number().int().min(1970).max(2199)

/** What the register is filtered by; every part given must fit. */
export const registerFilterSchema = z.strictObject({
  /** Named by the year it starts in. What is not signed counts to the season its work lies in. */
  season: seasonYear.optional(),
  block: idSchema.optional(),
  method: methodSchema.optional(),
  material: idSchema.optional(),
  /** Who did the work. */
  person: idSchema.optional(),
  state: z.enum(RECORD_STATES).optional(),
  /** Signed records that wait for a review, or have one. */
  review: z.enum(REVIEWS).optional(),
  q: searchText.optional(),
})
export type RegisterFilter = z.infer<typeof registerFilterSchema>

/** The same as it stands in an address. */
export const filterQuerySchema = registerFilterSchema.extend({
  season: z.string().regex(/^\d{4}$/).transform(Number).pipe(seasonYear).meta({ type: 'integer', minimum: 1970, maximum: 2199 }).optional(),
})
const sortSchema = z.enum(REGISTER_SORTS).default('-when')

const sortedQuerySchema = filterQuerySchema.extend({ sort: sortSchema })
export const registerQuerySchema = pageQuerySchema.extend(sortedQuerySchema.shape)
/** The same for what goes out as a file. */
export const printQuerySchema = sortedQuerySchema.extend({ language: z.enum(['en', 'es']).optional() })
export const volumeQuerySchema = printQuerySchema.extend({
  volume: z.string().regex(/^[1-9]\d{0,3}$/).transform(Number).meta({ type: 'integer', minimum: 1, default: 1 }).default(1),
})

const decimal = z.string()
const sumsSchema = z.object({
  records: z.number().int(),
  areaHa: decimal,
  /** Litres of the records that have litres. */
  totalL: decimal,
  /** Kilograms of what was measured by mass. */
  totalKg: decimal,
})

/** What the records of a filter add up to: signed ones only. */
export const registerTotalsSchema = sumsSchema.extend({
  /** Every record that fits, counted in the sums or not. */
  found: z.number().int(),
  withdrawn: z.number().int(),
  /** Drafts and started ones. */
  unsigned: z.number().int(),
  /** Signed ones that were entered more than 24 h after the work. */
  late: z.number().int(),
  byMethod: z.partialRecord(z.enum(METHODS), sumsSchema),
})
export type RegisterTotals = z.infer<typeof registerTotalsSchema>

/** Into how many volumes the printed register of a filter goes, and the records of each. */
export const registerVolumesSchema = z.object({
  volumes: z.number().int(),
  records: z.number().int(),
  items: z.array(z.object({ records: z.number().int() })),
})
export type RegisterVolumes = z.infer<typeof registerVolumesSchema>
