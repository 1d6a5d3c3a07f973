import { z } from 'zod'
import { idSchema } from './common.ts'
import { REGISTER_SORTS, registerFilterSchema } from './register.ts'
import { lineText } from './text.ts'

/** A filter and order of the register as an account keeps it. */
export const savedQuerySchema = registerFilterSchema.extend({ sort: z.enum(REGISTER_SORTS).optional() })
export type SavedQuery = z.infer<typeof savedQuerySchema>

export const createSavedFilterSchema = z.strictObject({ id: idSchema, name: lineText(60), query: savedQuerySchema })
export type CreateSavedFilter = z.infer<typeof createSavedFilterSchema>

export const savedFilterSchema = z.object({ id: z.string(), name: z.string(), query: savedQuerySchema, createdAt: z.string() })
export type SavedFilter = z.infer<typeof savedFilterSchema>
