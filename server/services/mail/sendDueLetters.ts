import { MailFault } from '../../adapters/mail/mailer.ts'
import { Letter, type LetterFault } from '../../entities/Letter.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'
import { isLetterName, LETTER_KINDS } from './letters/letterKinds.ts'
import { writeLetter } from './writeLetter.ts'

const AT_ONCE = 10
/** Longer than ten letters take when the mail server is as slow as it may be. */
const CLAIM_MS = 10 * 60_000
const FIRST_WAIT_MS = 60_000
const LONGEST_WAIT_MS = 60 * 60_000
const GIVE_UP_MS = 24 * 60 * 60_000

type Parts = Pick<Services, 'clock' | 'config' | 'database' | 'logger' | 'mailer'>

/**
 * Sends what is due of all farms and of the house. Each letter is claimed first, sent, and marked afterwards: a process that dies between
 * leaves it to be sent again, at least once in all. Safe to run twice, and in two processes.
 * @returns how many went out, and how many tries failed.
 */
export async function sendDueLetters(services: Parts): Promise<{ sent: number; failed: number }> {
  const counts = { sent: 0, failed: 0 }
  for (;;) {
    const letters = await claim(services)
    if (letters.length === 0) return counts
    await Promise.all(letters.map(async (letter) => {
      const fault = await send(services, letter)
      counts[fault === null ? 'sent' : 'failed'] += 1
      await settle(services, letter, fault)
    }))
  }
}

/** Takes the longest waiting into hand; what another process has in hand is passed over. */
async function claim({ clock, database }: Parts): Promise<Letter[]> {
  const now = clock.now()
  return database.inPost(async (manager) => {
    const letters = await manager.createQueryBuilder(Letter, 'letter')
      .where("letter.state = 'waiting' AND letter.nextTryAt <= :now AND (letter.claimedUntil IS NULL OR letter.claimedUntil <= :now)", { now })
      .orderBy('letter.nextTryAt').limit(AT_ONCE).setLock('pessimistic_write').setOnLocked('skip_locked').getMany()
    for (const letter of letters) {
      letter.tries += 1
      await manager.update(Letter, { farmId: letter.farmId, id: letter.id }, { tries: letter.tries, claimedUntil: new Date(now.getTime() + CLAIM_MS) })
    }
    return letters
  })
}

async function send(services: Parts, letter: Letter): Promise<LetterFault | null> {
  try {
    await services.mailer.send(writeLetter(services, letter))
    return null
  } catch (error) {
    services.logger.warn({ err: error, letterId: letter.id, kind: letter.kind, tries: letter.tries }, 'letter not sent')
    if (error instanceof MailFault) return { reason: error.reason, answer: error.answer }
    return { reason: error instanceof RangeError ? 'unreadable' : 'other', answer: null }
  }
}

async function settle({ clock, database, logger }: Parts, letter: Letter, fault: LetterFault | null): Promise<void> {
  const now = clock.now()
  const isDead = fault !== null && now.getTime() - letter.createdAt.getTime() >= GIVE_UP_MS
  const wait = Math.min(FIRST_WAIT_MS * 2 ** (letter.tries - 1), LONGEST_WAIT_MS)
  const changes: Partial<Letter> = fault === null
    ? { state: 'sent', sentAt: now, lastFault: null, params: withoutSecrets(letter) }
    : isDead
      ? { state: 'dead', lastFault: fault, params: withoutSecrets(letter) }
      : { lastFault: fault, nextTryAt: new Date(now.getTime() + wait) }
  if (isDead) logger.error({ letterId: letter.id, kind: letter.kind, fault }, 'letter given up after a day of tries')
  await database.inPost((manager) => updateRow(manager, Letter, { farmId: letter.farmId, id: letter.id }, { ...changes, claimedUntil: null }))
}

function withoutSecrets({ kind, params }: Letter): object {
  const secrets: readonly string[] = isLetterName(kind) ? LETTER_KINDS[kind].secrets : []
  return { ...params, ...Object.fromEntries(secrets.map((name) => [name, ''])) }
}
