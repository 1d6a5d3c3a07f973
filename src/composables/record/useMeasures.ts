import { computed, type ComputedRef } from 'vue'
import { useI18n } from 'vue-i18n'
import { measuresSchema } from '../../../shared/contract/preferences.ts'
import { inMeasures, type Measure, type Scoop } from '../../../shared/units/inMeasures.ts'
import type { UnitCode } from '../../../shared/units/unitTable.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { useSession } from '../../stores/session.ts'
import { useFigures } from '../app/useFigures.ts'
import { useMe } from '../people/useMe.ts'

/** The measures this person has at hand: they follow the account; without signal this device keeps them. */
export function useMeasures(): { measures: ComputedRef<Measure[]>; keep: (measures: Measure[]) => void } {
  const session = useSession()
  const preferences = usePreferences()
  const me = useMe()
  const account = computed(() => session.user?.id ?? '')
  return {
    measures: computed(() => preferences.measuresOf(account.value, session.user?.preferences.measures)),
    keep: (measures) => {
      const id = account.value
      preferences.keepMeasures(id, measures)
      me.change({ preferences: { measures: measuresSchema.parse(measures) } }).then(() => { preferences.keepMeasures(id, null) }, () => undefined)
    },
  }
}

/** An amount in the measures at hand: "3 US cups and 2 US tbsp, 0.4 % under"; empty where none of them comes near. */
export function useMeasureWords(): (amount: { value: string; unit: UnitCode }) => string {
  const { t } = useI18n()
  const { plain, unit } = useFigures()
  const { measures } = useMeasures()

  const scoopWords = ({ measure, count }: Scoop): string => {
    if (measure.name !== null) return t('recordForm.measures.scoop', { count, name: measure.name })
    return t('recordForm.measures.scoop', { count, name: unit(measure.unit) })
  }
  function errorWords(errorPct: number): string {
    const size = Math.round(Math.abs(errorPct) * 10) / 10
    if (size === 0) return t('recordForm.measures.exact')
    return t(errorPct < 0 ? 'recordForm.measures.under' : 'recordForm.measures.over', { percent: plain(size) })
  }

  return (amount) => {
    const way = inMeasures(amount, measures.value)
    if (way === null) return ''
    const [first, second] = way.scoops.map(scoopWords)
    const scoops = second === undefined ? (first ?? '') : t('recordForm.measures.two', { first, second })
    return t('recordForm.measures.says', { scoops, error: errorWords(way.errorPct) })
  }
}
