import type { z } from 'zod'
import type { Block, createBlockSchema } from '../../shared/contract/block.ts'
import type { createFarmSchema, createSprayerSchema, Farm, Sprayer } from '../../shared/contract/farm.ts'
import type { countLotSchema, createLotSchema, createMaterialSchema, Lot, Material } from '../../shared/contract/input.ts'
import type { ApplicationRecord } from '../../shared/contract/record.ts'
import type {
  amendRecordSchema, createRecordSchema, discardRecordSchema, reviewRecordSchema, SignManyAnswer, signManySchema, signRecordSchema, updateRecordSchema, withdrawRecordSchema,
} from '../../shared/contract/recordChanges.ts'
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
  'record.signMany': z.input<typeof signManySchema>
  'record.amend': z.input<typeof amendRecordSchema>
  'record.withdraw': z.input<typeof withdrawRecordSchema>
  'record.review': z.input<typeof reviewRecordSchema>
  'record.discard': z.input<typeof discardRecordSchema>
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
  'record.signMany': SignManyAnswer
  'record.amend': ApplicationRecord
  'record.withdraw': ApplicationRecord
  'record.review': ApplicationRecord
  'record.discard': undefined
}

export type CommandKind = keyof CommandBodies

/** Something to be written: `id` names the thing it is about (the lot of a count, the record of a signature, the farm of several). */
export type Command<Kind extends CommandKind = CommandKind> = {
  [K in Kind]: { kind: K; farmId: string; id: string; body: CommandBodies[K] }
}[Kind]
