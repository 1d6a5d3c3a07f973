import { z } from 'zod'
import { isWithin } from '../units/isWithin.ts'
import { acknowledgedSchema, idSchema, instantSchema, messageSchema } from './common.ts'
import {
  amountUnit, decimalText, knownAmountSchema, positiveDecimal, rateUnit,
  signedDecimal, SPEED_UNITS, TEMPERATURE_UNITS, volumeRateUnit, volumeUnit,
} from './quantity.ts'
import { passwordSchema } from './session.ts'
import { noteText, lineText } from './text.ts'

export const METHODS = ['foliar', 'drench'] as const
export const methodSchema = z.enum(METHODS)
export type Method = z.infer<typeof methodSchema>

/** What share of the block was treated. */
const partSchema = z.strictObject({ kind: z.literal('whole') })

export const blockLineSchema = z.strictObject({
  blockId: idSchema,
  part: partSchema.default({ kind: 'whole' }),
  startedAt: instantSchema.nullable().default(null),
  endedAt: instantSchema.nullable().default(null),
  /** What went on this block, as it happened. */
  amount: knownAmountSchema.nullable().default(null),
})
export type BlockLine = z.infer<typeof blockLineSchema>

/** How a component is measured out. */
export const basisSchema = z.discriminatedUnion('kind', [
  /** 1 part to N parts of the carrier water, by volume. */
  z.strictObject({ kind: z.literal('ratio'), parts: positiveDecimal }),
  z.strictObject({ kind: z.literal('perArea'), value: positiveDecimal, unit: rateUnit }),
  /** In each full tank; pro rata in the last part load. */
  z.strictObject({ kind: z.literal('perTank'), value: positiveDecimal, unit: amountUnit }),
])
export type Basis = z.infer<typeof basisSchema>

export const componentSchema = z.strictObject({
  materialId: idSchema,
  lotId: idSchema.nullable().default(null),
  basis: basisSchema,
})

/** Carrier water: typed in all, or sized from the spray rate over the area. */
export const waterSchema = z.discriminatedUnion('sizedFrom', [
  z.strictObject({ sizedFrom: z.literal('water'), value: positiveDecimal, unit: volumeUnit, source: lineText(80).nullable().default(null) }),
  z.strictObject({ sizedFrom: z.literal('sprayRate'), value: positiveDecimal, unit: volumeRateUnit, source: lineText(80).nullable().default(null) }),
])
export type Water = z.infer<typeof waterSchema>

/** How a weather value is known; a value from a model is never one of them. */
export const WEATHER_KINDS = ['readHere', 'felt', 'station'] as const
const reading = <Unit extends z.ZodType>(value: z.ZodString, unit: Unit) =>
  z.strictObject({ value, unit, kind: z.enum(WEATHER_KINDS) }).nullable().default(null)

export const WIND_POINTS = ['N', 'NE', 'E', 'SE', 'S', 'SW', 'W', 'NW'] as const
const weatherFacts = z.strictObject({
  wind: reading(decimalText, z.enum(SPEED_UNITS)),
  windFrom: z.enum(WIND_POINTS).nullable().default(null),
  air: reading(signedDecimal, z.enum(TEMPERATURE_UNITS)),
  humidity: reading(decimalText.regex(/^(\d{1,2}(\.\d+)?|100(\.0+)?)$/, { error: 'number.percent' }), z.literal('%')),
})
/** Air from −60 to 60 °C and wind up to 75 m/s, in whichever unit it is written; humidity is a percentage by its form. */
export const weatherSchema = weatherFacts.superRefine(({ wind, air }, context) => {
  const refuse = (field: string) => context.addIssue({ code: 'custom', path: [field, 'value'], message: 'number.range' })
  if (wind && decimalText.safeParse(wind.value).success && !isWithin(wind, { low: 0, high: 75, unit: 'ms' })) refuse('wind')
  if (air && signedDecimal.safeParse(air.value).success && !isWithin(air, { low: -60, high: 60, unit: 'degC' })) refuse('air')
})
export type Weather = z.infer<typeof weatherSchema>

/** Everything a person writes of an application; stored as it is in the draft and in the signed text. */
export const recordContentSchema = z.strictObject({
  method: methodSchema,
  lines: z.array(blockLineSchema).min(1).max(60),
  components: z.array(componentSchema).max(20).default([]),
  water: waterSchema.nullable().default(null),
  sprayerId: idSchema.nullable().default(null),
  weather: weatherSchema.nullable().default(null),
  purpose: noteText(300).nullable().default(null),
  notes: noteText(4000).nullable().default(null),
  /** Who did the work; null means the person who sends it. */
  doneById: idSchema.nullable().default(null),
})
export type RecordContent = z.infer<typeof recordContentSchema>
/** The content before defaults are filled in: what a client may send. */
export type RecordContentInput = z.input<typeof recordContentSchema>

