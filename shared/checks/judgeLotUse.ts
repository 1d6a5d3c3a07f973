import type { Check } from '../contract/record.ts'
import { buildCheck, words } from './buildCheck.ts'
import { labelSource } from './labelSource.ts'
import type { FactLot, FactMaterial } from './recordFacts.ts'

/**
 * Whether a lot is used by its date. Past it, a bought lot of a labelled material is a stop, since the label is the law; any other
 * lot is a caution, since the date is the farm's own.
 * @param usedOn `dayOfUse`. @returns null where the lot has no such date.
 */
export function judgeLotUse(usedOn: string, lot: FactLot, material: FactMaterial, about: string): Check | null {
  if (lot.expiresOn === null) return null
  const rests = lot.origin === 'bought' && material.label !== null ? 'label' : 'house'
  const isPast = usedOn > lot.expiresOn
  const late = rests === 'label' ? 'stop' : 'caution'
  return buildCheck({
    code: 'lot.pastUse',
    verdict: isPast ? late : 'pass',
    rests,
    title: words('checks.lotUse.title', { lot: lot.code }),
    text: words(isPast ? 'checks.lotUse.past' : 'checks.lotUse.within', { material: material.name, expiresOn: lot.expiresOn }),
    source: rests === 'label' ? labelSource(material) : null,
    about,
  })
}
