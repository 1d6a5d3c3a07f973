import type { Block } from '../../../shared/contract/block.ts'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import type { RecordStock } from './useRecordStock.ts'

/** A block as a record has it: as it was signed, or as the farm has it now. */
export type GroundBlock = Pick<Block, 'id' | 'code' | 'name' | 'geometry' | 'areaM2'>

/** What a record's page needs of the things it names. */
export interface RecordGround {
  blocks: readonly GroundBlock[]
  materials: readonly { id: string; name: string }[]
  lots: readonly { id: string; code: string }[]
  sprayer: { code: string; name: string } | null
  zone: string
}

/** A signed record rests on its own text: what was renamed or redrawn since does not change what it says. */
export function groundOfSigned({ blocks, materials, lots, sprayer, farm }: SignedRecord): RecordGround {
  return { blocks: blocks.map((block) => ({ ...block, areaM2: Number(block.areaM2) })), materials, lots, sprayer, zone: farm.zone }
}

/** A record that is not signed rests on the farm as it is now. */
export function groundOfStock({ blocks, materials, lots, sprayers, farm }: RecordStock, sprayerId: string | null): RecordGround {
  return { blocks, materials, lots, sprayer: sprayers.find(({ id }) => id === sprayerId) ?? null, zone: farm?.zone ?? 'UTC' }
}
