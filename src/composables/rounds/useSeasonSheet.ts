import { keepPreviousData, useQuery } from '@tanstack/vue-query'
import { computed, ref, type ComputedRef, type Ref } from 'vue'
import type { Block } from '../../../shared/contract/block.ts'
import type { Job, SeasonSheet } from '../../../shared/contract/job.ts'
import type { SeasonPlan } from '../../../shared/contract/seasonPlan.ts'
import { openStateOn } from '../../../shared/rounds/openStateOn.ts'
import { lastHeldDay } from '../../../shared/season/lastHeldDay.ts'
import { seasonSpan, type SeasonSpan } from '../../../shared/season/seasonStrip.ts'
import type { SheetMarks } from '../../../shared/season/sheetPaths.ts'
import type { Command } from '../../api/commandTypes.ts'
import { roundApi } from '../../api/roundApi.ts'
import { useOutbox } from '../../stores/outbox.ts'
import { useSession } from '../../stores/session.ts'
import { readThrough } from '../app/readThrough.ts'
import { useBlocks } from '../block/useBlocks.ts'
import { useFarm } from '../farm/useFarm.ts'
import { useFarmRead } from '../farm/useFarmRead.ts'

/** A job; `isKept`: what was decided of it waits on this device for signal. */
export interface SheetJob extends Job { isKept: boolean }

export type SheetWork = SeasonSheet['works'][number] & { heldTo: string | null }

/** A block's row of the sheet: what is on it. */
export interface SheetRow {
  block: Block
  jobs: SheetJob[]
  works: SheetWork[]
  harvests: { from: string; to: string }[]
  /** Another kind of block begins: a firmer line over it. */
  isFirstOfKind: boolean
}

export interface Sheet {
  query: { isError: Ref<boolean>; error: Ref<Error | null>; refetch: () => unknown }
  ready: ComputedRef<boolean>
  season: ComputedRef<number | null>
  turn: (seasons: number) => void
  span: ComputedRef<SeasonSpan | null>
  today: ComputedRef<string | null>
  rows: ComputedRef<SheetRow[]>
  marks: ComputedRef<SheetMarks>
  plans: ComputedRef<SeasonPlan[]>
  /** Empty: all of them. */
  planId: Ref<string>
  /** All jobs of the span, whichever plan is shown. */
  jobs: ComputedRef<SheetJob[]>
}

/** Plans of the farm; a certifier may not read them and does not ask. */
export function usePlans(): ReturnType<typeof useFarmRead<SeasonPlan[]>> {
  const session = useSession()
  return useFarmRead('season-plans', () => session.farmId, (id) => roundApi.plans(id), () => session.isOfFarm)
}

