import { civilDateIn } from '../time/civilDate.ts'
import type { RecordFacts } from './recordFacts.ts'

/** The civil day of use: of the first start written, else of the judgement. */
export function dayOfUse({ content, zone, now }: Pick<RecordFacts, 'content' | 'zone' | 'now'>): string {
  const starts = content.lines.map((line) => line.startedAt).filter((start) => start !== null)
  const first = starts.reduce<string | null>((early, start) => (early === null || Date.parse(start) < Date.parse(early) ? start : early), null)
  return civilDateIn(zone, first ?? now)
}
