import { z } from 'zod'
import { blockSchema, createBlockSchema } from './block.ts'
import { IMPORT_LIMITS } from '../importing/importTypes.ts'

/** Blocks that come in together, all or none; each as it would be drawn. */
export const importBlocksSchema = z.strictObject({ blocks: z.array(createBlockSchema).min(1).max(IMPORT_LIMITS.blocks) })
export type ImportBlocks = z.infer<typeof importBlocksSchema>

export const blocksImportedSchema = z.object({ items: z.array(blockSchema) })
export type BlocksImported = z.infer<typeof blocksImportedSchema>
