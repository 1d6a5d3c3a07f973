import type { BlockLine, Counts } from '../contract/recordContent.ts'

/** What is counted on a line: as written, and the beds of a part that says from which bed to which. */
export function lineCounts({ counts, part }: Pick<BlockLine, 'counts' | 'part'>): Counts {
  if (part.kind !== 'beds' || counts.bed !== undefined) return counts
  return { ...counts, bed: String(part.to - part.from + 1) }
}
