import { MASS_RATE_UNITS, MASS_UNITS, VOLUME_RATE_UNITS, VOLUME_UNITS } from '../../../shared/contract/quantity.ts'
import { useFigures } from '../app/useFigures.ts'

interface UnitOption {
  value: string
  label: string
}
type Measured = 'volume' | 'mass'

/** Units a person may choose for something measured by volume or by weight, with their words, the person's own measures first. */
export function useUnitOptions(): {
  amounts: (measuredIn: Measured) => UnitOption[]
  rates: (measuredIn: Measured) => UnitOption[]
} {
  const { units: optionsOf } = useFigures()
  return {
    amounts: (measuredIn) => optionsOf(measuredIn === 'volume' ? VOLUME_UNITS : MASS_UNITS),
    rates: (measuredIn) => optionsOf(measuredIn === 'volume' ? VOLUME_RATE_UNITS : MASS_RATE_UNITS),
  }
}
