import { z } from 'zod'
import { boundarySchema } from './block.ts'
import { acknowledgedSchema } from './common.ts'
import { labelLimitsSchema, LOT_ORIGINS, MATERIAL_KINDS, ORGANIC_STATUSES } from './input.ts'
import { eachSchema } from './each.ts'
import { amountUnit } from './quantity.ts'
import { checkSchema } from './record.ts'
import { countsSchema, recordContentSchema } from './recordContent.ts'

/** A person stands in signed text by id and salted digest; the name lives in a table that can be blanked. */
const signedPerson = z.object({ id: z.string(), digest: z.string() })

const decimal = z.string()

export const ENTRIES = ['signed', 'amended', 'withdrawn'] as const

/**
 * What is signed: one version of a record with everything it rests on, as it stood then.
 * Its RFC 8785 text is stored and hashed; decimals are strings. A new field means a new `schemaVersion`; what an older one
 * lacks is filled in by `upgradeSigned` when it is read.
 */
export const signedRecordSchema = z.object({
  schemaVersion: z.literal(2),
  /** What this entry does: signs a record, amends it, or takes it back. */
  entry: z.enum(ENTRIES),
  /** Digest of the version before; null for the first. */
  replaces: z.string().nullable(),
  farm: z.object({ id: z.string(), name: z.string(), zone: z.string(), seasonStart: z.string() }),
  record: z.object({
    id: z.string(),
    number: z.string(),
    season: z.number().int(),
    version: z.number().int(),
    seq: z.number().int(),
  }),
  content: recordContentSchema,
  blocks: z.array(
    z.object({
      id: z.string(),
      code: z.string(),
      name: z.string(),
      crop: z.string().nullable(),
      version: z.number().int(),
      geometry: boundarySchema,
      areaM2: decimal,
    }),
  ),
  materials: z.array(
    z.object({
      id: z.string(),
      name: z.string(),
      kind: z.enum(MATERIAL_KINDS),
      measuredIn: z.enum(['volume', 'mass']),
      organicStatus: z.enum(ORGANIC_STATUSES),
      statusBasis: z.string().nullable(),
      label: labelLimitsSchema.nullable(),
    }),
  ),
  lots: z.array(
    z.object({
      id: z.string(),
      code: z.string(),
      materialId: z.string(),
      origin: z.enum(LOT_ORIGINS),
      source: z.string().nullable(),
      expiresOn: z.string().nullable(),
    }),
  ),
  sprayer: z.object({ id: z.string(), code: z.string(), name: z.string(), tankL: decimal, flowLPerMin: decimal.nullable() }).nullable(),
  computed: z.object({
    areaM2: decimal,
    counts: countsSchema,
    totalL: decimal.nullable(),
    totalKg: decimal.nullable(),
    waterL: decimal.nullable(),
    sprayLPerHa: decimal.nullable(),
    kgPerHa: decimal.nullable(),
    sprayPerEach: z.object({ each: eachSchema, litres: decimal }).nullable(),
    loads: z
      .object({ full: z.number().int(), tankL: decimal, lastL: decimal, lastAreaHa: decimal, fullMinutes: decimal.nullable(), lastMinutes: decimal.nullable() })
      .nullable(),
    components: z.array(z.object({ amount: z.object({ value: decimal, unit: amountUnit }) })),
    lines: z.array(z.object({
      areaM2: decimal, shareL: decimal.nullable(), shareKg: decimal.nullable(), reEntryUntil: z.string().nullable(), pickFrom: z.string().nullable(),
    })),
    air: z.object({ wetBulbC: decimal, deltaTC: decimal, dewPointC: decimal, vpdKPa: decimal, method: z.enum(['stull', 'psychrometer']) }).nullable(),
  }),
  /** Photos and papers that were with the record at this signature. */
  files: z.array(z.object({ id: z.string(), label: z.string(), type: z.string(), bytes: z.number().int(), digest: z.string() })),
  checks: z.array(checkSchema),
  acknowledged: acknowledgedSchema,
  people: z.object({ doneBy: signedPerson, enteredBy: signedPerson, signedBy: signedPerson }),
  times: z.object({
    startedAt: z.string(),
    endedAt: z.string(),
    deviceAt: z.string().nullable(),
    receivedAt: z.string(),
    signedAt: z.string(),
  }),
  /** Why this version was made; null for the first. */
  reason: z.string().nullable(),
})
export type SignedRecord = z.infer<typeof signedRecordSchema>
