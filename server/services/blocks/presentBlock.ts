import type { Block as BlockAnswer } from '../../../shared/contract/block.ts'
import type { Block } from '../../entities/Block.ts'

/** A block as the contract shows it. */
export function presentBlock(block: Block): BlockAnswer {
  return {
    id: block.id,
    code: block.code,
    name: block.name,
    crop: block.crop,
    geometry: block.geometry,
    areaM2: Number(block.areaM2),
    perimeterM: Number(block.perimeterM),
    version: block.version,
    revision: block.revision,
    createdAt: block.createdAt.toISOString(),
  }
}
