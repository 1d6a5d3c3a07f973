import { IsNull } from 'typeorm'
import { Account } from '../entities/Account.ts'
import { verifyPassword } from './passwords.ts'
import type { Services } from './services.ts'

/** The account of an e-mail and its password, or null; the same work is done for unknown e-mails. */
export async function signIn(services: Services, { email, password }: { email: string; password: string }): Promise<Account | null> {
  const account = await services.database.inHouse((manager) =>
    manager.findOneBy(Account, { email: email.trim().toLowerCase(), deactivatedAt: IsNull() }),
  )
  const matches = await verifyPassword(account?.passwordHash ?? null, password)
  return account && matches ? account : null
}

/** Whether the password is that of a signed-in account; asked again when something is signed. */
export async function isPasswordOf(services: Services, accountId: string, password: string): Promise<boolean> {
  const account = await services.database.inHouse((manager) =>
    manager.findOneBy(Account, { id: accountId, deactivatedAt: IsNull() }),
  )
  return verifyPassword(account?.passwordHash ?? null, password)
}
