import type { Hold } from '../contract/hold.ts'
import { compareCodes } from '../records/compareCodes.ts'
import { holdsNow } from '../season/holdsNow.ts'

/** Blocks that are held alike: by the same records, until the same time. */
export interface HoldInForce {
  key: string
  kind: 'entry' | 'picking'
  blocks: { id: string; code: string }[]
  /** Instant before which nobody goes in, or first civil day for picking. */
  until: string
  /** Instant from which it runs: when the work ended, the earliest of several. */
  from: string
  /** Records whose labels say so. */
  records: { id: string; number: string }[]
}

const UNTIL = { entry: 'reEntryUntil', picking: 'pickFrom' } as const
const KINDS = ['entry', 'picking'] as const

/**
 * What holds the farm's blocks at an instant: keeping out before picking, what ends first before what ends later. Of several holds of a
 * kind on a block the last to end is in force. A block that is in none is not known to be free (`holdsNow`).
 * @param holds lines of signed records, in any order. @param today the farm's civil day at that instant. @param blocks those that may be named;
 * what holds others is left out.
 */
export function holdsInForce(holds: readonly Hold[], now: Date, today: string, blocks: readonly { id: string; code: string }[]): HoldInForce[] {
  const held = holdsNow(holds, now, today)
  return KINDS.flatMap((kind) => {
    const alike = new Map<string, HoldInForce>()
    for (const block of blocks.toSorted((a, b) => compareCodes(a.code, b.code))) {
      const until = held.get(block.id)?.[UNTIL[kind]] ?? null
      if (until === null) continue
      const setting = holds.filter((hold) => hold.blockId === block.id && isSame(hold[UNTIL[kind]], until))
      add(alike, { kind, until, setting, block: { id: block.id, code: block.code } })
    }
    return [...alike.values()].sort((a, b) => Date.parse(a.until) - Date.parse(b.until))
  })
}

function add(alike: Map<string, HoldInForce>, { kind, until, setting, block }: Pick<HoldInForce, 'kind' | 'until'> & { setting: readonly Hold[]; block: HoldInForce['blocks'][number] }): void {
  const records = new Map(setting.map(({ recordId, number }) => [recordId, number]))
  const from = setting.map((hold) => hold.from).reduce((a, b) => (Date.parse(b) < Date.parse(a) ? b : a))
  const key = [kind, Date.parse(until), ...[...records.keys()].sort()].join(' ')
  const known = alike.get(key)
  if (known === undefined) alike.set(key, { key, kind, blocks: [block], until, from, records: [...records].map(([id, number]) => ({ id, number })) })
  else Object.assign(known, { blocks: [...known.blocks, block], from: Date.parse(from) < Date.parse(known.from) ? from : known.from })
}

/** Whether both are the same day or instant, whatever offsets they are written in. */
const isSame = (one: string | null, other: string): boolean => one !== null && Date.parse(one) === Date.parse(other)

/**
 * How much of a hold is over at an instant, 0 to 1.
 * @param until the instant at which it ends; of a first day for picking, the start of that day on the farm.
 */
export function holdSpent(from: string, until: string, now: Date): number {
  const [start, end] = [Date.parse(from), Date.parse(until)]
  return end <= start ? 1 : Math.min(1, Math.max(0, (now.getTime() - start) / (end - start)))
}
