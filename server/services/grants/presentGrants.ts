import { In, type EntityManager } from 'typeorm'
import type { Grant as GrantAnswer } from '../../../shared/contract/grant.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Account } from '../../entities/Account.ts'
import type { Grant } from '../../entities/Grant.ts'
import { Person } from '../../entities/Person.ts'
import { farmToday } from '../blocks/drawingDay.ts'
import type { Services } from '../services.ts'

interface Taken { account_id: string; at: Date; season: number; seq: number }

/** Grants as the owner sees them, with what each certifier took away last. */
export async function presentGrants(services: Pick<Services, 'clock'>, manager: EntityManager, actor: FarmActor, grants: readonly Grant[]): Promise<GrantAnswer[]> {
  const accountIds = grants.map(({ accountId }) => accountId)
  const accounts = await manager.find(Account, { select: { id: true, email: true }, where: { id: In(accountIds) } })
  const givers = await manager.find(Person, { select: { id: true, name: true }, where: { farmId: actor.farmId, id: In(grants.flatMap(({ givenById }) => givenById ?? [])) } })
  const taken: Taken[] = await manager.query(
    `SELECT DISTINCT ON (account_id) account_id, taken_at AS at, season, seq FROM season_heads
      WHERE farm_id = $1 AND account_id = ANY ($2) ORDER BY account_id, taken_at DESC`,
    [actor.farmId, accountIds],
  )
  const today = farmToday(services, actor)
  return grants.map((grant) => {
    const last = taken.find(({ account_id: id }) => id === grant.accountId)
    return {
      id: grant.id,
      email: accounts.find(({ id }) => id === grant.accountId)?.email ?? '',
      organisation: grant.organisation,
      seasons: grant.seasons,
      endsOn: grant.endsOn,
      endedAt: grant.endedAt?.toISOString() ?? null,
      stands: grant.endedAt === null && today <= grant.endsOn,
      givenBy: givers.find(({ id }) => id === grant.givenById)?.name ?? null,
      createdAt: grant.createdAt.toISOString(),
      lastTaken: last === undefined ? null : { at: last.at.toISOString(), season: last.season, seq: last.seq },
      revision: grant.revision,
    }
  })
}

/** One grant likewise. */
export async function presentGrant(services: Pick<Services, 'clock'>, manager: EntityManager, actor: FarmActor, grant: Grant): Promise<GrantAnswer> {
  const [presented] = await presentGrants(services, manager, actor, [grant])
  if (presented === undefined) throw new Error('One grant gives one answer')
  return presented
}
