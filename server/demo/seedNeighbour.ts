import { v7 as uuidV7 } from 'uuid'
import { civilDateIn } from '../../shared/time/civilDate.ts'
import { createBlock } from '../services/blocks/createBlock.ts'
import { createFarm } from '../services/farms/createFarm.ts'
import { createMaterial } from '../services/inputs/createMaterial.ts'
import { receiveLot } from '../services/inputs/receiveLot.ts'
import { createRecord } from '../services/records/createRecord.ts'
import { sealRecord } from '../services/records/sealRecord.ts'
import type { Services } from '../services/services.ts'
import { DEMO_ZONE } from './demoZone.ts'
import { seedNeighbourGround } from './seedGround.ts'
import { seedNeighbourPaper } from './seedFiles.ts'
import { buildBlock, buildLot, buildMaterial, buildRecord, squareAt } from './buildThings.ts'

/** A second farm that nobody of the first may see: a block, a material, a lot and a signed record with a paper. @returns its id. */
export async function seedNeighbour(services: Services, accountId: string): Promise<string> {
  const { farm } = await createFarm(services, accountId, { id: uuidV7(), name: 'Skerrow Bottom', zone: DEMO_ZONE, seasonStart: '03-01' })
  const actor = (await services.database.listAccess(accountId, services.clock.now())).find(({ farmId }) => farmId === farm.id)
  if (!actor) throw new Error('The neighbour has no way into the neighbour farm')
  const { block } = await createBlock(services, actor, buildBlock({ code: 'K1', name: 'Kiln Field', geometry: squareAt(8) }))
  await seedNeighbourGround(services, actor)
  const { material } = await createMaterial(services, actor, buildMaterial({ name: 'Whey' , kind: 'other' }))
  const endedAt = services.clock.now()
  const startedAt = new Date(endedAt.getTime() - 3_600_000)
  const { lot } = await receiveLot(services, actor, buildLot({ materialId: material.id, code: 'W-1', receivedOn: civilDateIn(DEMO_ZONE, startedAt.toISOString()) }))
  const { record } = await createRecord(services, actor, buildRecord({
    blockId: block.id, materialId: material.id, lotId: lot.id, startedAt: startedAt.toISOString(), endedAt: endedAt.toISOString(), purpose: 'Soil life',
  }))
  await seedNeighbourPaper(services, actor, record.id)
  await services.database.inFarm(actor, (manager) => sealRecord(services, manager, actor, record.id, { acknowledged: [] }))
  return farm.id
}
