import { computed, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { rankLots, type RankedLot } from '../../shared/checks/rankLots.ts'
import type { Material } from '../../shared/contract/input.ts'
import type { RecordSheet } from '../../shared/mix/sheetTypes.ts'
import { civilDateIn } from '../../shared/time/civilDate.ts'
import { now } from '../plugins/clock.ts'
import type { ComponentDraft, RecordDraft } from './recordDraft.ts'
import { useFigures } from './useFigures.ts'
import type { RecordStock } from './useRecordStock.ts'

/** One ingredient as the account shows it; empty texts where nothing is known yet. */
export interface MixRow {
  key: string
  name: string
  /** "Lot 26-018", and what it holds. */
  lot: string
  has: string
  measure: string
  inAll: string
  fullLoad: string
  lastLoad: string
  unit: string
  ranked: RankedLot[]
}

interface MixRowsOptions {
  draft: Ref<RecordDraft>
  sheet: Ref<RecordSheet>
  stock: Ref<RecordStock>
}

/** The ingredients of a mix in the person's language, each with its lots ranked. */
export function useMixRows({ draft, sheet, stock }: MixRowsOptions): { rows: ComputedRef<MixRow[]>; waterMeasure: ComputedRef<string> } {
  const { t } = useI18n()
  const { amount, rate, unit } = useFigures()

  function measureOf({ kind, value, unit: code }: ComponentDraft): string {
    if (value.trim() === '') return t('records.mix.noMeasure')
    return kind === 'ratio' ? t('records.mix.ratioSays', { parts: value }) : t(`records.mix.${kind}Says`, { value, unit: unit(code) })
  }

  function rowOf(component: ComponentDraft, index: number): MixRow {
    const figures = sheet.value.components[index]
    const material: Material | undefined = stock.value.materials.find(({ id }) => id === component.materialId)
    const lots = stock.value.lots.filter(({ materialId }) => materialId === component.materialId)
    const lot = lots.find(({ id }) => id === component.lotId)
    const usedOn = draft.value.start.date || civilDateIn(stock.value.farm?.zone ?? 'UTC', now().toISOString())
    return {
      key: component.key,
      name: material?.name ?? t('records.mix.unnamed', { number: index + 1 }),
      lot: lot ? t('records.mix.lot', { code: lot.code }) : t('records.mix.noLot'),
      has: lot ? t('records.mix.has', { left: rate(lot.left.value), unit: unit(lot.left.unit) }) : '',
      measure: measureOf(component),
      inAll: amount(figures?.amount?.value ?? null),
      fullLoad: amount(figures?.perFullLoad ?? null),
      lastLoad: amount(figures?.perLastLoad ?? null),
      unit: figures?.amount ? unit(figures.amount.unit) : '',
      ranked: rankLots(lots, { need: figures?.amount ?? null, usedOn }),
    }
  }

  return {
    rows: computed(() => draft.value.components.map(rowOf)),
    waterMeasure: computed(() => {
      const { value, sizedFrom, unit: code } = draft.value.water
      if (value.trim() === '') return t('records.mix.noWater')
      return sizedFrom === 'water' ? t('records.mix.typed') : t('records.mix.fromRate', { rate: value, unit: unit(code) })
    }),
  }
}
