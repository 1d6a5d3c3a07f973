import { computed, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { scarcestJar, type Jar, type JarReach } from '../../../shared/mix/scarcestJar.ts'
import { sheetInputOf } from './recordContent.ts'
import type { RecordDraft } from './recordDraft.ts'
import { useFigures } from '../app/useFigures.ts'
import type { MixRow } from './useMixRows.ts'
import type { RecordStock } from './useRecordStock.ts'

/** One jar that could size the mix, in words. */
export interface JarOffer {
  reach: JarReach
  /** "Nettle ferment NF-31 has 4.2 L: enough for 84 L of water". */
  words: string
  chosen: boolean
}

/** How far each lot in the mix goes, the scarcest first; empty while the mix is sized another way. */
export function useJars({ draft, stock, rows }: { draft: Ref<RecordDraft>; stock: Ref<RecordStock>; rows: Ref<MixRow[]> }): ComputedRef<JarOffer[]> {
  const { t } = useI18n()
  const { rate, unit, volume } = useFigures()

  const jars = (): (Jar & { code: string })[] => {
    const used = new Set(draft.value.components.map(({ lotId }) => lotId).filter((id) => id !== ''))
    return [...used].flatMap((id) => {
      const lot = stock.value.lots.find((one) => one.id === id)
      const components = draft.value.components.flatMap(({ lotId }, index) => (lotId === id ? [index] : []))
      return lot ? [{ components, left: lot.left, code: lot.code }] : []
    })
  }

  function offerOf(reach: JarReach): JarOffer {
    const { water, components } = draft.value
    const lot = stock.value.lots.find(({ id }) => id === components[reach.component]?.lotId)
    return {
      reach,
      chosen: water.component === reach.component && water.value === reach.amount.value && water.unit === reach.amount.unit,
      words: t('recordForm.jar.enough', {
        name: rows.value[reach.component]?.name ?? '', lot: lot?.code ?? '',
        left: rate(lot?.left.value ?? null), unit: lot ? unit(lot.left.unit) : '', water: volume(reach.waterL),
      }),
    }
  }

  return computed(() => {
    if (draft.value.water.sizedFrom !== 'jar') return []
    const sprayer = stock.value.sprayers.find(({ id }) => id === draft.value.sprayerId) ?? null
    return scarcestJar(sheetInputOf(draft.value, { blocks: stock.value.blocks, sprayer }), jars()).map(offerOf)
  })
}
