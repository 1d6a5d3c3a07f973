import { computed, shallowRef, watch, type ComputedRef } from 'vue'
import type { Job } from '../../../shared/contract/job.ts'
import type { Held } from '../../../shared/season/holdsNow.ts'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import { useSession } from '../../stores/session.ts'
import { recentWork, type RecentWork } from './recentWork.ts'
import type { MapBlock } from './mapTypes.ts'
import { keepSame } from '../app/keepSame.ts'
import { useClock } from '../app/useClock.ts'
import { useHolds } from '../block/useHolds.ts'
import { useJobsWaiting } from '../rounds/useJobsWaiting.ts'
import { useRecords } from '../register/useRecords.ts'

/** What the map draws on the blocks: the work of the last days, what holds them, jobs that wait, and a line inside the outline of those that are not certified. */
export interface MapMarks {
  work: ReadonlyMap<string, RecentWork>
  /** Blocks that a label keeps people out of, or picking back from, now. */
  holds: ReadonlyMap<string, Held>
  /** By block: late where one of its jobs is. */
  jobs: ReadonlyMap<string, 'due' | 'late'>
  inner: ReadonlyMap<string, { line: Boundary; status: 'transition' | 'uncertified' }>
}

/** More records than this of three days would not be told apart on a map. */
const MOST_RECORDS = 100
/** How far inside the outline the line lies. */
const INSIDE_M = 5

/** @param isWanted whether there are blocks to be marked at all. */
export function useMapMarks(blocks: () => readonly MapBlock[], isWanted: () => boolean): ComputedRef<MapMarks> {
  const session = useSession()
  const { time } = useClock()
  const records = useRecords(() => (isWanted() ? session.farmId : ''), { limit: MOST_RECORDS })
  const waiting = useJobsWaiting(isWanted)
  const holds = useHolds(isWanted)
  const inner = shallowRef<MapMarks['inner']>(new Map())
  const marked = computed(() => blocks().flatMap((block) => (block.land?.status === 'transition' || block.land?.status === 'uncertified' ? [{ ...block, status: block.land.status }] : [])))

  watch(marked, async (list) => {
    if (list.length === 0) {
      inner.value = new Map()
      return
    }
    const { insetBoundary } = await import('../../../shared/geo/insetBoundary.ts')
    if (marked.value !== list) return
    inner.value = new Map(list.flatMap(({ id, geometry, status }) => {
      const line = insetBoundary(geometry, INSIDE_M)
      return line === null ? [] : [[id, { line, status }] as const]
    }))
  }, { immediate: true })

  const work = computed<MapMarks['work']>((before) => keepSame(before, recentWork(records.data.value?.pages[0]?.items ?? [], time.value)))
  const jobs = computed(() => jobsByBlock(waiting.data.value ?? []))
  return computed(() => ({ work: work.value, holds: holds.now.value, jobs: jobs.value, inner: inner.value }))
}

/** How the most urgent job of each block stands. */
export function jobsByBlock(waiting: readonly Pick<Job, 'blockId' | 'state'>[]): MapMarks['jobs'] {
  const late = new Set(waiting.filter(({ state }) => state === 'late').map(({ blockId }) => blockId))
  return new Map(waiting.map(({ blockId }) => [blockId, late.has(blockId) ? 'late' : 'due']))
}

export const NO_MARKS: MapMarks = { work: new Map(), holds: new Map(), jobs: new Map(), inner: new Map() }
