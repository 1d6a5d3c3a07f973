import type { EntityManager } from 'typeorm'
import type { Certificate } from '../../../shared/contract/farmProfile.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Farm } from '../../entities/Farm.ts'

/** The farm's certificate as it is written down now; null where none is. */
export async function readCertificate(manager: EntityManager, { farmId }: Pick<FarmActor, 'farmId'>): Promise<Certificate | null> {
  const { certificate } = await manager.findOneOrFail(Farm, { select: { id: true, certificate: true }, where: { id: farmId } })
  return certificate
}
