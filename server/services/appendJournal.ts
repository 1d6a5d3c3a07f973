import { v7 as uuidV7 } from 'uuid'
import type { EntityManager } from 'typeorm'
import type { JournalAction } from '../../shared/journal/journalActions.ts'
import type { FarmActor } from '../database/actor.ts'
import { JournalEntry } from '../entities/JournalEntry.ts'
import type { Services } from './services.ts'

/** Writes who did what into the farm's journal, in the transaction of the deed itself. */
export async function appendJournal(
  services: Pick<Services, 'clock'>,
  manager: EntityManager,
  actor: Pick<FarmActor, 'farmId' | 'personId' | 'accountId'> & Partial<Pick<FarmActor, 'origin'>>,
  entry: { action: JournalAction; subjectId: string; detail?: object },
): Promise<void> {
  await manager.insert(JournalEntry, {
    farmId: actor.farmId,
    id: uuidV7(),
    at: services.clock.now(),
    personId: actor.personId,
    accountId: actor.accountId,
    action: entry.action,
    subjectId: entry.subjectId,
    detail: entry.detail ?? {},
    fromNetwork: actor.origin?.network ?? null,
    fromDevice: actor.origin?.device ?? null,
  })
}
