import type { EntityManager } from 'typeorm'
import { v7 as uuidV7 } from 'uuid'
import { Account } from '../entities/Account.ts'
import type { Services } from './services.ts'

/** The account of an e-mail; made without a password where there is none, by the same statements. */
export async function accountOf(
  { clock }: Pick<Services, 'clock'>, manager: EntityManager, { email, name, language }: Pick<Account, 'name' | 'language'> & { email: string },
): Promise<Account> {
  const made = { id: uuidV7(), email, name, language, passwordHash: null, createdAt: clock.now(), deactivatedAt: null }
  await manager.createQueryBuilder().insert().into(Account).values(made).orIgnore().execute()
  return manager.findOneByOrFail(Account, { email })
}
