import { computed, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { ApplicationRecord } from '../../shared/contract/record.ts'
import type { Basis } from '../../shared/contract/recordContent.ts'
import { PLAIN_FIELDS, type PlainName } from '../../shared/records/plainFields.ts'
import { civilDateIn, civilTimeIn } from '../../shared/time/civilDate.ts'
import { useFigures } from './useFigures.ts'
import type { RecordStock } from './useRecordStock.ts'

export interface ReadRow {
  name: string
  lot: string
  measure: string
  inAll: string
}

/** A plain field of the record: its label and its words, or what is said where none were written. */
export interface ReadWords {
  name: PlainName
  label: string
  words: string
  isLong: boolean
  isGiven: boolean
}

export interface ReadFact {
  name: string
  value: string
  /** What kind of value it is, or more about it. */
  note?: string
}

/** A record as a reader finds it: lines of text in the person's language and the farm's time; what is missing says so. */
export interface RecordReading {
  rows: ReadRow[]
  water: { source: string; measure: string; inAll: string }
  total: string
  over: string
  loads: string
  plain: ReadWords[]
  times: ReadFact[]
  people: ReadFact[]
  weather: ReadFact[]
}

/** The texts of one record's page. */
export function useRecordReading(record: Ref<ApplicationRecord | null>, stock: Ref<RecordStock>): ComputedRef<RecordReading | null> {
  const { t } = useI18n()
  const figures = useFigures()
  const unknown = (text: string): string => text || t('records.read.unknown')
  const zone = computed(() => stock.value.farm?.zone ?? 'UTC')
  const when = (instant: string | null): string => (instant === null ? '' : `${figures.day(civilDateIn(zone.value, instant))}, ${civilTimeIn(zone.value, instant)}`)

  function measureOf(basis: Basis): string {
    if (basis.kind === 'ratio') return t('records.mix.ratioSays', { parts: figures.plain(basis.parts) })
    return t(`records.mix.${basis.kind}Says`, { value: figures.plain(basis.value), unit: figures.unit(basis.unit) })
  }

  function rowsOf({ components, computed: sums }: ApplicationRecord): ReadRow[] {
    return components.map(({ materialId, lotId, basis }, index) => {
      const amount = sums.components[index]?.amount
      const lot = stock.value.lots.find(({ id }) => id === lotId)
      return {
        name: unknown(stock.value.materials.find(({ id }) => id === materialId)?.name ?? ''),
        lot: lot ? t('records.mix.lot', { code: lot.code }) : t('records.lots.none'),
        measure: measureOf(basis),
        inAll: amount ? `${figures.amount(amount.value)} ${figures.unit(amount.unit)}` : '',
      }
    })
  }

  function waterOf({ water, computed: { waterL } }: ApplicationRecord): RecordReading['water'] {
    if (water === null) return { source: '', measure: t('records.read.unknown'), inAll: '' }
    if (water.sizedFrom === 'none') return { source: '', measure: t('records.mix.none'), inAll: '' }
    const measure = water.sizedFrom === 'water' ? t('records.mix.typed') : t('records.mix.fromRate', { rate: figures.plain(water.value), unit: figures.unit(water.unit) })
    return { source: water.source ?? '', measure, inAll: figures.litres(waterL) }
  }

  function loadsOf({ loads }: ApplicationRecord['computed']): string {
    if (loads === null) return ''
    const last = figures.amount(loads.lastL)
    if (loads.full === 0) return t('records.sprayer.loadsPart', { last })
    return t(loads.lastL > 0 ? 'records.sprayer.loadsFullAndPart' : 'records.sprayer.loadsFull', { count: loads.full, last }, loads.full)
  }

  function timesOf({ lines, deviceAt, receivedAt, signedAt }: ApplicationRecord): ReadFact[] {
    const line = lines[0]
    const worked = line?.startedAt ? `${when(line.startedAt)}${line.endedAt ? ` – ${civilTimeIn(zone.value, line.endedAt)}` : ''}` : ''
    return [
      { name: t('records.read.worked'), value: unknown(worked), note: t('records.read.zone', { zone: zone.value }) },
      { name: t('records.read.device'), value: unknown(when(deviceAt)) },
      { name: t('records.read.server'), value: when(receivedAt) },
      { name: t('records.read.signed'), value: unknown(when(signedAt)) },
    ]
  }

  function weatherOf({ weather }: ApplicationRecord): ReadFact[] {
    const read = (name: 'wind' | 'air' | 'humidity', more = ''): ReadFact => {
      const value = weather?.[name]
      const kind = value ? { note: t(`records.weather.kind.${value.kind}`) } : {}
      return { name: t(`records.weather.${name}`), value: value ? `${figures.plain(value.value)} ${figures.unit(value.unit)}${more}` : t('records.weather.never'), ...kind }
    }
    const from = weather?.windFrom ? `, ${t('records.read.windFrom', { point: t(`records.weather.compass.${weather.windFrom}`) })}` : ''
    return [read('wind', from), read('air'), read('humidity')]
  }

  return computed(() => {
    const one = record.value
    if (one === null) return null
    const { totalL, sprayLPerHa, areaM2 } = one.computed
    return {
      rows: rowsOf(one),
      water: waterOf(one),
      total: figures.litres(totalL),
      over: sprayLPerHa === null ? '' : t('records.mix.sprayOver', { rate: figures.plain(Math.round(sprayLPerHa)), hectares: figures.hectares(areaM2) }),
      loads: loadsOf(one.computed),
      plain: PLAIN_FIELDS.map(({ name, isLong }) => ({
        name, isLong, label: t(`records.plain.${name}.label`), words: one[name] ?? t(`records.plain.${name}.none`), isGiven: one[name] !== null,
      })),
      times: timesOf(one),
      people: [
        { name: t('records.happened.doneBy'), value: unknown(one.doneBy?.name ?? '') },
        { name: t('records.happened.enteredBy'), value: unknown(one.enteredBy?.name ?? '') },
        { name: t('records.read.signed'), value: unknown(one.signedBy?.name ?? '') },
      ],
      weather: weatherOf(one),
    }
  })
}
