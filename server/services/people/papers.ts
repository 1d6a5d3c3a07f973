import { In, IsNull, LessThanOrEqual, type EntityManager, type FindOptionsWhere } from 'typeorm'
import type { AddPaper, ChangePaper, PersonPaper as PaperAnswer } from '../../../shared/contract/person.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Attachment } from '../../entities/Attachment.ts'
import { Person } from '../../entities/Person.ts'
import { PersonPaper } from '../../entities/PersonPaper.ts'
import { invalid, notFound, stale } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { presentAttachments } from '../files/presentAttachment.ts'
import { digestOf, insertOnce } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'

interface Asked {
  person?: string | undefined
  /** Last day, YYYY-MM-DD: those that run out until then, of who is active. */
  expiresUntil?: string | undefined
}

/** Training and licences of the farm's people, the one that runs out first before the others. */
export async function listPapers(services: Services, actor: FarmActor, { person, expiresUntil }: Asked): Promise<PaperAnswer[]> {
  return services.database.inFarm(actor, async (manager) => {
    const where: FindOptionsWhere<PersonPaper> = { farmId: actor.farmId, endedAt: IsNull() }
    if (person !== undefined) where.personId = person
    if (expiresUntil !== undefined) {
      where.expiresOn = LessThanOrEqual(expiresUntil)
      const active = await manager.find(Person, { select: { id: true }, where: { farmId: actor.farmId, active: true } })
      where.personId = In(active.flatMap(({ id }) => (person === undefined || id === person ? [id] : [])))
    }
    const rows = await manager.find(PersonPaper, { where, order: { expiresOn: { direction: 'ASC', nulls: 'LAST' }, id: 'ASC' } })
    return presentPapers(manager, actor.farmId, rows)
  })
}

/**
 * Writes down training or a licence of a person. @returns it, and whether this call made it.
 * @throws {AppError} `person.unknown`, `paper.days` for one that runs out before it was issued, `idempotency.mismatch`.
 */
export async function addPaper(services: Services, actor: FarmActor, input: AddPaper): Promise<{ made: boolean; paper: PaperAnswer }> {
  assertDays(input)
  return services.database.inFarm(actor, async (manager) => {
    if (!(await manager.existsBy(Person, { farmId: actor.farmId, id: input.personId }))) throw invalid([{ path: 'personId', code: 'person.unknown' }])
    const { made, stored } = await insertOnce(manager, PersonPaper, {
      ...input, farmId: actor.farmId, endedAt: null, revision: 1, creationDigest: digestOf(input), createdAt: services.clock.now(),
    }, { path: 'id', code: 'idempotency.mismatch' })
    if (made) await appendJournal(services, manager, actor, { action: 'paper.added', subjectId: input.id, detail: { personId: input.personId } })
    return { made, paper: await presentPaper(manager, stored) }
  })
}

/** Writes it anew, or takes it out of the list. @throws {AppError} not-found, `stale`, `paper.days`. */
export async function changePaper(services: Services, actor: FarmActor, id: string, { revision, ended, ...fields }: ChangePaper): Promise<PaperAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const key = { farmId: actor.farmId, id }
    const paper = await manager.findOne(PersonPaper, { where: key, lock: { mode: 'pessimistic_write' } })
    if (!paper) throw notFound()
    if (paper.revision !== revision) throw stale(await presentPaper(manager, paper))
    assertDays(fields)
    const changes = { ...fields, endedAt: ended ? services.clock.now() : null, revision: revision + 1 }
    await updateRow(manager, PersonPaper, key, changes)
    await appendJournal(services, manager, actor, { action: ended ? 'paper.ended' : 'paper.changed', subjectId: id, detail: { personId: paper.personId } })
    return presentPaper(manager, { ...paper, ...changes })
  })
}

function assertDays({ issuedOn, expiresOn }: Pick<PersonPaper, 'issuedOn' | 'expiresOn'>): void {
  if (issuedOn !== null && expiresOn !== null && expiresOn < issuedOn) throw invalid([{ path: 'expiresOn', code: 'paper.days' }])
}

async function presentPaper(manager: EntityManager, row: PersonPaper): Promise<PaperAnswer> {
  const [paper] = await presentPapers(manager, row.farmId, [row])
  if (!paper) throw new Error('A paper that is there was not presented')
  return paper
}

async function presentPapers(manager: EntityManager, farmId: string, rows: PersonPaper[]): Promise<PaperAnswer[]> {
  const people = await manager.find(Person, { select: { id: true, name: true }, where: { farmId, id: In(rows.map(({ personId }) => personId)) } })
  const held = await manager.find(Attachment, {
    where: { farmId, about: 'person-paper', recordId: In(rows.map(({ id }) => id)), removedAt: IsNull() }, order: { uploadedAt: 'ASC', id: 'ASC' },
  })
  const files = await presentAttachments(manager, farmId, held)
  return rows.map(({ id, personId, kind, title, number, issuedOn, expiresOn, revision }) => ({
    id, kind, title, number, issuedOn, expiresOn, revision,
    person: { id: personId, name: people.find((one) => one.id === personId)?.name ?? '' },
    files: files.filter(({ recordId }) => recordId === id),
  }))
}
