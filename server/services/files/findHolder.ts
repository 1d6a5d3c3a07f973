import type { EntityManager, EntityTarget, ObjectLiteral } from 'typeorm'
import type { FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import type { Attachment } from '../../entities/Attachment.ts'
import { Block } from '../../entities/Block.ts'
import { Calibration } from '../../entities/Calibration.ts'
import { Certificate } from '../../entities/Certificate.ts'
import { PersonPaper } from '../../entities/PersonPaper.ts'
import { forbidden, notFound } from '../../errors.ts'
import { assertMayWrite } from '../records/assertMayWrite.ts'

/** What a file belongs to. */
export interface FileHolder { about: Attachment['about']; id: string }

/**
 * Holds that what a file belongs to is there and may be written by this person: a record by whoever may write it, anything else by who
 * leads the farm.
 * @param lock holds it until the transaction ends.
 * @returns the season under which a certifier may see the file; null for none.
 * @throws {AppError} not-found, forbidden.
 */
export async function findHolder(manager: EntityManager, actor: FarmActor, { about, id }: FileHolder, lock = false): Promise<{ season: number | null }> {
  const { farmId } = actor
  const locked = lock ? { lock: { mode: 'pessimistic_read' as const } } : {}
  if (about !== 'record') {
    await assertThere(manager, actor, { about, id }, lock)
    if (actor.role === 'applicator') throw forbidden()
    return { season: null }
  }
  const record = await manager.findOne(ApplicationRecord, { where: { farmId, id }, ...locked })
  if (!record) throw notFound()
  assertMayWrite(actor, record)
  return { season: record.season }
}

/** That a thing is there on this farm. @throws {AppError} not-found. */
export async function assertThere(manager: EntityManager, { farmId }: Pick<FarmActor, 'farmId'>, { about, id }: FileHolder, lock = false): Promise<void> {
  const how = { where: { farmId, id }, ...(lock && { lock: { mode: 'pessimistic_read' as const } }) }
  if ((await manager.findOne<ObjectLiteral>(HOLDERS[about], how)) === null) throw notFound()
}

const HOLDERS: Record<Attachment['about'], EntityTarget<ObjectLiteral>> = {
  record: ApplicationRecord, 'person-paper': PersonPaper, land: Block, calibration: Calibration, certificate: Certificate,
}
