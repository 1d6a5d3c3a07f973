import { computed, type ComputedRef, type Ref } from 'vue'
import { recordSheet } from '../../../shared/mix/recordSheet.ts'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'
import { sheetInputOf } from './recordContent.ts'
import type { RecordDraft } from './recordDraft.ts'
import type { RecordStock } from './useRecordStock.ts'

/** The sheet of what is typed over what the farm has. */
function sheetOfDraft(draft: RecordDraft, { blocks, sprayers }: Pick<RecordStock, 'blocks' | 'sprayers'>): RecordSheet {
  return recordSheet(sheetInputOf(draft, { blocks, sprayer: sprayers.find(({ id }) => id === draft.sprayerId) ?? null }))
}

/** The sheet of what is typed, worked out as one types. */
export function useRecordSheet(draft: Ref<RecordDraft>, stock: Ref<RecordStock>): ComputedRef<RecordSheet> {
  return computed(() => sheetOfDraft(draft.value, stock.value))
}
