import { useI18n } from 'vue-i18n'
import type { CalibrationInForce, Fitting } from '../../../shared/contract/calibration.ts'
import { calibrationStanding } from '../../../shared/mix/calibrationStanding.ts'
import { nominalFlow } from '../../../shared/mix/calibrationSheet.ts'
import { NOZZLE_SIZES, NOZZLES, type NozzleSize } from '../../../shared/mix/nozzleSizes.ts'
import { convertQuantity } from '../../../shared/units/convertQuantity.ts'
import { useFarmDay } from './useFarmDay.ts'
import { useFigures } from '../app/useFigures.ts'
import { formatDay } from '../../../shared/messages/formatDay.ts'

/** Flows of nozzle sizes are named at 3 bar (ISO 10625). */
const NOZZLE_BAR = 3

/** What is fitted to sprayers and how they were measured, in words. */
export function useSprayerWords(): {
  sizes: () => { value: NozzleSize; label: string }[]
  nozzle: (fitting: Fitting) => string
  /** What each nozzle should give as it is driven; empty where it is not known. */
  nominal: (fitting: Fitting) => string
  /** The two figures of a rate, the person's own measures first. */
  rates: (rateLPerHa: string) => [first: string, second: string]
  due: (calibration: Pick<CalibrationInForce, 'dueOn'>) => { words: string; standing: 'past' | 'soon' | 'ahead' }
  dayOf: (civilDate: string) => string
} {
  const { t } = useI18n()
  const figures = useFigures()
  const { today } = useFarmDay()
  const dayOf = (civilDate: string): string => formatDay(figures.language.value, civilDate)
  const flow = (figure: string): string => `${figure}\u00A0${figures.unitOf('L/min')}`
  const pressure = (bar: string | number | null): string => `${figures.plain(bar, 'bar')}\u00A0${figures.unitOf('bar')}`
  const sizeOf = (size: NozzleSize): string => t('sprayers.sizeOf', { size, colour: t(`sprayers.colour.${NOZZLES[size].colour}`), flow: flow(figures.plain(NOZZLES[size].flowLPerMin, 'L/min')), bar: pressure(NOZZLE_BAR) })

  return {
    sizes: () => NOZZLE_SIZES.map((value) => ({ value, label: sizeOf(value) })),
    nozzle: ({ nozzle }) => (nozzle === null ? '' : nozzle.kind === 'iso' ? sizeOf(nozzle.size) : nozzle.name),
    nominal: (fitting) => {
      const each = nominalFlow(fitting)
      return each === null ? '' : t('sprayers.nominalAt', { flow: flow(figures.fixed(each.toFixed(), 2, 'L/min')), bar: pressure(fitting.pressureBar) })
    },
    rates: (rateLPerHa) => {
      const metric = `${figures.rate(rateLPerHa)} ${figures.unit('L/ha')}`
      const us = `${figures.rate(convertQuantity({ value: rateLPerHa, unit: 'L/ha' }, 'galUS/acre'))} ${figures.unit('galUS/acre')}`
      return figures.reader.value.units === 'us' ? [us, metric] : [metric, us]
    },
    due: ({ dueOn }) => {
      const { standing } = calibrationStanding(dueOn, today.value ?? dueOn)
      return { standing, words: t(`sprayers.due.${standing}`, { day: dayOf(dueOn) }) }
    },
    dayOf,
  }
}
