import * as Instant from 'temporal-polyfill/fns/Instant'
import { addDays } from '../time/calendar.ts'
import { civilDateIn } from '../time/civilDate.ts'
import { ExactDecimal } from '../units/exactDecimal.ts'
import type { FactMaterial } from './recordFacts.ts'

const HOUR_MS = 3_600_000

export interface Longest { material: FactMaterial; length: string }

/** The material whose label sets the longest of one interval, with that interval; null where none sets any. */
export function longestInterval(materials: readonly FactMaterial[], read: (material: FactMaterial) => string | null): Longest | null {
  let best: Longest | null = null
  for (const material of materials) {
    const length = read(material)
    if (length === null || new ExactDecimal(length).lte(0)) continue
    if (best === null || new ExactDecimal(length).gt(best.length)) best = { material, length }
  }
  return best
}

/** The longest re-entry interval on a label in the mix, hours. No label, no hold: an input with no interval has none by default. */
export function reEntryHold(materials: readonly FactMaterial[]): Longest | null {
  return longestInterval(materials, (material) => material.label?.reEntryHours ?? null)
}

/** The longest interval before harvest, whole days after the civil day the work ended. */
export function preHarvestHold(materials: readonly FactMaterial[]): Longest | null {
  return longestInterval(materials, (material) => material.label?.preHarvestDays?.toString() ?? null)
}

/** The instant from which one may go in again. @param hours plain decimal text. */
export function enterAgainAt(endedAt: string, hours: string): string {
  const heldMs = new ExactDecimal(hours).mul(HOUR_MS).ceil().toNumber()
  return Instant.toString(Instant.fromEpochMilliseconds(Date.parse(endedAt) + heldMs))
}

/** First civil day of the farm's zone for picking. */
export function pickAgainOn(endedAt: string, days: string, zone: string): string {
  return addDays(civilDateIn(zone, endedAt), Number(days))
}

/** The holds that follow on one line; null where no label sets one or the work has not ended. */
export function lineHolds(
  { endedAt }: { endedAt: string | null }, materials: readonly FactMaterial[], zone: string,
): { reEntryUntil: string | null; pickFrom: string | null } {
  const entry = reEntryHold(materials)
  const harvest = preHarvestHold(materials)
  return {
    reEntryUntil: endedAt && entry && enterAgainAt(endedAt, entry.length),
    pickFrom: endedAt && harvest && pickAgainOn(endedAt, harvest.length, zone),
  }
}
