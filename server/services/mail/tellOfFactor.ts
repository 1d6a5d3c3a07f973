import type { EntityManager } from 'typeorm'
import { Account } from '../../entities/Account.ts'
import type { Services } from '../services.ts'
import type { FactorNews } from './letters/factorChanged.ts'
import { queueLetter } from './queueLetter.ts'

/** Tells an account's e-mail that its second factor changed. @param farmId the farm that the transaction is on; null inside `inHouse`. */
export async function tellOfFactor(
  services: Pick<Services, 'clock' | 'config'>, manager: EntityManager, { accountId, news, farmId = null }: { accountId: string; news: FactorNews; farmId?: string | null },
): Promise<void> {
  const { email, name, language } = await manager.findOneByOrFail(Account, { id: accountId })
  if (email === null) return
  const at = services.clock.now().toISOString()
  await queueLetter(services, manager, {
    farmId, kind: 'factorChanged', language, to: { email, name }, params: { news, email, dayOn: at.slice(0, 10), time: at.slice(11, 16) },
  })
}
