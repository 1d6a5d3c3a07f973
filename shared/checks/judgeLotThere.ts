import type { Check } from '../contract/record.ts'
import { buildCheck, words } from './buildCheck.ts'
import type { FactLot, FactMaterial } from './recordFacts.ts'

/**
 * A lot that was used before it was there: the day of the work, the lot or the day it came is wrong. A caution, since the work itself
 * may be right.
 * @param usedOn `dayOfUse`. @returns null where the lot was there.
 */
export function judgeLotThere(usedOn: string, lot: FactLot, material: FactMaterial, about: string): Check | null {
  if (usedOn >= lot.receivedOn) return null
  return buildCheck({
    code: 'lot.notThere', verdict: 'caution', rests: 'house', about,
    title: words('checks.lotThere.title', { lot: lot.code }), text: words('checks.lotThere.later', { material: material.name, usedOn, receivedOn: lot.receivedOn }),
  })
}
