import { computed, type ComputedRef } from 'vue'
import { dayLine, type DaySentence } from '../../../shared/today/dayLine.ts'
import { partOpenWork, type OpenWork } from '../../../shared/today/openWork.ts'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import type { Job } from '../../../shared/contract/job.ts'
import type { Block, Boundary } from '../../../shared/contract/block.ts'
import type { RegisterRow } from '../../../shared/contract/record.ts'
import type { Method } from '../../../shared/contract/recordContent.ts'
import { lastOnBlocks } from '../../../shared/register/lastOnBlocks.ts'
import type { RegisterLine } from '../../../shared/register/registerLine.ts'
import { toDayNumber } from '../../../shared/time/dayNumber.ts'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { useSession } from '../../stores/session.ts'
import { useBlocks } from '../block/useBlocks.ts'
import { useJobsWaiting } from '../rounds/useJobsWaiting.ts'
import { useInputs, type Inputs } from '../input/useInputs.ts'
import type { LotLine } from '../input/useLotWords.ts'
import { usePeople } from '../people/usePeople.ts'
import { useHoldsToday, type HoldsToday } from './useHoldsToday.ts'
import { useRecords } from '../register/useRecords.ts'
import { unsentDrafts, useRegisterLines } from '../register/useRegisterLines.ts'

/** Lots that end this soon are named in the day line. */
const LINE_DAYS = 7

/** One block with the last work on it in words. */
export interface BlockLine {
  block: Block
  last: { method: Method; preparation: string; day: string } | null
}

/** A record whose newest version was signed today. */
export interface DoneLine { line: RegisterLine; signedAt: string; workOf: string }

export interface Today {
  /** "Tuesday 16 June" at the farm; empty until the farm is read. */
  title: ComputedRef<string>
  sentences: ComputedRef<DaySentence[]>
  /** Started records and drafts of this device, the reader's own apart from those of others. */
  open: ComputedRef<OpenWork>
  openCount: ComputedRef<number>
  /** Versions signed today, withdrawals among them, whenever the work was: its day in words, empty where that is today. */
  doneLines: ComputedRef<DoneLine[]>
  endingLots: ComputedRef<LotLine[]>
  /** The last work on each block among the rows that were read, longest ago first. */
  blockLines: ComputedRef<BlockLine[]>
  /** How many rows that was. */
  rowsRead: ComputedRef<number>
  outlines: ComputedRef<ReadonlyMap<string, Boundary>>
  inputs: Inputs
  held: HoldsToday
  newest: ReturnType<typeof useRecords>
  /** Records and the farm whose day it is have been read: without them nothing can be said to be none. */
  isRead: ComputedRef<boolean>
  /** Everything the day line speaks of has been read. */
  ready: ComputedRef<boolean>
}

