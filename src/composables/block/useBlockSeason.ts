import { computed, type ComputedRef } from 'vue'
import { useI18n } from 'vue-i18n'
import type { Job } from '../../../shared/contract/job.ts'
import type { Method } from '../../../shared/contract/recordContent.ts'
import { formatDayShort } from '../../../shared/messages/formatDayShort.ts'
import { seasonSpan, type SeasonSpan } from '../../../shared/season/seasonStrip.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { holdApi } from '../../api/holdApi.ts'
import type { BlockGrowing } from './useBlockGrowing.ts'
import type { BlocksPlace } from './useBlocksPlace.ts'
import { useBlockRead } from './useBlockRead.ts'
import { useRecords } from '../register/useRecords.ts'

/** Work of a season as a mark on its strip. */
export interface StripWork { id: string; on: string; method: Method; signed: boolean; words: string }
/** A job that waits, or the next one, over the days it may be done. */
export interface StripJob { id: string; from: string; to: string; state: Job['state']; words: string }
export interface StripEvent { id: string; on: string; words: string }

/** One block's season as its strip shows it. */
export interface BlockSeason {
  records: ReturnType<typeof useRecords>
  season: ComputedRef<number | null>
  span: ComputedRef<SeasonSpan | null>
  works: ComputedRef<StripWork[]>
  events: ComputedRef<StripEvent[]>
  jobs: ComputedRef<StripJob[]>
  harvests: ComputedRef<{ id: string; from: string; to: string }[]>
  holds: ComputedRef<{ id: string; from: string; to: string; words: string }[]>
  /** "9 records". */
  count: ComputedRef<string>
  /** The strip in one sentence. */
  spoken: ComputedRef<string>
}

/** A season holds fewer records of one block than this. */
const MOST_RECORDS = 200

/** @param openJobs those of the block that are still to be done. */
export function useBlockSeason(block: () => { id: string; code: string }, { farm, farmId, language }: BlocksPlace, growing: BlockGrowing, openJobs: () => readonly Job[]): BlockSeason {
  const { t } = useI18n()
  const season = computed(() => farm.value?.currentSeason ?? null)
  const span = computed(() => (farm.value === null ? null : seasonSpan(farm.value.currentSeason, farm.value.seasonStart)))
  const records = useRecords(farmId, computed(() => ({ block: block().id, limit: MOST_RECORDS, ...(season.value !== null && { season: season.value }) })))
  const works = computed(() => (records.data.value?.pages[0]?.items ?? []).flatMap(({ id: recordId, state, method, startedAt, number, preparations }): StripWork[] => {
    if (state === 'withdrawn' || startedAt === null || farm.value === null) return []
    const on = civilDateIn(farm.value.zone, startedAt)
    const words = [number ?? t('blocks.page.started'), formatDayShort(language.value, on), preparations.join(', ')].filter((part) => part !== '').join(', ')
    return [{ id: recordId, on, method, signed: state === 'signed', words }]
  }))
  const spanKey = computed(() => (span.value === null ? '' : block().id))
  const held = useBlockRead('block-holds', spanKey, (ofFarm, blockId) => holdApi.ofBlock(ofFarm, blockId, span.value ?? { from: '', to: '' }))
  const holds = computed(() => (held.data.value ?? []).map(({ recordId, number, on, heldTo }, index) => ({
    id: `${recordId} ${index}`, from: on, to: heldTo, words: t('growing.season.held', { number, from: formatDayShort(language.value, on), to: formatDayShort(language.value, heldTo) }),
  })))
  const inSpan = ({ on }: { on: string }): boolean => span.value !== null && on >= span.value.from && on <= span.value.to
  const events = computed(() => (growing.events.data.value ?? []).filter((event) => event.withdrawn === null && inSpan(event))
    .map(({ id: eventId, kind, on }) => ({ id: eventId, on, words: `${t(`growing.events.kindOf.${kind}`)}, ${formatDayShort(language.value, on)}` })))
  const harvests = computed(() => (growing.plantings.data.value ?? []).filter(({ removedOn }) => removedOn === null)
    .flatMap((planting) => planting.harvests.map(({ from, to }, index) => ({ id: `${planting.id}-${index}`, from, to })))
    .filter(({ from, to }) => span.value !== null && to >= span.value.from && from <= span.value.to))
  const jobs = computed(() => openJobs().map((job): StripJob => ({
    id: job.id, state: job.state,
    from: job.plannedOn < job.earliestOn ? job.plannedOn : job.earliestOn,
    to: job.plannedOn > job.latestOn ? job.plannedOn : job.latestOn,
    words: [t(`rounds.state.${job.state}`), job.preparation, formatDayShort(language.value, job.plannedOn)].join(', '),
  })))
  const count = computed(() => t('growing.season.records', { count: works.value.length }, works.value.length))
  return {
    records, season, span, works, events, harvests, holds, jobs, count,
    spoken: computed(() => [t('growing.season.spoken', {
      season: season.value ?? '', code: block().code, records: count.value,
      events: t('growing.season.events', { count: events.value.length }, events.value.length),
      harvests: t('growing.season.harvests', { count: harvests.value.length }, harvests.value.length),
    }), ...holds.value.map(({ words }) => words), ...jobs.value.map(({ words }) => words)].join('; ')),
  }
}
