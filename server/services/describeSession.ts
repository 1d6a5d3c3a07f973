import { IsNull } from 'typeorm'
import type { Session } from '../../shared/contract/session.ts'
import { Account } from '../entities/Account.ts'
import { AppError } from '../errors.ts'
import { listEndedGrants } from './grants/listEndedGrants.ts'
import type { Services } from './services.ts'

/** Who is signed in and which farms are open to them now. @throws {AppError} unauthenticated if the account is gone. */
export async function describeSession(services: Services, accountId: string): Promise<Session> {
  const account = await services.database.inHouse((manager) =>
    manager.findOneBy(Account, { id: accountId, deactivatedAt: IsNull() }),
  )
  if (!account) throw new AppError('unauthenticated', 'unauthenticated')
  const access = await services.database.listAccess(accountId, services.clock.now())
  return {
    user: describeUser(account),
    memberships: access.map(({ farmId, farmName, role, personId, seasons, asksFactor }) => ({
      farmId, farmName, role, personId, seasons, factorNeeded: asksFactor && account.totpSecret === null,
    })),
    hadGrants: access.length === 0 && (await listEndedGrants(services, accountId)).length > 0,
  }
}

/** An account as its own person sees it. */
export function describeUser(account: Account): Session['user'] {
  const { id, email, name, language, kind, preferences, revision, totpSecret } = account
  return { id, email, name, language, signsWith: kind === 'pin' ? 'pin' : 'password', hasFactor: totpSecret !== null, preferences, revision }
}
