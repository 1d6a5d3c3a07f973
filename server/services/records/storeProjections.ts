import type { EntityManager } from 'typeorm'
import type { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { RecordComponent } from '../../entities/RecordComponent.ts'
import { RecordLine } from '../../entities/RecordLine.ts'

/**
 * Writes the record's lines and components into the tables that find it by block, material and lot.
 * @param anew false for a record that has none yet.
 */
export async function storeProjections(manager: EntityManager, record: ApplicationRecord, anew: boolean): Promise<void> {
  const key = { farmId: record.farmId, recordId: record.id }
  if (anew) {
    await manager.delete(RecordLine, key)
    await manager.delete(RecordComponent, key)
  }
  const { season, sortAt, content, computed } = record
  await manager.insert(RecordLine, content.lines.map(({ blockId }, position) => ({ ...key, position, blockId, season, sortAt })))
  if (content.components.length === 0) return
  await manager.insert(
    RecordComponent,
    content.components.map(({ materialId, lotId }, position) => {
      const amount = computed.components[position]?.amount ?? null
      return { ...key, position, materialId, lotId, amount: amount?.value ?? null, unit: amount?.unit ?? null, season }
    }),
  )
}
