import type { Check } from '../contract/record.ts'
import { canonicalText } from '../evidence/canonicalText.ts'

/**
 * Stops that did not stand before, word for word, about the same line or ingredient: what was said of the others says nothing of these.
 */
export function freshStops(now: readonly Check[], before: readonly Check[]): Check[] {
  const isStop = ({ verdict }: Check): boolean => verdict === 'stop'
  const stood = new Set(before.filter(isStop).map(asText))
  return now.filter(isStop).filter((stop) => !stood.has(asText(stop)))
}

const asText = ({ code, about, text }: Check): string => canonicalText({ code, about, text })
