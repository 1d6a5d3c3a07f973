import { z } from 'zod'
import { acknowledgedSchema, messageSchema } from './common.ts'
import { eachSchema } from './each.ts'
import { amountUnit } from './quantity.ts'
import { countsSchema, methodSchema, recordContentSchema } from './recordContent.ts'

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

const amount = z.object({ value: z.string(), unit: amountUnit })
const share = z.object({
  /** Ground treated on the line, square metres. */
  areaM2: z.number(),
  /** This line's share of the mix; the shares add up to the total. */
  shareL: z.string().nullable(),
  shareKg: z.string().nullable(),
  /** Nobody goes in before; from the labels in the mix, null where none says so or the work has not ended. */
  reEntryUntil: z.string().nullable(),
  /** First civil day for picking, likewise. */
  pickFrom: z.string().nullable(),
})

/** Figures of the sheet; litres, kilograms and square metres as numbers, amounts as decimal strings with a unit. */
export const computedSchema = z.object({
  areaM2: z.number(),
  /** Everything counted on the lines. */
  counts: countsSchema,
  totalL: z.number().nullable(),
  /** All components by mass, kilograms; null where there are none or one is not known. */
  totalKg: z.number().nullable(),
  waterL: z.number().nullable(),
  sprayLPerHa: z.number().nullable(),
  kgPerHa: z.number().nullable(),
  /** The finished mix for each of what it is sized by. */
  sprayPerEach: z.object({ each: eachSchema, litres: z.number() }).nullable(),
  loads: z.object({
    full: z.number().int(), tankL: z.number(), lastL: z.number(), lastAreaHa: z.number(),
    /** Minutes of spraying, where the sprayer's flow is known. */
    fullMinutes: z.number().nullable(), lastMinutes: z.number().nullable(),
  }).nullable(),
  components: z.array(z.object({ amount: amount.nullable() })),
  lines: z.array(share),
  air: z.object({
    wetBulbC: z.number(), deltaTC: z.number(), dewPointC: z.number(), vpdKPa: z.number(),
    /** How the wet bulb was found: a sharp limit can flip with it. */
    method: z.enum(['stull', 'psychrometer']),
  }).nullable(),
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
  /** What the signer was asked for: a password, or the PIN on a shared phone. */
  signedWith: z.enum(['password', 'pin']).nullable(),
  deviceAt: z.string().nullable(),
  receivedAt: z.string(),
  /** How far the device's clock ran ahead of the server's when the record was first sent, minutes; null where it told none. */
  clockSkewMinutes: z.number().int().nullable(),
  /** Why the version that stands now was made: an amendment's reason, or a withdrawal's; null for the first. */
  reason: z.string().nullable(),
  reviews: z.array(z.object({ version: z.number().int(), by: personRef.nullable(), at: z.string(), note: z.string().nullable() })),
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
  /** What went on the land, where it was measured; else what was mixed. */
  totalL: z.string().nullable(),
  totalKg: z.string().nullable(),
  sprayLPerHa: z.string().nullable(),
  kgPerHa: z.string().nullable(),
  /** Of a mix that was counted out: what went on each. */
  sprayPerEach: z.object({ each: eachSchema, litres: z.string() }).nullable(),
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
  /** The version that stands now, and whether the record was taken back. */
  latestVersion: z.number().int().nullable(),
  withdrawn: z.boolean().nullable(),
  /** Where the code is that of a season report: up to which entry, when one was first made, and whether the log went on since. */
  season: z.object({
    season: z.number().int(), seq: z.number().int(), takenAt: z.string(),
    /** False where an entry up to that one was changed, taken out or slipped in since. */
    agrees: z.boolean(),
    wentOn: z.boolean(),
  }).nullable(),
})
export type CheckCodeAnswer = z.infer<typeof checkCodeAnswerSchema>
