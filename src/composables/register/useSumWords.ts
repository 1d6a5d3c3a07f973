import { useI18n } from 'vue-i18n'
import { figureFor, quantityFor } from '../../../shared/messages/readFigure.ts'
import type { RegisterSums } from '../../../shared/register/sumRegisterRows.ts'
import { formatNumber } from '../../../shared/units/formatQuantity.ts'
import { usePreferences } from '../../stores/preferences.ts'

/** The last line of the register's table. */
export interface SumWords { words: string; area: string; volume: string; mass: string }

/** Sums of the register in the reader's language and measures. */
export function useSumWords(): { wordsOf: (sums: RegisterSums) => SumWords } {
  const { t } = useI18n()
  const preferences = usePreferences()
  const number = (count: number): string => formatNumber(count, { digits: 0 }, preferences.language)
  return {
    wordsOf: ({ signed, withdrawn, areaHa, totalL, totalKg }) => {
      const parts = [t('register.sum.signed', { number: number(signed) }, signed)]
      if (withdrawn > 0) parts.push(t('register.sum.withdrawn', { number: number(withdrawn) }, withdrawn))
      return {
        words: parts.join(', '),
        area: figureFor(preferences.reader, areaHa, 'ha', { digits: 2 }), volume: figureFor(preferences.reader, totalL, 'L', { digits: 0 }),
        mass: Number(totalKg) === 0 ? '' : quantityFor(preferences.reader, totalKg, 'kg', { digits: 0 }),
      }
    },
  }
}
