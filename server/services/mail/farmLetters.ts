import type { EntityManager } from 'typeorm'
import { z } from 'zod'
import type { Page } from '../../../shared/contract/common.ts'
import type { Letter as LetterAnswer } from '../../../shared/contract/letter.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Letter } from '../../entities/Letter.ts'
import { AppError, notFound } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { cutPage, decodeCursor } from '../cursor.ts'
import { digestOf, insertOnce } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { isLetterName, LETTER_KINDS } from './letters/letterKinds.ts'
import { messageIdOf } from './queueLetter.ts'

/** A page of the farm's letters, newest first. */
export function listLetters(services: Services, actor: FarmActor, page: Page): Promise<{ items: LetterAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, async (manager) => {
    const after = decodeCursor(page.cursor, z.iso.datetime())
    const query = manager.getRepository(Letter).createQueryBuilder('letter').where('letter.farmId = :farmId', { farmId: actor.farmId })
    if (after) query.andWhere('(letter.createdAt, letter.id) < (:at, :id)', { at: after.key, id: after.id })
    const rows = await query.orderBy('letter.createdAt', 'DESC').addOrderBy('letter.id', 'DESC').limit(page.limit + 1).getMany()
    return cutPage(rows, page.limit, present, (row) => [row.createdAt.toISOString(), row.id])
  })
}

/**
 * Writes a letter anew, word for word, under a new id. @returns it, and whether this call made it.
 * @throws {AppError} not-found, `letter.secret` for one with a one-time link, `letter.waiting` for one on its way.
 */
export function resendLetter(services: Services, actor: FarmActor, id: string, newId: string): Promise<{ made: boolean; letter: LetterAnswer }> {
  return services.database.inFarm(actor, async (manager) => {
    const old = await findLetter(manager, actor, id)
    const now = services.clock.now()
    const row: Letter = {
      ...old, id: newId, messageId: messageIdOf(services, newId), state: 'waiting', tries: 0, createdAt: now, nextTryAt: now, claimedUntil: null,
      sentAt: null, lastFault: null, once: null, creationDigest: digestOf({ resent: id, as: newId }),
    }
    if (hasSecrets(old)) throw new AppError('conflict', 'letter.secret')
    if (old.state === 'waiting') throw new AppError('conflict', 'letter.waiting')
    const { made, stored } = await insertOnce(manager, Letter, row, { path: 'id', code: 'idempotency.mismatch' })
    if (made) await appendJournal(services, manager, actor, { action: 'letter.resent', subjectId: newId, detail: { kind: old.kind } })
    return { made, letter: present(stored) }
  })
}

async function findLetter(manager: EntityManager, { farmId }: FarmActor, id: string): Promise<Letter> {
  const found = await manager.findOneBy(Letter, { farmId, id })
  if (!found) throw notFound()
  return found
}

const hasSecrets = ({ kind }: Letter): boolean => isLetterName(kind) && LETTER_KINDS[kind].secrets.length > 0

function present(letter: Letter): LetterAnswer {
  const { id, kind, toEmail, toName, state, tries, createdAt, sentAt, nextTryAt, lastFault } = letter
  return {
    id, kind, to: toEmail, toName, tries, createdAt: createdAt.toISOString(), sentAt: sentAt?.toISOString() ?? null,
    state: state === 'waiting' && lastFault !== null ? 'failing' : state,
    nextTryAt: state === 'waiting' ? nextTryAt.toISOString() : null,
    fault: lastFault && { id: `letters.fault.${lastFault.reason}`, params: { answer: lastFault.answer ?? 0 } },
    canResend: state !== 'waiting' && !hasSecrets(letter),
  }
}
