import { amendRecordSchema } from '../../shared/contract/recordChanges.ts'
import { fixedClock } from '../clock.ts'
import type { FarmActor } from '../database/actor.ts'
import { writeAmendment } from '../services/records/amendRecord.ts'
import { reviewRecord } from '../services/records/reviewRecord.ts'
import { writeWithdrawal } from '../services/records/withdrawRecord.ts'
import type { Services } from '../services/services.ts'

const DAY_MS = 86_400_000
/** Work older than this has been read by whoever runs the season. */
const REVIEWED_DAYS = 21

export interface SignedWork {
  id: string
  block: string
  by: 'tam' | 'ruan' | 'oda'
  signedAt: Date
}

/** What became of signed work: much of it reviewed, a slip amended, a double taken back. */
export async function seedLife(services: Services, manager: FarmActor, { works, double }: { works: SignedWork[]; double: string | null }): Promise<void> {
  const now = services.clock.now()
  for (const { id, by, signedAt } of works) {
    if (by === 'oda' || now.getTime() - signedAt.getTime() < REVIEWED_DAYS * DAY_MS) continue
    const then = { ...services, clock: fixedClock(new Date(signedAt.getTime() + 2 * DAY_MS).toISOString()) }
    await reviewRecord(then, manager, id, { note: null })
  }
  const slip = works.findLast(({ block }) => block === 'H1')
  if (slip) {
    const amendment = amendRecordSchema.parse({
      reason: 'The gauge was read from the wrong side: the tank held 280 litres, not 300.',
      water: { sizedFrom: 'water', value: '280', unit: 'L', source: 'Rain tank 1' }, deviceAt: now.toISOString(),
    })
    await services.database.inFarm(manager, (tx) => writeAmendment(services, tx, manager, slip.id, amendment))
  }
  if (double === null) return
  const reason = 'Written down twice: Tam had signed it in the orchard, and it was typed once more from the notebook.'
  await services.database.inFarm(manager, (tx) => writeWithdrawal(services, tx, manager, double, { reason }))
}
