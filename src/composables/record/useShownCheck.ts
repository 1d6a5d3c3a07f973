import { checkFor } from '../../../shared/checks/checkFor.ts'
import type { Check } from '../../../shared/contract/record.ts'
import { usePreferences } from '../../stores/preferences.ts'

/** Checks with their figures in this person's measures. */
export function useShownCheck(): (check: Check) => Check {
  const preferences = usePreferences()
  return (check) => checkFor(check, preferences.units)
}
