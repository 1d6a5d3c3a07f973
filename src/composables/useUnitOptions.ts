import { useI18n } from 'vue-i18n'
import { MASS_RATE_UNITS, MASS_UNITS, VOLUME_RATE_UNITS, VOLUME_UNITS } from '../../shared/contract/quantity.ts'

interface UnitOption {
  value: string
  label: string
}
type Measured = 'volume' | 'mass'

/** Units a person may choose for something measured by volume or by weight, with their words. */
export function useUnitOptions(): {
  amounts: (measuredIn: Measured) => UnitOption[]
  rates: (measuredIn: Measured) => UnitOption[]
} {
  const { t } = useI18n()
  const optionsOf = (units: readonly string[]): UnitOption[] => units.map((value) => ({ value, label: t(`units.${value}`) }))
  return {
    amounts: (measuredIn) => optionsOf(measuredIn === 'volume' ? VOLUME_UNITS : MASS_UNITS),
    rates: (measuredIn) => optionsOf(measuredIn === 'volume' ? VOLUME_RATE_UNITS : MASS_RATE_UNITS),
  }
}
