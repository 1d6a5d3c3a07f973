import { z } from 'zod'
import { toDayNumber } from '../time/dayNumber.ts'
import { civilDateSchema, idSchema, revisionSchema } from './common.ts'
import { basisSchema, methodSchema, waterSchema } from './recordContent.ts'
import { lineText, noteText } from './text.ts'

/** A plan runs for a year at most: a season. */
export const MOST_PLAN_DAYS = 366

/** What a step makes rounds of. */
export const STEP_KINDS = ['application'] as const

/** One preparation put on a set of blocks in a rhythm; each block's turn is a job. */
export const planStepSchema = z
  .strictObject({
    id: idSchema,
    kind: z.enum(STEP_KINDS).default('application'),
    method: methodSchema,
    materialId: idSchema,
    basis: basisSchema,
    /** How the mix is sized, as in a record; null where that is decided on the day. */
    water: waterSchema.nullable().default(null),
    blockIds: z.array(idSchema).min(1).max(500),
    /** Counted from the day it was done. */
    everyDays: z.number().int().min(1).max(MOST_PLAN_DAYS),
    firstOn: civilDateSchema,
    /** Last day on which a round may fall due. */
    lastOn: civilDateSchema,
    earlyDays: z.number().int().min(0).max(60).default(0),
    lateDays: z.number().int().min(0).max(60).default(0),
  })
  .superRefine(({ firstOn, lastOn, earlyDays, everyDays, water }, context) => {
    const fault = (path: string, message: string): void => { context.addIssue({ code: 'custom', path: [path], message }) }
    if (lastOn < firstOn) fault('lastOn', 'date.to_before_from')
    else if (toDayNumber(lastOn) - toDayNumber(firstOn) >= MOST_PLAN_DAYS) fault('lastOn', 'plan.too_long')
    if (earlyDays >= everyDays) fault('earlyDays', 'plan.early_days')
    if (water?.sizedFrom === 'jar') fault('water', 'plan.water_jar')
  })
export type PlanStep = z.output<typeof planStepSchema>

const content = {
  name: lineText(80),
  note: noteText(500).nullable().default(null),
  steps: z.array(planStepSchema).min(1).max(12).refine((steps) => new Set(steps.map(({ id }) => id)).size === steps.length, { error: 'plan.step_twice' }),
}

export const createPlanSchema = z.strictObject({ id: idSchema, ...content })
export type CreatePlan = z.output<typeof createPlanSchema>

/** A plan written anew: steps that are not sent make no more rounds. */
export const updatePlanSchema = z.strictObject({ revision: revisionSchema, ...content })
export type UpdatePlan = z.output<typeof updatePlanSchema>

export const endPlanSchema = z.strictObject({ revision: revisionSchema, reason: noteText(500) })
export type EndPlan = z.output<typeof endPlanSchema>

export const reopenPlanSchema = z.strictObject({ revision: revisionSchema })

export const seasonPlanSchema = z.object({
  id: z.string(),
  name: z.string(),
  note: z.string().nullable(),
  steps: z.array(z.object({
    id: z.string(),
    kind: z.enum(STEP_KINDS),
    method: methodSchema,
    materialId: z.string(),
    basis: basisSchema,
    water: waterSchema.nullable(),
    blockIds: z.array(z.string()),
    everyDays: z.number().int(),
    firstOn: z.string(),
    lastOn: z.string(),
    earlyDays: z.number().int(),
    lateDays: z.number().int(),
  })),
  /** When it was ended and why; null while it runs. */
  ended: z.object({ at: z.string(), reason: z.string() }).nullable(),
  revision: z.number().int(),
})
export type SeasonPlan = z.infer<typeof seasonPlanSchema>
