import { computed, type ComputedRef } from 'vue'
import { useI18n } from 'vue-i18n'
import type { MessageId } from '../../../shared/messages/en.ts'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'

/** What the sheet finds wrong with a mix as a whole, worst first. */
const WORDS: readonly (readonly [code: string, words: MessageId])[] = [
  ['sheet.too_strong', 'records.mix.tooStrong'],
  ['sheet.jar_fixed', 'recordForm.mix.jarFixed'],
  ['sheet.ratio_needs_water', 'recordForm.mix.ratioNeedsWater'],
  ['sheet.tank_needed', 'records.mix.tankNeeded'],
  ['sheet.count_needed', 'recordForm.mix.countNeeded'],
]

/** The worst finding of a mix in words, else what was said of it otherwise. */
export function useMixFinding(sheet: () => RecordSheet, otherwise: () => string): ComputedRef<string> {
  const { t } = useI18n()
  return computed(() => {
    const found = WORDS.find(([code]) => sheet().findings.some((finding) => finding.code === code))
    return found ? t(found[1]) : otherwise()
  })
}
