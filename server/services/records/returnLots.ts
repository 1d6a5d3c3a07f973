import { In, type EntityManager } from 'typeorm'
import { v7 as uuidV7 } from 'uuid'
import { addDecimals } from '../../../shared/units/addDecimals.ts'
import { Lot } from '../../entities/Lot.ts'
import { LotEntry } from '../../entities/LotEntry.ts'

/** What a record has out of each lot, by its id, in the lot's unit: what was drawn, less what went back. */
export async function findTaken(manager: EntityManager, farmId: string, recordId: string): Promise<Map<string, string>> {
  const rows: { lot_id: string; taken: string }[] = await manager.query(
    `SELECT lot_id, trim_scale(-sum(amount))::text AS taken FROM lot_entries
     WHERE farm_id = $1 AND record_id = $2 GROUP BY lot_id HAVING sum(amount) <> 0`,
    [farmId, recordId],
  )
  return new Map(rows.map(({ lot_id, taken }) => [lot_id, taken]))
}

/** Locks lots in the order of their ids, so that two who write never wait for each other crosswise. */
export async function lockLots(manager: EntityManager, farmId: string, ids: readonly string[]): Promise<Lot[]> {
  if (ids.length === 0) return []
  return manager.find(Lot, { where: { farmId, id: In([...new Set(ids)]) }, order: { id: 'ASC' }, lock: { mode: 'pessimistic_write' } })
}

/** Gives locked lots back what a record took of them, and writes each return into the ledger. */
export async function returnLots(
  manager: EntityManager,
  lots: readonly Lot[],
  taken: ReadonlyMap<string, string>,
  by: { recordId: string; personId: string; at: Date; reason: string },
): Promise<void> {
  const returns = lots.flatMap((lot) => { const amount = taken.get(lot.id); return amount === undefined ? [] : [{ lot, amount }] })
  if (returns.length === 0) return
  for (const { lot, amount } of returns) {
    await manager.query(
      'UPDATE lots SET left_quantity = left_quantity + $3, revision = revision + 1 WHERE farm_id = $1 AND id = $2',
      [lot.farmId, lot.id, amount],
    )
  }
  await manager.insert(
    LotEntry,
    returns.map(({ lot, amount }) => ({
      farmId: lot.farmId, id: uuidV7(), lotId: lot.id, kind: 'returned' as const, amount, leftAfter: addDecimals(lot.leftQuantity, amount),
      recordId: by.recordId, reason: by.reason, personId: by.personId, at: by.at,
    })),
  )
}
