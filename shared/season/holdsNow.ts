import type { LineHolds } from './lastHeldDay.ts'

/** What holds a block now: the latest of each that is still to come; never both null. */
export type Held = LineHolds

/**
 * Which blocks are held at an instant, by block. What is in no signed record, or set by no label that was written down, is not in it: a block
 * that is missing here is not known to be free.
 * @param holds lines of signed records, in any order. @param today the farm's civil day at that instant, YYYY-MM-DD.
 */
export function holdsNow(holds: readonly (LineHolds & { blockId: string })[], now: Date, today: string): Map<string, Held> {
  const found = new Map<string, Held>()
  for (const { blockId, reEntryUntil, pickFrom } of holds) {
    const entry = reEntryUntil !== null && Date.parse(reEntryUntil) > now.getTime() ? reEntryUntil : null
    const picking = pickFrom !== null && pickFrom > today ? pickFrom : null
    if (entry === null && picking === null) continue
    const before = found.get(blockId)
    found.set(blockId, { reEntryUntil: laterInstant(before?.reEntryUntil ?? null, entry), pickFrom: laterDay(before?.pickFrom ?? null, picking) })
  }
  return found
}

const laterInstant = (a: string | null, b: string | null): string | null => (a === null || (b !== null && Date.parse(b) > Date.parse(a)) ? b : a)
const laterDay = (a: string | null, b: string | null): string | null => (a === null || (b !== null && b > a) ? b : a)
