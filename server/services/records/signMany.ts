import { In } from 'typeorm'
import type { SignMany } from '../../../shared/contract/recordChanges.ts'
import type { FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { AppError } from '../../errors.ts'
import { assertPassword } from '../assertPassword.ts'
import type { Services } from '../services.ts'
import { sealRecord } from './sealRecord.ts'

/** What became of each record: signed with its number, or not, and why. */
interface SignedMany {
  signed: { id: string; number: string }[]
  refused: { id: string; refusal: AppError }[]
}

/**
 * Signs several records with one password, each whole or not at all, earliest work first. What asks for a reason is refused: it is
 * signed on its own page.
 * @throws {AppError} `session.wrong_password`.
 */
export async function signMany(services: Services, actor: FarmActor, { ids, password }: SignMany): Promise<SignedMany> {
  await assertPassword(services, actor, password)
  const answer: SignedMany = { signed: [], refused: [] }
  for (const id of await inOrder(services, actor, [...new Set(ids)])) {
    try {
      const { number } = await services.database.inFarm(actor, (manager) => sealRecord(services, manager, actor, id, { acknowledged: [] }))
      answer.signed.push({ id, number: number ?? '' })
    } catch (error) {
      if (!(error instanceof AppError)) throw error
      answer.refused.push({ id, refusal: error })
    }
  }
  return answer
}

/** By first start; what is not here comes last. */
async function inOrder(services: Services, actor: FarmActor, ids: string[]): Promise<string[]> {
  const rows = await services.database.inFarm(actor, (manager) =>
    manager.find(ApplicationRecord, { select: { id: true, sortAt: true }, where: { farmId: actor.farmId, id: In(ids) }, order: { sortAt: 'ASC', id: 'ASC' } }))
  const here = rows.map(({ id }) => id)
  return [...here, ...ids.filter((id) => !here.includes(id))]
}
