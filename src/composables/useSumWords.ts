import { useI18n } from 'vue-i18n'
import type { RegisterSums } from '../../shared/register/sumRegisterRows.ts'
import { formatNumber, formatVolumeL } from '../../shared/units/formatQuantity.ts'
import { usePreferences } from '../stores/preferences.ts'

/** The last line of the register's table. */
export interface SumWords { words: string; hectares: string; litres: string; mass: string }

/** Sums of the register in the reader's language. */
export function useSumWords(): { wordsOf: (sums: RegisterSums) => SumWords } {
  const { t } = useI18n()
  const preferences = usePreferences()
  const number = (count: number | string, digits = 0): string => formatNumber(count, { digits }, preferences.language)
  return {
    wordsOf: ({ signed, withdrawn, areaHa, totalL, totalKg }) => {
      const parts = [t('register.sum.signed', { number: number(signed) }, signed)]
      if (withdrawn > 0) parts.push(t('register.sum.withdrawn', { number: number(withdrawn) }, withdrawn))
      return {
        words: parts.join(', '), hectares: number(areaHa, 2), litres: formatVolumeL(totalL, preferences.language, 0),
        mass: Number(totalKg) === 0 ? '' : t('register.kilogramsUnit', { value: number(totalKg) }),
      }
    },
  }
}
