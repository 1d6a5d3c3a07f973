import { v7 as uuidV7 } from 'uuid'
import type { EntityManager } from 'typeorm'
import { LotEntry } from '../../entities/LotEntry.ts'
import type { DrawEntry } from './planDraws.ts'

/** Takes what a record used out of its lots, which are locked, and writes each taking into the ledger. */
export async function drawLots(
  manager: EntityManager,
  entries: DrawEntry[],
  by: { recordId: string; personId: string; at: Date },
): Promise<void> {
  if (entries.length === 0) return
  for (const { lot, taken } of entries) {
    await manager.query(
      'UPDATE lots SET left_quantity = left_quantity - $3, revision = revision + 1 WHERE farm_id = $1 AND id = $2',
      [lot.farmId, lot.id, taken],
    )
  }
  await manager.insert(
    LotEntry,
    entries.map(({ lot, taken, leftAfter, reason }) => ({
      farmId: lot.farmId, id: uuidV7(), lotId: lot.id, kind: 'drawn' as const, amount: `-${taken}`, leftAfter,
      recordId: by.recordId, reason, personId: by.personId, at: by.at,
    })),
  )
}
