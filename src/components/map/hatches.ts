import type { MapMarks } from '../../composables/map/useMapMarks.ts'

/** Hatches from the lowest up: a hold lies over the work that it follows. */
export const HATCHES = ['drench', 'foliar', 'hold'] as const
export type Hatch = (typeof HATCHES)[number]

/** What a block is hatched with. */
export function hatchesOf(blockId: string, { work, holds }: Pick<MapMarks, 'work' | 'holds'>): Hatch[] {
  const done = work.get(blockId)
  return HATCHES.filter((hatch) => (hatch === 'hold' ? holds.has(blockId) : done?.[hatch] === true))
}
