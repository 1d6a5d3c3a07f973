import { v7 as uuidV7 } from 'uuid'
import type { EntityManager } from 'typeorm'
import type { QueryDeepPartialEntity } from 'typeorm/query-builder/QueryPartialEntity.js'
import type { Language } from '../../../shared/messages/translate.ts'
import { mailboxOf } from '../../adapters/mail/mailbox.ts'
import { Letter } from '../../entities/Letter.ts'
import { digestOf } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { HOUSE } from './house.ts'
import { LETTER_KINDS, type LetterContent } from './letters/letterKinds.ts'

/** A letter to one person. */
export type NewLetter = LetterContent & {
  /** The farm that the transaction is on; null inside `inHouse`. */
  farmId: string | null
  to: { email: string; name: string | null }
  language: Language
  /** Whom an answer reaches, where a person stands behind the letter. */
  replyTo?: { email: string; name: string | null }
  /** What it tells of, where that is to be told only once: a second letter with the same mark is not queued. */
  once?: string
}

/**
 * Puts a letter into the outbox, in the transaction of what it tells of: both stand or neither. It goes out once that commits.
 * @throws {RangeError} for an address or name that is not one mailbox; {ZodError} for params that are not the kind's.
 */
export async function queueLetter(services: Pick<Services, 'clock' | 'config'>, manager: EntityManager, letter: NewLetter): Promise<void> {
  const to = mailboxOf(letter.to.email, letter.to.name)
  const reply = letter.replyTo ? mailboxOf(letter.replyTo.email, letter.replyTo.name) : null
  const id = uuidV7()
  const now = services.clock.now()
  const row: Letter = {
    farmId: letter.farmId ?? HOUSE, id, kind: letter.kind, params: LETTER_KINDS[letter.kind].params.parse(letter.params), language: letter.language,
    toEmail: to.address, toName: to.name || null, replyEmail: reply?.address ?? null, replyName: reply?.name || null,
    messageId: messageIdOf(services, id), state: 'waiting', tries: 0, createdAt: now, nextTryAt: now, claimedUntil: null, sentAt: null, lastFault: null,
    once: letter.once ?? null, creationDigest: digestOf({ id }),
  }
  await manager.createQueryBuilder().insert().into(Letter).values(row as QueryDeepPartialEntity<Letter>).orIgnore().execute()
}

/** The name that all tries of a letter bear (RFC 5322, 3.6.4). */
export function messageIdOf({ config }: Pick<Services, 'config'>, id: string): string {
  return `<${id}@${config.mail.from.address.split('@')[1] ?? 'drenchleaf.invalid'}>`
}
