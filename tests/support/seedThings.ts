import { buildBlock, buildLot, buildMaterial } from '../../server/demo/buildThings.ts'
import { createBlock } from '../../server/services/blocks/createBlock.ts'
import { createMaterial } from '../../server/services/inputs/createMaterial.ts'
import { receiveLot } from '../../server/services/inputs/receiveLot.ts'
import type { CreateLot, CreateMaterial } from '../../shared/contract/input.ts'
import type { TestFarm, TestHouse } from './openHouse.ts'

export interface SeededThings {
  blockId: string
  materialId: string
  lotId: string
}

/** A block, a material and a lot of 100 L, ready for a record. */
export async function seedThings(
  { services }: TestHouse,
  farm: TestFarm,
  { material, lot }: { material?: Partial<CreateMaterial>; lot?: Partial<CreateLot> } = {},
): Promise<SeededThings> {
  const actor = await farm.actor('owner')
  const made = await createBlock(services, actor, buildBlock())
  const taken = await createMaterial(services, actor, buildMaterial(material))
  const received = await receiveLot(services, actor, buildLot({ materialId: taken.material.id, ...lot }))
  return { blockId: made.block.id, materialId: taken.material.id, lotId: received.lot.id }
}
