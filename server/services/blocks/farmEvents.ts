import { In, type EntityManager } from 'typeorm'
import type { CreateFarmEvent, FarmEvent as FarmEventAnswer, FarmEventQuery } from '../../../shared/contract/farmEvent.ts'
import { civilDateSchema } from '../../../shared/contract/common.ts'
import { seasonOf } from '../../../shared/time/seasonOf.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { FarmEvent } from '../../entities/FarmEvent.ts'
import { FarmEventBlock } from '../../entities/FarmEventBlock.ts'
import { Person } from '../../entities/Person.ts'
import { AppError, forbidden, invalid, notFound } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { cutPage, decodeCursor } from '../cursor.ts'
import { digestOf, findRepeat, insertOnce } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { farmToday } from './drawingDay.ts'
import { openBlock } from './openBlock.ts'

/** A page of the farm's events, newest day first. */
export async function listFarmEvents(services: Services, { farmId, ...actor }: FarmActor, { blockId, from, to, ...page }: FarmEventQuery): Promise<{ items: FarmEventAnswer[]; next: string | null }> {
  const after = decodeCursor(page.cursor, civilDateSchema)
  return services.database.inFarm({ farmId, ...actor }, async (manager) => {
    const query = manager.getRepository(FarmEvent).createQueryBuilder('event').where('event.farmId = :farmId', { farmId })
    if (blockId !== undefined) query.andWhere('EXISTS (SELECT 1 FROM farm_event_blocks e WHERE e.farm_id = event.farm_id AND e.event_id = event.id AND e.block_id = :blockId)', { blockId })
    if (from !== undefined) query.andWhere('event.onDay >= :from', { from })
    if (to !== undefined) query.andWhere('event.onDay <= :to', { to })
    if (after) query.andWhere('(event.onDay, event.id) < (:key, :id)', { key: after.key, id: after.id })
    const rows = await query.orderBy('event.onDay', 'DESC').addOrderBy('event.id', 'DESC').limit(page.limit + 1).getMany()
    const { items, next } = cutPage(rows, page.limit, (row) => row, ({ onDay, id }) => [onDay, id])
    return { items: await presentAll(manager, items), next }
  })
}

/** Writes down what was done on blocks. @returns the event, and whether this call made it. @throws {AppError} `block.unknown`, `block.ended`, `time.future`. */
export async function createFarmEvent(services: Services, actor: FarmActor, input: CreateFarmEvent): Promise<{ made: boolean; event: FarmEventAnswer }> {
  const { farmId } = actor
  const { id, kind, on, note } = input
  const blockIds = [...new Set(input.blockIds)].sort()
  return services.database.inFarm(actor, async (manager) => {
    const creationDigest = digestOf({ ...input, blockIds })
    const repeated = await findRepeat(manager, FarmEvent, { farmId, id, creationDigest })
    if (repeated) return { made: false, event: await presentOne(manager, repeated) }
    if (on > farmToday(services, actor)) throw invalid([{ path: 'on', code: 'time.future' }])
    for (const blockId of blockIds) await openBlock(manager, actor, blockId, 'blockIds')
    const row: FarmEvent = {
      farmId, id, kind, onDay: on, season: seasonOf(on, actor.seasonStart), note, byId: personOf(actor), at: services.clock.now(),
      withdrawnAt: null, withdrawnById: null, withdrawnReason: null, creationDigest,
    }
    const { made, stored } = await insertOnce(manager, FarmEvent, row, { path: 'id', code: 'idempotency.mismatch' })
    if (made) {
      await manager.insert(FarmEventBlock, blockIds.map((blockId) => ({ farmId, eventId: id, blockId })))
      await appendJournal(services, manager, actor, { action: 'event.created', subjectId: id, detail: { kind, on, blockIds } })
    }
    return { made, event: await presentOne(manager, stored) }
  })
}

/**
 * Takes an event back, with the reason; it stays readable. Whoever wrote it may, and managers. Once more with the same reason answers the same.
 * @throws {AppError} not-found, forbidden, `event.withdrawn`.
 */
export async function withdrawFarmEvent(services: Services, actor: FarmActor, id: string, { reason }: { reason: string }): Promise<FarmEventAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const event = await manager.findOne(FarmEvent, { where: { farmId: actor.farmId, id }, lock: { mode: 'pessimistic_write' } })
    if (!event) throw notFound()
    if (actor.role === 'applicator' && event.byId !== actor.personId) throw forbidden('event.not_yours')
    if (event.withdrawnAt !== null) {
      if (event.withdrawnReason === reason && event.withdrawnById === actor.personId) return presentOne(manager, event)
      throw new AppError('conflict', 'event.withdrawn', { current: await presentOne(manager, event) })
    }
    const changes = { withdrawnAt: services.clock.now(), withdrawnById: personOf(actor), withdrawnReason: reason }
    await manager.update(FarmEvent, { farmId: actor.farmId, id }, changes)
    await appendJournal(services, manager, actor, { action: 'event.withdrawn', subjectId: id, detail: { reason } })
    return presentOne(manager, { ...event, ...changes })
  })
}

async function presentOne(manager: EntityManager, event: FarmEvent): Promise<FarmEventAnswer> {
  const [answer] = await presentAll(manager, [event])
  if (!answer) throw new RangeError('An event was lost while it was shown')
  return answer
}

async function presentAll(manager: EntityManager, events: readonly FarmEvent[]): Promise<FarmEventAnswer[]> {
  const [first] = events
  if (!first) return []
  const { farmId } = first
  const places = await manager.findBy(FarmEventBlock, { farmId, eventId: In(events.map(({ id }) => id)) })
  const ids = events.flatMap(({ byId, withdrawnById }) => [byId, ...(withdrawnById === null ? [] : [withdrawnById])])
  const people = await manager.find(Person, { select: { id: true, name: true }, where: { farmId, id: In(ids) } })
  const person = (id: string) => ({ id, name: people.find((candidate) => candidate.id === id)?.name ?? '' })
  return events.map(({ id, kind, onDay, note, byId, at, withdrawnAt, withdrawnById, withdrawnReason }) => ({
    id, kind, on: onDay, note, by: person(byId), at: at.toISOString(),
    blockIds: places.filter(({ eventId }) => eventId === id).map(({ blockId }) => blockId),
    withdrawn: withdrawnAt === null ? null : { at: withdrawnAt.toISOString(), by: person(withdrawnById ?? ''), reason: withdrawnReason ?? '' },
  }))
}
