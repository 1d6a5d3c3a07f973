import { computed, type ComputedRef, type Ref } from 'vue'
import type { Block } from '../../shared/contract/block.ts'
import type { Sprayer } from '../../shared/contract/farm.ts'
import { recordSheet } from '../../shared/mix/recordSheet.ts'
import type { RecordSheet } from '../../shared/mix/sheetTypes.ts'
import { sheetInputOf } from './recordContent.ts'
import type { RecordDraft } from './recordDraft.ts'
import type { RecordStock } from './useRecordStock.ts'

/** The sheet of what is typed, worked out as one types, with the block and sprayer it rests on. */
export function useRecordSheet(draft: Ref<RecordDraft>, stock: Ref<RecordStock>): {
  sheet: ComputedRef<RecordSheet>
  block: ComputedRef<Block | null>
  sprayer: ComputedRef<Sprayer | null>
} {
  const block = computed(() => stock.value.blocks.find(({ id }) => id === draft.value.blockId) ?? null)
  const sprayer = computed(() => stock.value.sprayers.find(({ id }) => id === draft.value.sprayerId) ?? null)
  const sheet = computed(() => recordSheet(sheetInputOf(draft.value, {
    areaM2: block.value?.areaM2 ?? null,
    tankL: sprayer.value?.tankL ?? null,
  })))
  return { sheet, block, sprayer }
}
