import { z } from 'zod'
import { jobIdOf, readJobId } from '../rounds/jobKey.ts'
import { toDayNumber } from '../time/dayNumber.ts'
import { acknowledgedSchema, civilDateSchema, idSchema, pageQuerySchema } from './common.ts'
import { methodSchema } from './recordContent.ts'
import { noteText } from './text.ts'

/** Days that may be asked about at once. */
export const MOST_WINDOW_DAYS = 366

/** A job by its name: step, block and number, with points between. */
export const jobIdSchema = z.string().max(90)
  .refine((text) => readJobId(text) !== null, { error: 'id.format', abort: true })
  .transform((text) => { const key = readJobId(text); return key === null ? text : jobIdOf(key) })
  .meta({ type: 'string' })

export const jobParamsSchema = z.strictObject({ farmId: idSchema, id: jobIdSchema })

export const JOB_STATES = ['planned', 'due', 'late', 'done', 'skipped'] as const

/** Which state of a job a writer saw; 0 where nobody had decided anything about it. */
const jobRevisionSchema = z.number().int().min(0).max(2_147_483_647)

/** Moves a job to another day; null puts it back on its target. */
export const moveJobSchema = z.strictObject({
  revision: jobRevisionSchema, to: civilDateSchema.nullable(), acknowledged: acknowledgedSchema.default([]),
})
export type MoveJob = z.output<typeof moveJobSchema>

export const skipJobSchema = z.strictObject({ revision: jobRevisionSchema, reason: noteText(500) })
export type SkipJob = z.output<typeof skipJobSchema>

/** Takes a skip back. */
export const unskipJobSchema = z.strictObject({ revision: jobRevisionSchema })
export type UnskipJob = z.output<typeof unskipJobSchema>

const inOrder = ({ from, to }: { from?: string | undefined; to?: string | undefined }): boolean => from === undefined || to === undefined || from <= to
const ORDER = { error: 'date.to_before_from', path: ['to'] }
const isShort = ({ from, to }: { from?: string | undefined; to?: string | undefined }): boolean =>
  from === undefined || to === undefined || toDayNumber(to) - toDayNumber(from) < MOST_WINDOW_DAYS
const LENGTH = { error: 'date.window_too_long', path: ['to'] }

/** Query of the jobs: those whose day lies in the window, or those that wait, due and late. */
export const jobQuerySchema = pageQuerySchema
  .extend({
    from: civilDateSchema.optional(), to: civilDateSchema.optional(), blockId: idSchema.optional(), planId: idSchema.optional(),
    state: z.enum([...JOB_STATES, 'waiting']).optional(),
  })
  .refine(inOrder, ORDER).refine(isShort, LENGTH)
export type JobQuery = z.output<typeof jobQuerySchema>

export const sheetQuerySchema = z.strictObject({ from: civilDateSchema, to: civilDateSchema }).refine(inOrder, ORDER).refine(isShort, LENGTH)
export type SheetQuery = z.output<typeof sheetQuerySchema>

export const jobSchema = z.object({
  id: z.string(),
  planId: z.string(),
  stepId: z.string(),
  blockId: z.string(),
  number: z.number().int(),
  method: methodSchema,
  materialId: z.string(),
  /** Name of the material. */
  preparation: z.string(),
  blockCode: z.string(),
  /** The civil day it falls due, and the first and last day it may slip to. */
  targetOn: z.string(),
  earliestOn: z.string(),
  latestOn: z.string(),
  /** The day it is to be done: moved to, or the target. */
  plannedOn: z.string(),
  isMoved: z.boolean(),
  state: z.enum(JOB_STATES),
  done: z.object({ recordId: z.string(), number: z.string(), on: z.string() }).nullable(),
  skip: z.object({ reason: z.string(), by: z.object({ id: z.string(), name: z.string() }), at: z.string() }).nullable(),
  /** An unsigned record that was opened from it. */
  openRecordId: z.string().nullable(),
  revision: z.number().int(),
})
export type Job = z.infer<typeof jobSchema>

/** Everything that the season sheet draws between two days. */
export const seasonSheetSchema = z.object({
  today: z.string(),
  from: z.string(),
  to: z.string(),
  /** Whose window, planned day or day done meets the days asked about. */
  jobs: z.array(jobSchema),
  /** Signed work, of a plan or of none. */
  works: z.array(z.object({
    recordId: z.string(), number: z.string(), blockId: z.string(), on: z.string(), method: methodSchema, preparations: z.array(z.string()),
    /** Nobody goes in before that instant, and first civil day for picking; null where no label says so. */
    reEntryUntil: z.string().nullable(), pickFrom: z.string().nullable(),
  })),
  harvests: z.array(z.object({ blockId: z.string(), from: z.string(), to: z.string() })),
})
export type SeasonSheet = z.infer<typeof seasonSheetSchema>
