import { words } from '../../../shared/checks/buildCheck.ts'
import type { Message } from '../../../shared/contract/common.ts'
import type { Held } from '../../../shared/season/holdsNow.ts'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'

/** "keep out until 19:36", with the day where it is not today's; "do not pick until 20 June". @param zone the farm's. @param today its civil day. */
export function heldWords({ reEntryUntil, pickFrom }: Held, zone: string, today: string): Message[] {
  const entry = reEntryUntil === null ? null : { untilTime: civilTimeIn(zone, reEntryUntil), untilOn: civilDateIn(zone, reEntryUntil) }
  return [
    ...(entry === null ? [] : [words(entry.untilOn === today ? 'blocks.held.keepOut' : 'blocks.held.keepOutOn', entry)]),
    ...(pickFrom === null ? [] : [words('blocks.held.doNotPick', { pickOn: pickFrom })]),
  ]
}
