import type { EntityManager } from 'typeorm'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import type { FarmActor } from '../../database/actor.ts'
import type { Account } from '../../entities/Account.ts'
import type { Grant } from '../../entities/Grant.ts'
import { queueLetter } from '../mail/queueLetter.ts'
import { issueLink } from '../oneTimeLinks.ts'
import type { Services } from '../services.ts'

/** A reviewer is not at the desk every day: two weeks. */
const MINUTES_TO_ACCEPT = 14 * 24 * 60

/** Tells a certifier by letter what is open to them, in the transaction of the grant; who cannot sign in yet gets a link to make a password. */
export async function tellOfGrant(services: Pick<Services, 'clock' | 'config'>, manager: EntityManager, actor: FarmActor, { account, email, grant }: { account: Account; email: string; grant: Grant }): Promise<void> {
  const { farmId, farmName, personName, zone } = actor
  const link = account.passwordHash === null ? await issueLink(services, manager, { accountId: account.id, kind: 'welcome', minutes: MINUTES_TO_ACCEPT, detail: { farmId, grantId: grant.id } }) : null
  await queueLetter(services, manager, {
    farmId, kind: 'grant', language: account.language,
    to: { email, name: account.passwordHash === null ? null : account.name },
    params: {
      farm: farmName, by: personName ?? '', organisation: grant.organisation, seasons: grant.seasons.join(', '), endsOn: grant.endsOn,
      token: link?.token ?? '', untilOn: link === null ? '' : civilDateIn(zone, link.expiresAt.toISOString()),
    },
  })
}
