import { z } from 'zod'
import { boundarySchema } from './block.ts'
import { civilDateSchema, idSchema, instantSchema } from './common.ts'
import { EACH, eachSchema } from './each.ts'
import { amountSchema, amountUnit, knownAmountSchema, positiveDecimal, rateUnit, volumeRateUnit, volumeUnit } from './quantity.ts'
import { lineText, noteText } from './text.ts'
import { weatherSchema } from './weather.ts'

export const METHODS = ['foliar', 'drench', 'injected', 'solid'] as const
export const methodSchema = z.enum(METHODS)
export type Method = z.infer<typeof methodSchema>

const span = { from: z.number().int().min(1).max(9999), to: z.number().int().min(1).max(9999), of: z.number().int().min(1).max(9999) }
const isSpan = ({ from, to, of }: { from: number; to: number; of: number }): boolean => from <= to && to <= of

/** What share of the block was treated. Rows and beds are counted as equal parts of it: `from` to `to` of `of`. */
export const partSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('whole') }),
  /** Above 0 and at most 1. */
  z.strictObject({ kind: z.literal('fraction'), fraction: positiveDecimal.regex(/^(0\.\d+|1(\.0+)?)$/, { error: 'part.fraction' }) }),
  z.strictObject({ kind: z.literal('drawn'), geometry: boundarySchema }),
  z.strictObject({ kind: z.literal('rows'), ...span }).refine(isSpan, { error: 'part.span', path: ['to'] }),
  z.strictObject({ kind: z.literal('beds'), ...span }).refine(isSpan, { error: 'part.span', path: ['to'] }),
])
export type Part = z.infer<typeof partSchema>

const WHOLE_NUMBER = /^[1-9]\d*$/
/** Plants, trees, metres of row, beds and pots that were treated on a line; what is not counted is not there. */
export const countsSchema = z.partialRecord(eachSchema, positiveDecimal).superRefine((counts, context) => {
  for (const each of EACH) {
    const count = counts[each]
    if (each !== 'rowM' && count !== undefined && !WHOLE_NUMBER.test(count)) context.addIssue({ code: 'custom', path: [each], message: 'number.whole' })
  }
})
export type Counts = z.infer<typeof countsSchema>

export const blockLineSchema = z.strictObject({
  blockId: idSchema,
  part: partSchema.default({ kind: 'whole' }),
  counts: countsSchema.default({}),
  /** Growth stage in plain words, and its BBCH code where somebody asks for it. */
  stage: lineText(80).nullable().default(null),
  bbch: z.string().regex(/^\d{2,3}$/, { error: 'bbch.format' }).nullable().default(null),
  startedAt: instantSchema.nullable().default(null),
  endedAt: instantSchema.nullable().default(null),
  /** What went on this block, as it happened. */
  amount: knownAmountSchema.nullable().default(null),
})
export type BlockLine = z.infer<typeof blockLineSchema>

/** How a component is measured out. */
export const basisSchema = z.discriminatedUnion('kind', [
  /** By volume: 1 part to N parts of the carrier water, or, read `in`, 1 part in N parts of the finished mix. */
  z.strictObject({ kind: z.literal('ratio'), parts: positiveDecimal, reading: z.enum(['to', 'in']).default('to') })
    .refine(({ parts, reading }) => reading === 'to' || Number(parts) >= 1, { error: 'ratio.in_below_one', path: ['parts'] }),
  z.strictObject({ kind: z.literal('perArea'), value: positiveDecimal, unit: rateUnit }),
  /** For each plant, tree, metre of row, bed or pot of the lines. */
  z.strictObject({ kind: z.literal('perEach'), value: positiveDecimal, unit: amountUnit, each: eachSchema }),
  /** In each full tank; pro rata in the last part load. */
  z.strictObject({ kind: z.literal('perTank'), value: positiveDecimal, unit: amountUnit }),
  /** In all. */
  z.strictObject({ kind: z.literal('total'), value: positiveDecimal, unit: amountUnit }),
])
export type Basis = z.infer<typeof basisSchema>

export const componentSchema = z.strictObject({
  materialId: idSchema,
  lotId: idSchema.nullable().default(null),
  basis: basisSchema,
  /** What was really taken, where it was not what the sheet says. */
  used: knownAmountSchema.nullable().default(null),
})
export type RecordComponent = z.infer<typeof componentSchema>

const source = lineText(80).nullable().default(null)

/** How the mix is sized. Whatever is given, the sheet finds the rest. */
export const waterSchema = z.discriminatedUnion('sizedFrom', [
  /** Carrier water, in all. */
  z.strictObject({ sizedFrom: z.literal('water'), value: positiveDecimal, unit: volumeUnit, source }),
  /** The finished mix over the area treated. */
  z.strictObject({ sizedFrom: z.literal('sprayRate'), value: positiveDecimal, unit: volumeRateUnit, source }),
  /** The finished mix for each plant, tree, metre of row, bed or pot. */
  z.strictObject({ sizedFrom: z.literal('perEach'), value: positiveDecimal, unit: volumeUnit, each: eachSchema, source }),
  /** As much as the amount of one component allows, the scarcest jar: `component` is its place in the list. */
  z.strictObject({ sizedFrom: z.literal('jar'), component: z.number().int().min(0).max(19), ...amountSchema.shape, source }),
  /** No water: put on as it is. */
  z.strictObject({ sizedFrom: z.literal('none') }),
])
export type Water = z.infer<typeof waterSchema>

/** Protective equipment that was worn. */
export const PROTECTION = ['gloves', 'eyes', 'breathing', 'coverall', 'apron', 'boots', 'longSleeves', 'hat'] as const

/** Everything a person writes of an application; stored as it is in the draft and in the signed text. */
export const recordContentSchema = z.strictObject({
  method: methodSchema,
  lines: z.array(blockLineSchema).min(1).max(60),
  components: z.array(componentSchema).max(20).default([]),
  /** Null until it is known, and always for a solid spread. */
  water: waterSchema.nullable().default(null),
  sprayerId: idSchema.nullable().default(null),
  /** The civil day a solid was worked into the soil. */
  workedInOn: civilDateSchema.nullable().default(null),
  weather: weatherSchema.nullable().default(null),
  protection: z.array(z.enum(PROTECTION)).max(PROTECTION.length).default([]),
  purpose: noteText(300).nullable().default(null),
  licence: lineText(80).nullable().default(null),
  notes: noteText(4000).nullable().default(null),
  /** Who did the work; null means the person who sends it. */
  doneById: idSchema.nullable().default(null),
})
export type RecordContent = z.infer<typeof recordContentSchema>
/** The content before defaults are filled in: what a client may send. */
export type RecordContentInput = z.input<typeof recordContentSchema>
