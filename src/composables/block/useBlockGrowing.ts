import { computed, type ComputedRef } from 'vue'
import type { Bed } from '../../../shared/contract/bed.ts'
import type { Planting } from '../../../shared/contract/planting.ts'
import { growingApi } from '../../api/growingApi.ts'
import { bedLine, eventLine, harvestLines, plantingLine, type EventLine, type GrowingLine, type HarvestLine } from './growingWords.ts'
import type { BlocksPlace } from './useBlocksPlace.ts'
import { useSession } from '../../stores/session.ts'
import { useBlockRead } from './useBlockRead.ts'
import { useFarmDay } from '../farm/useFarmDay.ts'

/** What grows on a block, its beds and rows, and what else was done on it, in words. */
export interface BlockGrowing {
  plantings: ReturnType<typeof useBlockRead<Planting[]>>
  beds: ReturnType<typeof useBlockRead<Bed[]>>
  events: ReturnType<typeof useBlockRead<Awaited<ReturnType<typeof growingApi.events>>>>
  plantingLines: ComputedRef<GrowingLine[]>
  bedLines: ComputedRef<GrowingLine[]>
  eventLines: ComputedRef<EventLine[]>
  /** Planned harvests that end today or later. */
  harvests: ComputedRef<HarvestLine[]>
  /** Events that this person may take back: their own, a leader any; none that was taken back already. */
  mayTakeBack: ComputedRef<ReadonlySet<string>>
  /** The farm's civil day; null until the farm is read. */
  today: ComputedRef<string | null>
}

export function useBlockGrowing(id: () => string, { language, reader }: BlocksPlace): BlockGrowing {
  const plantings = useBlockRead('plantings', id, growingApi.plantings)
  const beds = useBlockRead('beds', id, growingApi.beds)
  const events = useBlockRead('farm-events', id, growingApi.events)
  const { today } = useFarmDay()
  const session = useSession()
  /** What is past stands below what is there. */
  const standingFirst = <Line extends GrowingLine>(lines: Line[]): Line[] => [...lines.filter(({ isPast }) => !isPast), ...lines.filter(({ isPast }) => isPast)]
  return {
    plantings, beds, events, today,
    plantingLines: computed(() => standingFirst((plantings.data.value ?? []).map((planting) => plantingLine(language.value, planting)))),
    bedLines: computed(() => standingFirst((beds.data.value ?? []).map((bed) => bedLine(reader.value, bed)))),
    eventLines: computed(() => (events.data.value ?? []).map((event) => eventLine(language.value, event))),
    mayTakeBack: computed(() => new Set((events.data.value ?? [])
      .filter(({ withdrawn, by }) => withdrawn === null && session.canRecord && (session.canManage || by.id === session.membership?.personId))
      .map(({ id: eventId }) => eventId))),
    harvests: computed(() => (today.value === null ? [] : harvestLines(language.value, plantings.data.value ?? [], today.value))),
  }
}
