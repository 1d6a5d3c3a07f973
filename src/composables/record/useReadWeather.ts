import { useI18n } from 'vue-i18n'
import type { ApplicationRecord } from '../../../shared/contract/record.ts'
import { readingUnit } from '../../../shared/units/readingUnit.ts'
import type { UnitCode } from '../../../shared/units/unitTable.ts'
import { useFigures } from '../app/useFigures.ts'
import type { ReadFact } from './readFact.ts'

/** The weather of a record: what was read as it was read, with what that is in the reader's measures; and what follows from the air. */
export function useReadWeather(): (record: Pick<ApplicationRecord, 'weather' | 'computed'>) => ReadFact[] {
  const { t } = useI18n()
  const figures = useFigures()

  /** "= 3.8 mph": what was read in other measures than the reader's. */
  function inOwn({ value, unit }: { value: string; unit: string }): string {
    const code = unit === '%' ? undefined : (unit as UnitCode)
    if (code === undefined || readingUnit(code, figures.reader.value.units) === code) return ''
    return t('common.same', { value: figures.fixed(value, 1, code), unit: figures.unitOf(code) })
  }

  return ({ weather, computed: { air } }) => {
    const read = (name: 'wind' | 'air' | 'humidity', more = ''): ReadFact => {
      const value = weather?.[name]
      const kind = value ? { note: [t(`records.weather.kind.${value.kind}`), inOwn(value)].filter((words) => words !== '').join(', ') } : {}
      return { name: t(`records.weather.${name}`), value: value ? `${figures.plain(value.value)} ${figures.unit(value.unit)}${more}` : t('records.weather.never'), ...kind }
    }
    const from = weather?.windFrom ? `, ${t('recordRead.windFrom', { point: t(`records.weather.compass.${weather.windFrom}`) })}` : ''
    const derived = (name: 'wetBulbC' | 'deltaTC' | 'dewPointC', method: 'stull' | 'psychrometer'): ReadFact => {
      const unit = name === 'deltaTC' ? 'diffC' : 'degC'
      return { name: t(`versions.read.${name}`), value: `${figures.fixed(air?.[name] ?? 0, 1, unit)} ${figures.unitOf(unit)}`, note: t(`versions.read.${method}`) }
    }
    return [read('wind', from), read('air'), read('humidity'), ...(air ? (['wetBulbC', 'deltaTC', 'dewPointC'] as const).map((name) => derived(name, air.method)) : [])]
  }
}