/** What the day holds on the open farm: begun, signed today, ending. */
export function useToday(): Today {
  const session = useSession()
  const preferences = usePreferences()
  const farmId = computed(() => session.farmId)
  const newest = useRecords(farmId, { limit: 200 })
  const started = useRecords(farmId, { limit: 50, state: 'started' })
  const inputs = useInputs()
  const { place, draftLines, present, outlines } = useRegisterLines()
  const jobs = useJobsWaiting()
  const held = useHoldsToday()
  const { today } = inputs
  const { data: blocks } = useBlocks(farmId)
  const { data: people } = usePeople(farmId)

  const rowsOf = (read: ReturnType<typeof useRecords>): RegisterRow[] => read.data.value?.pages.flatMap(({ items }) => items) ?? []
  const startedLines = computed(() => present(rowsOf(started)))
  const doneLines = computed(() => {
    const zone = place.value?.zone
    if (zone === undefined || today.value === null) return []
    const signed = rowsOf(newest).flatMap((row) => (row.signedAt === null ? [] : [{ row, at: row.signedAt }]))
    return signed
      .filter(({ at }) => civilDateIn(zone, at) === today.value)
      .sort((one, other) => Date.parse(other.at) - Date.parse(one.at))
      .flatMap(({ row, at }) => present([row]).map((line) => ({ line, signedAt: civilTimeIn(zone, at), workOf: row.startedAt === null || civilDateIn(zone, row.startedAt) === today.value ? '' : line.day })))
  })
  const endingLots = computed(() => inputs.lotLines.value.filter(({ standing }) => isEnding(standing)))

  /** As it stands in records; the account's own name until the people are read. */
  const ownName = computed(() => people.value?.find(({ id }) => id === session.membership?.personId)?.name ?? session.user?.name ?? '')
  const deviceLines = computed(() => unsentDrafts(draftLines.value, [...rowsOf(started), ...rowsOf(newest)]))
  const open = computed(() => partOpenWork([...startedLines.value, ...deviceLines.value], ownName.value))
  const blockLines = computed(() => lastOnBlocks(blocks.value ?? [], rowsOf(newest)).map(({ block, row }) => {
    const [line] = row === null ? [] : present([row])
    if (row === null || line === undefined) return { block, last: null }
    return { block, last: { method: row.method, preparation: line.preparation, day: line.day } }
  }))

  const isRead = computed(() => place.value !== null && newest.data.value !== undefined && started.data.value !== undefined)
  /** By the days since the last on which it could be done. */
  const lateJobs = computed(() => {
    const now = today.value
    if (now === null) return []
    const daysLate = ({ latestOn, plannedOn }: Job): number => toDayNumber(now) - toDayNumber(plannedOn > latestOn ? plannedOn : latestOn)
    return (jobs.data.value ?? []).filter(({ state }) => state === 'late').map((job) => ({ code: job.blockCode, days: daysLate(job) })).sort((a, b) => b.days - a.days)
  })

  /** The time on the farm, with its day where that is not today. */
  const untilWords = (instant: string): { time: string; day: string | null } => {
    const zone = place.value?.zone ?? 'UTC'
    const day = civilDateIn(zone, instant)
    return { time: civilTimeIn(zone, instant), day: day === today.value ? null : formatDay(preferences.language, day, { year: false }) }
  }

  const sentences = computed(() => {
    const lots = endingLots.value
    return dayLine({
      started: open.value.own.filter(({ onDevice }) => !onDevice).map(({ codes }) => codes),
      startedByOthers: open.value.others.map(({ codes, by }) => ({ codes, name: by })),
      lateJobs: lateJobs.value,
      dueJobs: jobs.data.value?.filter(({ state }) => state === 'due').length ?? 0,
      keepOut: held.holds.value.filter(({ kind }) => kind === 'entry').flatMap(({ blocks: those, until }) => those.map(({ code }) => ({ code, ...untilWords(until) }))),
      drafts: deviceLines.value.length,
      signedToday: doneLines.value.filter(({ line }) => line.state === 'signed').length,
      pastLots: lots.filter(({ standing }) => standing.useBy === 'past').map(({ lot }) => lot.code),
      soonLots: lots.flatMap(({ lot, standing }) =>
        standing.useBy === 'soon' && (standing.days ?? 0) <= LINE_DAYS && lot.expiresOn !== null
          ? [{ code: lot.code, day: formatDay(preferences.language, lot.expiresOn, { year: false }) }]
          : []),
    })
  })

  return {
    title: computed(() => (today.value === null ? '' : capital(formatDay(preferences.language, today.value, { weekday: true, year: false })))),
    sentences,
    open,
    openCount: computed(() => open.value.own.length + open.value.others.length),
    doneLines, endingLots, blockLines, outlines, inputs, held, newest,
    rowsRead: computed(() => rowsOf(newest).length),
    isRead,
    ready: computed(() => isRead.value && inputs.ready.value && !jobs.isLoading.value && !held.isReading.value),
  }
}

/** Lots that hold something and are past their use, near it, or nearly empty. */
function isEnding({ useBy, stock }: LotLine['standing']): boolean {
  return stock !== 'empty' && (useBy === 'past' || useBy === 'soon' || stock === 'low')
}

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1)
