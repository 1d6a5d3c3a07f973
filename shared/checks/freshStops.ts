import type { Check } from '../contract/record.ts'

/**
 * Stops that did not stand before, word for word, about the same line or ingredient: what was said of the others says nothing of these.
 * A lot that is short counts as any other; whoever compares over a ledger that others draw on as well leaves it out first.
 */
export function freshStops(now: readonly Check[], before: readonly Check[]): Check[] {
  const isStop = ({ verdict }: Check): boolean => verdict === 'stop'
  const stood = new Set(before.filter(isStop).map(asText))
  return now.filter(isStop).filter((stop) => !stood.has(asText(stop)))
}

/** Params in the order of their names: a check that was read from storage may have them in another one. */
function asText({ code, about, text }: Check): string {
  return JSON.stringify([code, about, text.id, Object.entries(text.params).sort(([one], [other]) => (one < other ? -1 : 1))])
}
