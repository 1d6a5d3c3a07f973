import type { EntityManager } from 'typeorm'
import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import type { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { Person } from '../../entities/Person.ts'
import { forbidden, invalid } from '../../errors.ts'

/** An applicator writes and signs what they did or entered; managers and owners any. @throws {AppError} forbidden. */
export function assertMayWrite(actor: FarmActor, record: Pick<ApplicationRecord, 'doneById' | 'enteredById'>): void {
  const person = personOf(actor)
  if (actor.role !== 'applicator' || record.doneById === person || record.enteredById === person) return
  throw forbidden('record.not_yours')
}

/**
 * Who did the work: the writer where nobody else is named.
 * @throws {AppError} invalid-input for somebody unknown, or for an applicator who names another.
 */
export async function findDoer(manager: EntityManager, actor: FarmActor, content: RecordContent): Promise<Person> {
  const id = content.doneById ?? personOf(actor)
  if (actor.role === 'applicator' && id !== actor.personId) throw invalid([{ path: 'doneById', code: 'person.only_yourself' }])
  const person = await manager.findOneBy(Person, { farmId: actor.farmId, id })
  if (!person) throw invalid([{ path: 'doneById', code: 'person.unknown' }])
  return person
}
