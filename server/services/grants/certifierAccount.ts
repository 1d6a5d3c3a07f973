import { v7 as uuidV7 } from 'uuid'
import type { EntityManager } from 'typeorm'
import type { Language } from '../../../shared/messages/translate.ts'
import { Account } from '../../entities/Account.ts'

/** The account of an e-mail; made without a password where there is none, so that an invitation can be taken up. */
export async function certifierAccount(manager: EntityManager, email: string, { language, createdAt }: { language: Language; createdAt: Date }): Promise<Account> {
  const made = { id: uuidV7(), email, name: email, passwordHash: null, language, createdAt, deactivatedAt: null }
  // Two owners may invite the same person at the same moment.
  await manager.createQueryBuilder().insert().into(Account).values(made).orIgnore().execute()
  return manager.findOneByOrFail(Account, { email })
}
