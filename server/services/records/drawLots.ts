import { v7 as uuidV7 } from 'uuid'
import type { EntityManager } from 'typeorm'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { convertQuantity } from '../../../shared/units/convertQuantity.ts'
import { dimensionOf } from '../../../shared/units/dimensionOf.ts'
import { subtractDecimals } from '../../../shared/units/subtractDecimals.ts'
import type { Lot } from '../../entities/Lot.ts'
import { LotEntry } from '../../entities/LotEntry.ts'
import { invalid, type FieldError } from '../../errors.ts'

interface Draw {
  lot: Lot
  path: string
  amount: SignedRecord['computed']['components'][number]['amount']
}

/**
 * Takes what a record used out of its lots, which are locked, and writes each taking into the ledger.
 * @throws {AppError} invalid-input naming every lot that holds too little; then nothing is taken.
 */
export async function drawLots(
  manager: EntityManager,
  draws: Draw[],
  by: { recordId: string; personId: string; at: Date },
): Promise<void> {
  const left = new Map(draws.map(({ lot }) => [lot.id, lot.leftQuantity]))
  const errors: FieldError[] = []
  const entries: LotEntry[] = []
  for (const { lot, path, amount } of draws) {
    if (dimensionOf(amount.unit) !== dimensionOf(lot.unit)) {
      errors.push({ path, code: 'lot.dimension', params: { code: lot.code, unit: lot.unit } })
      continue
    }
    const needed = convertQuantity(amount, lot.unit)
    const before = left.get(lot.id) ?? '0'
    const after = subtractDecimals(before, needed)
    if (after.startsWith('-')) {
      errors.push({ path, code: 'lot.short', params: { code: lot.code, left: Number(before), needed: Number(needed), unit: lot.unit } })
    }
    left.set(lot.id, after)
    entries.push({
      farmId: lot.farmId, id: uuidV7(), lotId: lot.id, kind: 'drawn', amount: `-${needed}`, leftAfter: after,
      recordId: by.recordId, reason: null, personId: by.personId, at: by.at,
    })
  }
  if (errors.length > 0) throw invalid(errors)
  for (const entry of entries) {
    await manager.query(
      'UPDATE lots SET left_quantity = left_quantity + $3, revision = revision + 1 WHERE farm_id = $1 AND id = $2',
      [entry.farmId, entry.lotId, entry.amount],
    )
  }
  if (entries.length > 0) await manager.insert(LotEntry, entries)
}