/** A season of the open farm as its sheet shows it. */
export function useSeasonSheet(): Sheet {
  const session = useSession()
  const { data: farm } = useFarm(() => session.farmId)
  const { data: blocks } = useBlocks(() => session.farmId)
  const plans = usePlans()
  const turned = ref(0)
  const planId = ref('')
  const season = computed(() => (farm.value === undefined ? null : farm.value.currentSeason + turned.value))
  const span = computed(() => (farm.value === undefined || season.value === null ? null : seasonSpan(season.value, farm.value.seasonStart)))
  const farmId = computed(() => session.farmId)
  const from = computed(() => span.value?.from ?? '')
  const query = useQuery({
    queryKey: ['season-sheet', farmId, from],
    enabled: () => span.value !== null && session.isOfFarm,
    placeholderData: keepPreviousData,
    queryFn: () => {
      const asked = span.value ?? { from: '', to: '' }
      return readThrough(`${session.farmId}/season-sheet/${asked.from}`, session.user?.id ?? '', () => roundApi.sheet(session.farmId, asked))
    },
  })
  const kept = useKeptDecisions()
  const here = computed(() => ({ today: query.data.value?.today ?? '', by: { id: session.membership?.personId ?? '', name: session.user?.name ?? '' } }))
  const jobs = computed(() => (query.data.value?.jobs ?? []).map((job) => asKept(job, kept.value.get(job.id), here.value)))
  const shown = computed(() => (planId.value === '' ? jobs.value : jobs.value.filter((job) => job.planId === planId.value)))
  const works = computed<SheetWork[]>(() => (query.data.value?.works ?? []).map((work) => ({ ...work, heldTo: heldTo(work, farm.value?.zone ?? 'UTC') })))

  const rows = computed<SheetRow[]>(() => (blocks.value ?? []).map((block, index, all) => ({
    block,
    jobs: shown.value.filter(({ blockId }) => blockId === block.id),
    works: works.value.filter(({ blockId }) => blockId === block.id),
    harvests: (query.data.value?.harvests ?? []).filter(({ blockId }) => blockId === block.id),
    isFirstOfKind: index > 0 && kindOf(block) !== kindOf(all[index - 1]),
  })))
  return {
    query, season, span, rows, planId, jobs,
    ready: computed(() => query.data.value !== undefined && blocks.value !== undefined && plans.data.value !== undefined),
    turn: (seasons) => { turned.value += seasons },
    today: computed(() => query.data.value?.today ?? null),
    plans: computed(() => plans.data.value ?? []),
    marks: computed(() => ({
      works: rows.value.flatMap((row, index) => row.works.map((work) => ({ ...work, row: index }))),
      jobs: rows.value.flatMap((row, index) => row.jobs.map((job) => ({ ...job, row: index }))),
      harvests: rows.value.flatMap((row, index) => row.harvests.map((harvest) => ({ ...harvest, row: index }))),
    })),
  }
}

/** What this device decided of a job without signal: the day it was moved to, null for its target; the reason of a skip, null where one was taken back. */
export interface KeptDecision { to?: string | null; skip?: string | null }

/** What waits on this device for signal, by job; of two decisions on one thing the later. */
function useKeptDecisions(): ComputedRef<ReadonlyMap<string, KeptDecision>> {
  const outbox = useOutbox()
  return computed(() => {
    const kept = new Map<string, KeptDecision>()
    for (const { command } of outbox.waiting) {
      const decided = decisionOf(command)
      if (decided !== null) kept.set(command.id, { ...kept.get(command.id), ...decided })
    }
    return kept
  })
}

function decisionOf(command: Command): KeptDecision | null {
  switch (command.kind) {
    case 'job.move': return { to: (command as Command<'job.move'>).body.to }
    case 'job.skip': return { skip: (command as Command<'job.skip'>).body.reason }
    case 'job.unskip': return { skip: null }
    default: return null
  }
}

/** A job as it was decided on this device: its window stays the one that the farm knows. @param by who decides here. */
export function asKept(job: Job, kept: KeptDecision | undefined, { today, by }: { today: string; by: { id: string; name: string } }): SheetJob {
  if (kept === undefined) return { ...job, isKept: false }
  const { to, skip } = kept
  const moved = to === undefined ? job : { ...job, plannedOn: to ?? job.targetOn, isMoved: to !== null }
  if (skip === undefined) return { ...moved, isKept: true }
  if (skip === null) return { ...moved, isKept: true, skip: null, state: openStateOn(today, moved) }
  return { ...moved, isKept: true, state: 'skipped', skip: { reason: skip, by, at: '' } }
}

/** Blocks are coded by kind: A1, A2, then P1. */
const kindOf = (block: Block | undefined): string => /^\p{L}*/u.exec(block?.code ?? '')?.[0] ?? ''

/** Last civil day on which the label of what was put on keeps people out or picking back; null where it does neither beyond the day itself. */
function heldTo(work: SeasonSheet['works'][number], zone: string): string | null {
  const last = lastHeldDay(work, zone)
  return last === null || last <= work.on ? null : last
}
