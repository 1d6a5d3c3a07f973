import { computed, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { lotStanding, type LotStanding } from '../../../shared/balance/lotStanding.ts'
import type { Lot } from '../../../shared/contract/input.ts'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import { formatDayShort } from '../../../shared/messages/formatDayShort.ts'
import { formatNumber } from '../../../shared/units/formatQuantity.ts'
import { usePreferences } from '../../stores/preferences.ts'

/** A lot as a reader sees it. */
export interface LotLine {
  lot: Lot
  standing: LotStanding
  left: string
  quantity: string
  origin: string
  received: string
  /** Its last day in words; `ink` is madder when past, weld-ink when near. */
  useBy: string
  ink: 'mad' | 'wel' | 'wal'
}

/** Lots in words, against a civil day of the farm. */
export function useLotWords(lots: Ref<readonly Lot[]>, today: Ref<string>): ComputedRef<LotLine[]> {
  const { t } = useI18n()
  const preferences = usePreferences()

  const amount = ({ value, unit }: { value: string; unit: string }): string =>
    t('inputs.amount', { value: formatNumber(value, { significant: 4 }, preferences.language), unit: t(`units.${unit}`) })

  function useByWords(lot: Lot, { useBy, days }: LotStanding): string {
    if (lot.expiresOn === null || days === null) return t('inputs.useBy.none')
    const year = lot.expiresOn.slice(0, 4) !== today.value.slice(0, 4)
    const day = formatDay(preferences.language, lot.expiresOn, { year })
    if (useBy === 'past') return t('inputs.useBy.past', { day })
    if (useBy === 'later') return t('inputs.useBy.byDay', { day })
    const when = days === 0 ? t('inputs.useBy.today') : t('inputs.useBy.inDays', { count: days })
    return t('inputs.useBy.soon', { day, when })
  }

  return computed(() => lots.value.map((lot) => {
    const standing = lotStanding(lot, today.value)
    const origin = t(`inputs.origin.${lot.origin}`)
    return {
      lot,
      standing,
      left: standing.stock === 'empty' ? t('inputs.empty') : amount(lot.left),
      quantity: amount(lot.quantity),
      origin: lot.source === null ? origin : t('inputs.originFrom', { origin, source: lot.source }),
      received: formatDayShort(preferences.language, lot.receivedOn),
      useBy: useByWords(lot, standing),
      ink: standing.useBy === 'past' ? 'mad' : standing.useBy === 'soon' ? 'wel' : 'wal',
    }
  }))
}
