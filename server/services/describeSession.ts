import { IsNull } from 'typeorm'
import type { Session } from '../../shared/contract/session.ts'
import { Account } from '../entities/Account.ts'
import { AppError } from '../errors.ts'
import type { Services } from './services.ts'

/** Who is signed in and which farms are open to them now. @throws {AppError} unauthenticated if the account is gone. */
export async function describeSession(services: Services, accountId: string): Promise<Session> {
  const account = await services.database.inHouse((manager) =>
    manager.findOneBy(Account, { id: accountId, deactivatedAt: IsNull() }),
  )
  if (!account) throw new AppError('unauthenticated', 'unauthenticated')
  const access = await services.database.listAccess(accountId, services.clock.now())
  return {
    user: { id: account.id, email: account.email, name: account.name, language: account.language },
    memberships: access.map(({ farmId, farmName, role, personId, seasons }) => ({ farmId, farmName, role, personId, seasons })),
  }
}