export const createRecordSchema = recordContentSchema.extend({
  id: idSchema,
  /** The device's own clock when it was sent; kept beside the server's, never corrected. */
  deviceAt: instantSchema.nullable().default(null),
})
export type CreateRecord = z.infer<typeof createRecordSchema>

export const updateRecordSchema = recordContentSchema.extend({
  revision: z.number().int().min(1),
  deviceAt: instantSchema.nullable().default(null),
})
export type UpdateRecord = z.infer<typeof updateRecordSchema>

export const signRecordSchema = z.strictObject({
  password: passwordSchema,
  /** The revision that the signer saw; anything else is `stale`. */
  revision: z.number().int().min(1).optional(),
  acknowledged: acknowledgedSchema.default([]),
})
export type SignRecord = z.infer<typeof signRecordSchema>

export const VERDICTS = ['stop', 'caution', 'unknown', 'pass'] as const
export const RESTS = ['law', 'label', 'certifier', 'house', 'recipe'] as const
/** One check: what was judged, its figure, the sum in words and what it rests on. */
export const checkSchema = z.object({
  code: z.string(),
  verdict: z.enum(VERDICTS),
  rests: z.enum(RESTS),
  /** Title, sentence and figure as messages; `figure` empty where there is none. */
  title: messageSchema,
  text: messageSchema,
  figure: messageSchema.nullable(),
  source: messageSchema.nullable(),
  /** Where the value stands against its limits, to be drawn; null ends are open. All in one unit. */
  band: z.object({ low: z.number().nullable(), high: z.number().nullable(), value: z.number(), unit: z.string() }).nullable(),
  /** The thing on the page this check is about: "line:0", "component:1", "water", "sprayer", "wind". */
  about: z.string().nullable(),
})
export type Check = z.infer<typeof checkSchema>
export type Verdict = Check['verdict']
export type Rests = Check['rests']

/** Figures of the sheet; litres and square metres as numbers, amounts as decimal strings with a unit. */
export const computedSchema = z.object({
  areaM2: z.number(),
  totalL: z.number().nullable(),
  waterL: z.number().nullable(),
  sprayLPerHa: z.number().nullable(),
  loads: z.object({ full: z.number().int(), tankL: z.number(), lastL: z.number(), lastAreaHa: z.number() }).nullable(),
  components: z.array(z.object({ amount: z.object({ value: z.string(), unit: amountUnit }).nullable() })),
})
export type Computed = z.infer<typeof computedSchema>

export const RECORD_STATES = ['draft', 'started', 'signed', 'withdrawn'] as const
export type RecordState = (typeof RECORD_STATES)[number]
const personRef = z.object({ id: z.string(), name: z.string() })

export const recordSchema = recordContentSchema.extend({
  id: z.string(),
  state: z.enum(RECORD_STATES),
  number: z.string().nullable(),
  season: z.number().int().nullable(),
  version: z.number().int(),
  revision: z.number().int(),
  digest: z.string().nullable(),
  seq: z.number().int().nullable(),
  computed: computedSchema,
  checks: z.array(checkSchema),
  acknowledged: acknowledgedSchema,
  doneBy: personRef.nullable(),
  enteredBy: personRef.nullable(),
  signedBy: personRef.nullable(),
  signedAt: z.string().nullable(),
  deviceAt: z.string().nullable(),
  receivedAt: z.string(),
})
export type ApplicationRecord = z.infer<typeof recordSchema>

/** A row of the register: what a reader needs to find a record, computed when it was written. */
export const registerRowSchema = z.object({
  id: z.string(),
  state: z.enum(RECORD_STATES),
  number: z.string().nullable(),
  season: z.number().int().nullable(),
  version: z.number().int(),
  method: methodSchema,
  startedAt: z.string().nullable(),
  endedAt: z.string().nullable(),
  signedAt: z.string().nullable(),
  blocks: z.array(z.object({ id: z.string(), code: z.string() })),
  preparations: z.array(z.string()),
  lots: z.array(z.string()),
  areaHa: z.string(),
  totalL: z.string().nullable(),
  sprayLPerHa: z.string().nullable(),
  by: z.string(),
  /** Hours between the end of the work and the signature, where over 24. */
  lateHours: z.number().int().nullable(),
  tally: z.object({ stop: z.number().int(), caution: z.number().int(), unknown: z.number().int() }),
})
export type RegisterRow = z.infer<typeof registerRowSchema>

/** What an outsider learns from a check code: that the entry stands, and nothing of what it says. */
export const checkCodeAnswerSchema = z.object({
  found: z.boolean(),
  number: z.string().nullable(),
  seq: z.number().int().nullable(),
  version: z.number().int().nullable(),
  signedAt: z.string().nullable(),
  digest: z.string().nullable(),
})
export type CheckCodeAnswer = z.infer<typeof checkCodeAnswerSchema>
