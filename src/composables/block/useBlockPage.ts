import { computed, type ComputedRef } from 'vue'
import type { Check } from '../../../shared/contract/record.ts'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import { holdsNow } from '../../../shared/season/holdsNow.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { blockApi } from '../../api/blockApi.ts'
import { blockAllows, type BlockHeld } from './blockAllows.ts'
import { blockNearby } from './blockNearby.ts'
import { blockRecordLine, type BlockRecordLine } from './blockRecordLine.ts'
import { blockWords, type BlockWords } from './blockWords.ts'
import { heldWords } from './heldWords.ts'
import { isNotFound } from '../app/isNotFound.ts'
import { useClock } from '../app/useClock.ts'
import type { BlocksPlace } from './useBlocksPlace.ts'
import { useFarmDay } from '../farm/useFarmDay.ts'
import { useHolds } from './useHolds.ts'
import { useMapGround } from '../map/useMapGround.ts'
import { useBlockRead } from './useBlockRead.ts'
import { useRecords } from '../register/useRecords.ts'

/** One block's page in words. */
export interface BlockPage {
  /** Null where there is none, and until it is read. */
  block: ComputedRef<BlockWords | null>
  /** True while neither the block nor its absence is known. */
  isReading: ComputedRef<boolean>
  isFailed: ComputedRef<boolean>
  retry: () => void
  records: ReturnType<typeof useRecords>
  lines: ComputedRef<readonly BlockRecordLine[]>
  /** Day of the last work in words; empty while there is none. */
  lastOn: ComputedRef<string>
  checks: ComputedRef<Check[]>
  /** What holds it now in words, and the records whose labels say so; null where nothing that is signed does. */
  held: ComputedRef<{ lines: string[]; records: { id: string; number: string }[] } | null>
}

const LAST_RECORDS = 5

export function useBlockPage(id: () => string, { farmId, farm, query, blocks, language, reader }: BlocksPlace): BlockPage {
  const listed = computed(() => blocks.value.find((each) => each.id === id()) ?? null)
  // A block that has ended is in no list any more; its page stays.
  const single = useBlockRead('block', () => (query.data.value !== undefined && listed.value === null ? id() : ''), blockApi.read)
  const block = computed(() => listed.value ?? (single.data.value?.id === id() ? blockWords(reader.value, single.data.value) : null))
  const ground = useMapGround()
  const holds = useHolds()
  const { today } = useFarmDay()
  const { time: now } = useClock()
  const heldNow = computed<BlockHeld | null | undefined>(() => {
    if (holds.lines.value === undefined) return undefined
    const held = holds.now.value.get(id())
    return held === undefined ? null : { ...held, zone: zone.value }
  })
  const records = useRecords(farmId, computed(() => ({ block: id(), limit: LAST_RECORDS })))
  const zone = computed(() => farm.value?.zone ?? 'UTC')
  const rows = computed(() => records.data.value?.pages[0]?.items.slice(0, LAST_RECORDS) ?? [])
  const dayOf = (instant: string): string => formatDay(language.value, civilDateIn(zone.value, instant))
  const isMissing = computed(() => isNotFound(single.error.value))

  return {
    block,
    records,
    isReading: computed(() => block.value === null && !isMissing.value && !query.isError.value && !single.isError.value),
    isFailed: computed(() => block.value === null && (query.isError.value || (single.isError.value && !isMissing.value))),
    retry: () => { void (query.isError.value ? query.refetch() : single.refetch()) },
    lines: computed(() => rows.value.map((row) => blockRecordLine(reader.value, zone.value, row))),
    lastOn: computed(() => {
      const started = rows.value.find(({ state, startedAt }) => state !== 'withdrawn' && startedAt !== null)?.startedAt
      return started === undefined || started === null ? '' : dayOf(started)
    }),
    checks: computed(() => (block.value === null ? [] : blockAllows(block.value.code, block.value.land, blockNearby(block.value.geometry, ground.value.sites), heldNow.value))),
    held: computed(() => {
      const day = today.value
      if (!heldNow.value || day === null) return null
      const named = new Map((holds.lines.value ?? []).filter((line) => line.blockId === id() && holdsNow([line], now.value, day).size > 0).map(({ recordId, number }) => [recordId, number]))
      return { lines: heldWords(heldNow.value, zone.value, day).map((words) => renderMessage(language.value, words)), records: [...named].map(([recordId, number]) => ({ id: recordId, number })) }
    }),
  }
}
