import { z } from 'zod'
import { NOZZLE_SIZES } from '../mix/nozzleSizes.ts'
import { civilDateSchema, idSchema, pageQuerySchema, revisionSchema } from './common.ts'
import { positiveDecimal } from './quantity.ts'
import { lineText, noteText } from './text.ts'

export const SPRAYER_KINDS = ['boom', 'airblast', 'knapsack', 'lance', 'drench', 'injector', 'spreader', 'other'] as const

/** What is fitted to a sprayer and how it is driven; null where nobody has said. */
export const fittingSchema = z.strictObject({
  kind: z.enum(SPRAYER_KINDS).nullable().default(null),
  /** Width covered in one pass, metres. */
  swathM: positiveDecimal.nullable().default(null),
  /** A size of ISO 10625, or any other nozzle by its name, with its flow at 3 bar in litres a minute where that is known. */
  nozzle: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('iso'), size: z.enum(NOZZLE_SIZES) }),
    z.strictObject({ kind: z.literal('other'), name: lineText(60), flowLPerMin: positiveDecimal.nullable() }),
  ]).nullable().default(null),
  nozzles: z.number().int().min(1).max(400).nullable().default(null),
  /** Wires to the inch. */
  screenMesh: z.number().int().min(4).max(1000).nullable().default(null),
  /** Pressure at the nozzle while spraying, bar. */
  pressureBar: positiveDecimal.nullable().default(null),
  speedKmH: positiveDecimal.nullable().default(null),
})
export type Fitting = z.output<typeof fittingSchema>

/** What was measured, as it was measured. */
export const measuredSchema = z.discriminatedUnion('kind', [
  /** Millilitres caught from each nozzle in so many seconds; nozzles not caught are taken to be like their mean. */
  z.strictObject({
    kind: z.literal('catch'), catchesMl: z.array(positiveDecimal).min(1).max(60), seconds: positiveDecimal,
    nozzles: z.number().int().min(1).max(400), swathM: positiveDecimal, speedKmH: positiveDecimal,
  }),
  /** US fluid ounces caught from what sprays one width, in the time that a 1/128 acre course takes. */
  z.strictObject({ kind: z.literal('course'), widthIn: positiveDecimal, ounces: positiveDecimal }),
  /** Flow of the whole sprayer, litres a minute. */
  z.strictObject({ kind: z.literal('flow'), flowLPerMin: positiveDecimal, speedKmH: positiveDecimal, swathM: positiveDecimal }),
  /** Litres that went out over a plot walked or driven as one sprays. */
  z.strictObject({ kind: z.literal('plot'), volumeL: positiveDecimal, areaM2: positiveDecimal }),
])
export type Measured = z.output<typeof measuredSchema>

export const createCalibrationSchema = z.strictObject({
  id: idSchema,
  sprayerId: idSchema,
  on: civilDateSchema,
  /** Who measured, in words: it may be a workshop. */
  doneBy: lineText(120),
  measured: measuredSchema,
  note: noteText(1000).nullable().default(null),
})
export type CreateCalibration = z.output<typeof createCalibrationSchema>

export const withdrawCalibrationSchema = z.strictObject({ reason: noteText(500) })
export const retireSprayerSchema = z.strictObject({ revision: revisionSchema, reason: noteText(500) })

export const calibrationQuerySchema = pageQuerySchema.extend({ sprayerId: idSchema.optional() })
export type CalibrationQuery = z.output<typeof calibrationQuerySchema>

const personSchema = z.object({ id: z.string(), name: z.string() })

export const calibrationSchema = z.object({
  id: z.string(),
  sprayerId: z.string(),
  on: z.string(),
  doneBy: z.string(),
  /** The next one is due on this day: by the farm's interval as it was when this was written. */
  dueOn: z.string(),
  measured: measuredSchema,
  /** What was fitted then. */
  fitting: fittingSchema,
  /** Litres a hectare, unrounded. */
  rateLPerHa: z.string(),
  note: z.string().nullable(),
  by: personSchema,
  at: z.string(),
  withdrawn: z.object({ at: z.string(), by: personSchema, reason: z.string() }).nullable(),
})
export type Calibration = z.infer<typeof calibrationSchema>

/** The calibration a sprayer goes by: the newest that was not taken back. */
export const inForceSchema = z.object({ id: z.string(), on: z.string(), dueOn: z.string(), rateLPerHa: z.string() })
export type CalibrationInForce = z.infer<typeof inForceSchema>
