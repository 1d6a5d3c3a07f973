import { computed, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { rankLots, type RankedLot } from '../../../shared/checks/rankLots.ts'
import type { Lot, Material } from '../../../shared/contract/input.ts'
import type { RecordSheet, SheetComponent } from '../../../shared/mix/sheetTypes.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { subtractDecimals } from '../../../shared/units/subtractDecimals.ts'
import { convertQuantity } from '../../../shared/units/convertQuantity.ts'
import { dimensionOf } from '../../../shared/units/dimensionOf.ts'
import { readingAmountUnit, readingUnit } from '../../../shared/units/readingUnit.ts'
import type { UnitCode } from '../../../shared/units/unitTable.ts'
import { now } from '../../plugins/clock.ts'
import { numberOf } from './recordContent.ts'
import type { ComponentDraft, RecordDraft } from './recordDraft.ts'
import { useFigures } from '../app/useFigures.ts'
import { useMeasureWords } from './useMeasures.ts'
import type { RecordStock } from './useRecordStock.ts'

/** One ingredient as the account shows it; empty texts where nothing is known yet. */
export interface MixRow {
  key: string
  name: string
  material: Material | null
  /** "Lot 26-018", and what it holds. */
  lot: string
  has: string
  /** "1 part to 20 parts water". */
  measure: string
  inAll: string
  fullLoad: string
  lastLoad: string
  unit: string
  /** The same amounts in the measures this person has at hand, with the error. */
  byHand: { inAll: string; fullLoad: string; lastLoad: string }
  /** "0.25 L less than planned", once what was used is written. */
  difference: string
  ranked: RankedLot[]
}

interface MixRowsOptions {
  draft: Ref<RecordDraft>
  sheet: Ref<RecordSheet>
  stock: Ref<RecordStock>
}

/** How an ingredient is measured out, spelled. */
function useBasisWords(): (component: ComponentDraft) => string {
  const { t } = useI18n()
  const { plain, unit } = useFigures()
  return ({ kind, value, unit: code, each, reading }) => {
    const read = numberOf(value)
    if (read === '') return t('records.mix.noMeasure')
    const figure = plain(read)
    if (kind === 'ratio') {
      return reading === 'to'
        ? t('recordForm.mix.ratioToSays', { parts: figure }, Number(read))
        : t('recordForm.mix.ratioInSays', { parts: figure, water: plain(subtractDecimals(read, '1')) })
    }
    if (kind === 'perEach') return t('recordForm.mix.perEachSays', { value: figure, unit: unit(code), each: t(`recordForm.mix.choice.${each}`) })
    if (kind === 'total') return t('recordForm.mix.totalSays', { value: figure, unit: unit(code) })
    return t(`records.mix.${kind}Says`, { value: figure, unit: unit(code) })
  }
}

/** The ingredients of a mix in the person's language, each with its lots ranked. */
export function useMixRows({ draft, sheet, stock }: MixRowsOptions): { rows: ComputedRef<MixRow[]>; waterMeasure: ComputedRef<string> } {
  const { t } = useI18n()
  const { amount, rate, plain, unit, reader } = useFigures()
  const basisWords = useBasisWords()
  const measureWords = useMeasureWords()

  const byHand = (value: string | null | undefined, code: UnitCode | undefined): string => (value && code ? measureWords({ value, unit: code }) : '')

  function differenceOf({ used }: ComponentDraft, figures: SheetComponent | undefined): string {
    const read = used.known === 'workedOut' ? '' : numberOf(used.value)
    const planned = figures?.amount
    if (read === '' || !planned || dimensionOf(planned.unit) !== dimensionOf(used.unit)) return ''
    const less = subtractDecimals(convertQuantity(planned, used.unit as UnitCode), read)
    if (Number(less) === 0) return t('recordForm.used.asPlanned')
    const figure = amount(less.replace('-', ''))
    return t(less.startsWith('-') ? 'recordForm.used.more' : 'recordForm.used.less', { amount: figure, unit: unit(used.unit) })
  }

  const lotWords = (lot: Lot | undefined): Pick<MixRow, 'lot' | 'has'> => ({
    lot: lot ? t('records.mix.lot', { code: lot.code }) : t('records.mix.noLot'),
    has: lot ? t('records.mix.has', { left: rate(lot.left.value), unit: unit(lot.left.unit) }) : '',
  })

  function rowOf(component: ComponentDraft, index: number): MixRow {
    const figures = sheet.value.components[index]
    const material = stock.value.materials.find(({ id }) => id === component.materialId) ?? null
    const lots = stock.value.lots.filter(({ materialId }) => materialId === component.materialId)
    const usedOn = draft.value.lines[0]?.start.date || civilDateIn(stock.value.farm?.zone ?? 'UTC', now().toISOString())
    const code = figures?.amount?.unit
    const readIn = figures?.amount ? readingAmountUnit(figures.amount, reader.value.units) : undefined
    const shown = (value: string | null | undefined): string => (value && code && readIn ? amount(convertQuantity({ value, unit: code }, readIn)) : '')
    return {
      key: component.key,
      name: material?.name ?? t('records.mix.unnamed', { number: index + 1 }),
      material,
      ...lotWords(lots.find(({ id }) => id === component.lotId)),
      measure: basisWords(component),
      inAll: shown(figures?.amount?.value),
      fullLoad: shown(figures?.perFullLoad),
      lastLoad: shown(figures?.perLastLoad),
      unit: readIn ? unit(readIn) : '',
      byHand: { inAll: byHand(figures?.amount?.value, code), fullLoad: byHand(figures?.perFullLoad, code), lastLoad: byHand(figures?.perLastLoad, code) },
      difference: differenceOf(component, figures),
      ranked: rankLots(lots, { need: figures?.amount ?? null, usedOn }),
    }
  }

  const rows = computed(() => draft.value.components.map(rowOf))
  return {
    rows,
    waterMeasure: computed(() => {
      const { value, sizedFrom, unit: code, each, component } = draft.value.water
      const read = numberOf(value)
      if (sizedFrom === 'none') return t('records.mix.none')
      if (read === '') return t('records.mix.noWater')
      const typed = { value: plain(read), unit: unit(code) }
      switch (sizedFrom) {
        case 'water':
          return readingUnit(code as UnitCode, reader.value.units) === code ? t('records.mix.typed') : t('records.mix.typedAs', typed)
        case 'sprayRate':
          return t('records.mix.fromRate', { rate: typed.value, unit: typed.unit })
        case 'perEach':
          return t('recordForm.mix.perEachSays', { ...typed, each: t(`recordForm.mix.choice.${each}`) })
        case 'jar':
          return t('recordForm.mix.fromJar', { ...typed, name: rows.value[component]?.name ?? '' })
      }
    }),
  }
}

