import { z } from 'zod'

/** What a rate can be counted by, beside area: single plants and trees, metres of row, whole beds and pots. */
export const EACH = ['plant', 'tree', 'rowM', 'bed', 'pot'] as const
export const eachSchema = z.enum(EACH)
export type Each = z.infer<typeof eachSchema>
