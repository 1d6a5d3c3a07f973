import type { EntityManager } from 'typeorm'
import type { Account } from '../../entities/Account.ts'
import type { Services } from '../services.ts'
import { queueLetter } from './queueLetter.ts'

/** Tells an account's e-mail, inside `inHouse`, that its password is another one now; who has a PIN has no e-mail. */
export async function tellOfPassword(services: Pick<Services, 'clock' | 'config'>, manager: EntityManager, { email, name, language }: Account): Promise<void> {
  if (email === null) return
  const at = services.clock.now().toISOString()
  await queueLetter(services, manager, {
    farmId: null, kind: 'passwordChanged', language, to: { email, name }, params: { email, dayOn: at.slice(0, 10), time: at.slice(11, 16) },
  })
}
