import { RateLimiterMemory } from 'rate-limiter-flexible'
import { deviceWords } from '../../../shared/devices/deviceWords.ts'
import { Account } from '../../entities/Account.ts'
import type { SignInNews } from '../mail/letters/signIn.ts'
import { queueLetter } from '../mail/queueLetter.ts'
import type { Services } from '../services.ts'
import { truncateAddress } from '../truncateAddress.ts'

/** So many wrong passwords or codes before the right one are told of. */
const MANY = 5
const FAILURES_LAST_S = 24 * 60 * 60
/** One letter an hour about wrong codes: who has the password may try on, and fill a mailbox. */
const HOUR_SIGNS = 'YYYY-MM-DDTHH'.length

/** A sign-in as it is seen from outside. */
export interface SeenSignIn {
  /** As it was typed. */
  email: string
  /** Whether this device has signed the account in before. */
  isKnown: boolean
  agent: string | undefined
  address: string | undefined
}

/** Watches sign-ins, and tells an account's e-mail what its person should know of. */
interface SignInWatch {
  /** A password was wrong. Known and unknown e-mails are counted alike, and nothing is written. */
  refused(seen: SeenSignIn): Promise<void>
  /** The password was right and the code wrong. */
  codeRefused(accountId: string, seen: SeenSignIn): Promise<void>
  opened(accountId: string, seen: SeenSignIn): Promise<void>
}

type Parts = Pick<Services, 'clock' | 'config' | 'database'>

/** One watch for a server: failures are counted in the process, by e-mail from wherever they come, and a restart forgets them. */
export function watchSignIns(services: Parts): SignInWatch {
  const failures = new RateLimiterMemory({ points: MANY, duration: FAILURES_LAST_S })
  const keyOf = ({ email }: SeenSignIn): string => email.trim().toLowerCase()
  const count = async (seen: SeenSignIn): Promise<void> => { await failures.penalty(keyOf(seen)) }
  return {
    refused: count,
    codeRefused: async (accountId, seen) => {
      await count(seen)
      const hour = services.clock.now().toISOString().slice(0, HOUR_SIGNS)
      await tell(services, accountId, { news: 'codeWrong', tries: 1, seen, once: `code wrong ${accountId} ${hour}` })
    },
    opened: async (accountId, seen) => {
      const tries = (await failures.get(keyOf(seen)))?.consumedPoints ?? 0
      await failures.delete(keyOf(seen))
      if (tries >= MANY) await tell(services, accountId, { news: 'afterFailures', tries, seen })
      else if (!seen.isKnown) await tell(services, accountId, { news: 'newDevice', tries, seen })
    },
  }
}

async function tell(services: Parts, accountId: string, { news, tries, seen, once }: { news: SignInNews; tries: number; seen: SeenSignIn; once?: string }): Promise<void> {
  const at = services.clock.now().toISOString()
  await services.database.inHouse(async (manager) => {
    const { email, name, language } = await manager.findOneByOrFail(Account, { id: accountId })
    if (email === null) return
    await queueLetter(services, manager, {
      farmId: null, kind: 'signIn', language, to: { email, name }, ...(once !== undefined && { once }),
      params: { news, email, dayOn: at.slice(0, 10), time: at.slice(11, 16), tries, device: deviceWords(seen.agent), network: truncateAddress(seen.address) },
    })
  })
}
