import type { z } from 'zod'
import type { Block, createBlockSchema } from '../../shared/contract/block.ts'
import type { createFarmSchema, createSprayerSchema, Farm, Sprayer } from '../../shared/contract/farm.ts'
import type { countLotSchema, createLotSchema, createMaterialSchema, Lot, Material } from '../../shared/contract/input.ts'
import type { ApplicationRecord } from '../../shared/contract/record.ts'
import type { createRecordSchema, signRecordSchema, updateRecordSchema } from '../../shared/contract/recordChanges.ts'
import type { createSavedFilterSchema, SavedFilter } from '../../shared/contract/savedFilter.ts'

/** What each kind of command carries. */
export interface CommandBodies {
  'farm.create': z.input<typeof createFarmSchema>
  'block.create': z.input<typeof createBlockSchema>
  'material.create': z.input<typeof createMaterialSchema>
  'lot.create': z.input<typeof createLotSchema>
  'lot.count': z.input<typeof countLotSchema>
  'sprayer.create': z.input<typeof createSprayerSchema>
  'record.create': z.input<typeof createRecordSchema>
  'record.update': z.input<typeof updateRecordSchema>
  'record.sign': z.input<typeof signRecordSchema>
  'filter.keep': z.input<typeof createSavedFilterSchema>
  'filter.forget': Record<string, never>
}

/** What the server answers to each. */
export interface CommandAnswers {
  'farm.create': Farm
  'block.create': Block
  'material.create': Material
  'lot.create': Lot
  'lot.count': Lot
  'sprayer.create': Sprayer
  'record.create': ApplicationRecord
  'record.update': ApplicationRecord
  'record.sign': ApplicationRecord
  'filter.keep': SavedFilter
  'filter.forget': undefined
}

export type CommandKind = keyof CommandBodies

/** Something to be written: `id` names the thing it is about (the lot of a count, the record of a signature). */
export type Command<Kind extends CommandKind = CommandKind> = {
  [K in Kind]: { kind: K; farmId: string; id: string; body: CommandBodies[K] }
}[Kind]
