import { EACH, type Each } from '../../../shared/contract/each.ts'
import type { RecordDraft } from './recordDraft.ts'

/** What the mix is sized or measured by, counted on each line. */
export function askedFor({ method, water, components }: RecordDraft): Each[] {
  const isSizedBy = (each: Each): boolean => (method !== 'solid' && water.sizedFrom === 'perEach' && water.each === each) || components.some((one) => one.kind === 'perEach' && one.each === each)
  return EACH.filter(isSizedBy)
}
