import { addDays } from '../time/calendar.ts'
import { civilDateIn } from '../time/civilDate.ts'

/** What the labels in a mix set for one line of a signed record; null where none sets it. */
export interface LineHolds {
  /** Nobody goes in before this instant. */
  reEntryUntil: string | null
  /** First civil day for picking. */
  pickFrom: string | null
}

/**
 * The last civil day on which a line keeps people out or picking back, for all of it or in part.
 * @param zone the farm's IANA zone. @returns YYYY-MM-DD; null where no label sets either.
 */
export function lastHeldDay({ reEntryUntil, pickFrom }: LineHolds, zone: string): string | null {
  const days = [...(pickFrom === null ? [] : [addDays(pickFrom, -1)]), ...(reEntryUntil === null ? [] : [civilDateIn(zone, reEntryUntil)])]
  return days.sort().at(-1) ?? null
}
