import { z } from 'zod'
import { dimensionOf } from '../units/dimensionOf.ts'
import { civilDateSchema, idSchema, revisionSchema } from './common.ts'
import { amountSchema, amountUnit, decimalText, positiveDecimal, rateUnit } from './quantity.ts'
import { lineText, noteText } from './text.ts'

export const MATERIAL_KINDS = ['ferment', 'extract', 'microbial', 'mineral', 'soap', 'oil', 'compost', 'seaweed', 'other'] as const
export const ORGANIC_STATUSES = ['allowed', 'restricted', 'prohibited', 'unknown'] as const

/** What a label sets, each null where the label says nothing; an input with no label has none. */
export const labelLimitsSchema = z.strictObject({
  maxRate: z.strictObject({ value: positiveDecimal, unit: rateUnit }).nullable().default(null),
  /** Parts by volume in the finished spray, percent. */
  minStrengthPct: positiveDecimal.nullable().default(null),
  maxStrengthPct: positiveDecimal.nullable().default(null),
  /** Hours nobody may enter after the application. */
  reEntryHours: decimalText.nullable().default(null),
  /** Days before harvest. */
  preHarvestDays: z.number().int().min(0).max(730).nullable().default(null),
  /** Where on the label this stands, "part 3". */
  source: lineText(120).nullable().default(null),
})
export type LabelLimits = z.infer<typeof labelLimitsSchema>

export type MaterialKind = (typeof MATERIAL_KINDS)[number]
export type OrganicStatus = (typeof ORGANIC_STATUSES)[number]

const materialFacts = z.strictObject({
  id: idSchema,
  name: lineText(80),
  kind: z.enum(MATERIAL_KINDS),
  measuredIn: z.enum(['volume', 'mass']),
  organicStatus: z.enum(ORGANIC_STATUSES),
  /** What the status rests on: a listing, a plan line, a letter. */
  statusBasis: noteText(300).nullable().default(null),
  label: labelLimitsSchema.nullable().default(null),
})
/** Refuses a label that contradicts itself: another measure than the material's, over 100 %, least over most. */
export const createMaterialSchema = materialFacts.superRefine(({ measuredIn, label }, context) => {
  if (!label) return
  const refuse = (path: keyof LabelLimits, message: string, ...more: string[]) =>
    context.addIssue({ code: 'custom', path: ['label', path, ...more], message })
  if (label.maxRate && dimensionOf(label.maxRate.unit) !== `${measuredIn}PerArea`) {
    refuse('maxRate', measuredIn === 'volume' ? 'unit.needs_volume' : 'unit.needs_mass', 'unit')
  }
  const least = Number(label.minStrengthPct ?? 0)
  const most = Number(label.maxStrengthPct ?? 100)
  if (least > 100) refuse('minStrengthPct', 'number.percent')
  if (most > 100) refuse('maxStrengthPct', 'number.percent')
  else if (least <= 100 && least > most) refuse('maxStrengthPct', 'label.most_below_least')
})
export type CreateMaterial = z.infer<typeof createMaterialSchema>

export const materialSchema = materialFacts.extend({ revision: z.number().int(), createdAt: z.string() })
export type Material = z.infer<typeof materialSchema>

export const LOT_ORIGINS = ['bought', 'gathered', 'made'] as const

export type LotOrigin = (typeof LOT_ORIGINS)[number]

export const createLotSchema = z.strictObject({
  id: idSchema,
  materialId: idSchema,
  code: lineText(24),
  origin: z.enum(LOT_ORIGINS),
  /** Where from: a seller, a wood, a jar. */
  source: lineText(120).nullable().default(null),
  receivedOn: civilDateSchema,
  quantity: amountSchema,
  expiresOn: civilDateSchema.nullable().default(null),
})
export type CreateLot = z.infer<typeof createLotSchema>

export const lotSchema = createLotSchema.extend({
  materialName: z.string(),
  /** What is left, in the unit it was received in. */
  left: z.object({ value: z.string(), unit: amountUnit }),
  revision: z.number().int(),
  createdAt: z.string(),
})
export type Lot = z.infer<typeof lotSchema>

/** A count of what is really there, with the reason the book was wrong. */
export const countLotSchema = z.strictObject({
  id: idSchema,
  revision: revisionSchema,
  left: z.strictObject({ value: decimalText, unit: amountUnit }),
  reason: noteText(500),
})
export type CountLot = z.infer<typeof countLotSchema>
