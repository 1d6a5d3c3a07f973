import { In, type EntityManager } from 'typeorm'
import type { SharedPhone as PhoneAnswer } from '../../../shared/contract/sharedPhone.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Person } from '../../entities/Person.ts'
import { SharedPhone } from '../../entities/SharedPhone.ts'
import type { Services } from '../services.ts'

/** The farm's shared phones, by name; those that were taken away stay in the list. */
export async function listPhones(services: Services, { farmId, ...actor }: FarmActor): Promise<PhoneAnswer[]> {
  return services.database.inFarm({ ...actor, farmId }, async (manager) =>
    presentPhones(manager, await manager.find(SharedPhone, { where: { farmId }, order: { name: 'ASC', id: 'ASC' } })))
}

export async function presentPhones(manager: EntityManager, phones: SharedPhone[]): Promise<PhoneAnswer[]> {
  const ids = [...new Set(phones.map(({ enrolledById }) => enrolledById))]
  const people = await manager.find(Person, { select: { id: true, name: true }, where: { id: In(ids) } })
  return phones.map((phone) => ({
    id: phone.id, name: phone.name, enrolledBy: people.find(({ id }) => id === phone.enrolledById)?.name ?? '',
    enrolledAt: phone.enrolledAt.toISOString(), lastUsedAt: phone.lastUsedAt?.toISOString() ?? null, revokedAt: phone.revokedAt?.toISOString() ?? null,
  }))
}
