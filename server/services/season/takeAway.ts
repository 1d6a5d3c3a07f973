import { v7 as uuidV7 } from 'uuid'
import type { LogEntry } from '../../../shared/evidence/seasonDigest.ts'
import type { FarmActor } from '../../database/actor.ts'
import { SeasonHead } from '../../entities/SeasonHead.ts'
import { appendJournal } from '../appendJournal.ts'
import type { Services } from '../services.ts'

/** What somebody takes away of a season; `volume` where there are several, "2/7". */
export interface Taken { season: number; format: 'pdf' | 'sheets' | 'csv'; volume: string | null; head: LogEntry | null }
/** What else a certifier can take away. */
interface Noted { format: 'record' | 'register' | 'registerCsv'; subjectId?: string; number?: string; volume?: string | null }

/**
 * Writes into the farm's journal that a report leaves it, with the head it bears; to be called when it is drawn and nothing of it is sent.
 * @throws {AppError} not-found or forbidden if the reader's role or grant has ended since: then nothing leaves.
 */
export async function takeAway(services: Services, actor: FarmActor, { season, format, volume, head }: Taken): Promise<void> {
  const { farmId, accountId, role } = actor
  // A certifier writes nothing; that something was taken, the house writes, and asks the grant once more as it does.
  await services.database.inFarm({ farmId, role, seasons: null }, async (manager) => {
    const detail = { season, format, ...(volume !== null && { volume }), ...(head && { seq: head.seq, digest: head.digest }) }
    await appendJournal(services, manager, actor, { action: 'report.downloaded', subjectId: farmId, detail })
    if (head) await manager.insert(SeasonHead, { farmId, id: uuidV7(), accountId, season, seq: head.seq, digest: head.digest, takenAt: services.clock.now() })
  })
}

/** The same for a record or a register that a certifier takes; the farm's own people are not written down for it. */
export async function noteForOutsider(services: Services, actor: FarmActor, { format, subjectId = actor.farmId, number, volume = null }: Noted): Promise<void> {
  const { farmId, role } = actor
  if (role !== 'certifier') return
  await services.database.inFarm({ farmId, role, seasons: null }, (manager) => appendJournal(services, manager, actor, {
    action: format === 'record' ? 'record.downloaded' : 'report.downloaded', subjectId,
    detail: { format, ...(number !== undefined && { number }), ...(volume !== null && { volume }) },
  }))
}
