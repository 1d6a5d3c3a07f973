import type { Check } from '../../../shared/contract/record.ts'
import type { Sprayer } from '../../../shared/contract/farm.ts'

const message = (id: string): Check['title'] => ({ id, params: {} })

/** What is in force on a farm, and what nobody has set: not known is not a pass. */
export function farmChecks(sprayers: readonly Sprayer[] | undefined): Check[] {
  const law: Check = {
    code: 'farm.no_rules', verdict: 'unknown', rests: 'law', figure: null, source: null, band: null, about: null,
    title: message('farm.checks.law.title'), text: message('farm.checks.law.text'),
  }
  const house: Check = {
    code: 'farm.no_sprayer', verdict: 'caution', rests: 'house', figure: null, source: null, band: null, about: null,
    title: message('farm.checks.sprayer.title'), text: message('farm.checks.sprayer.text'),
  }
  return sprayers !== undefined && sprayers.length === 0 ? [law, house] : [law]
}
