import { computed, type ComputedRef } from 'vue'
import type { Check } from '../../shared/contract/record.ts'
import { countCorners } from '../../shared/geo/countCorners.ts'
import { formatDay } from '../../shared/messages/formatDay.ts'
import { civilDateIn } from '../../shared/time/civilDate.ts'
import { formatNumber } from '../../shared/units/formatQuantity.ts'
import { blockAllows } from './blockAllows.ts'
import { blockRecordLine, type BlockRecordLine } from './blockRecordLine.ts'
import type { BlockWords } from './blockWords.ts'
import type { BlocksPlace } from './useBlocksPlace.ts'
import { useRecords } from './useRecords.ts'

/** One block's page in words. */
export interface BlockPage {
  block: ComputedRef<BlockWords | null>
  /** Corners of all rings, as a figure. */
  corners: ComputedRef<string>
  /** Day the boundary was drawn, in words. */
  drawnOn: ComputedRef<string>
  records: ReturnType<typeof useRecords>
  lines: ComputedRef<readonly BlockRecordLine[]>
  /** Day of the last work in words; empty while there is none. */
  lastOn: ComputedRef<string>
  checks: ComputedRef<Check[]>
}

const LAST_RECORDS = 5

export function useBlockPage(id: () => string, { farmId, farm, blocks, language }: BlocksPlace): BlockPage {
  const block = computed(() => blocks.value.find((each) => each.id === id()) ?? null)
  const records = useRecords(farmId, computed(() => ({ block: id(), limit: LAST_RECORDS })))
  const zone = computed(() => farm.value?.zone ?? 'UTC')
  const rows = computed(() => records.data.value?.pages[0]?.items.slice(0, LAST_RECORDS) ?? [])
  const dayOf = (instant: string): string => formatDay(language.value, civilDateIn(zone.value, instant))

  return {
    block,
    records,
    corners: computed(() => formatNumber(block.value === null ? 0 : countCorners(block.value.geometry), { digits: 0 }, language.value)),
    drawnOn: computed(() => (block.value === null ? '' : dayOf(block.value.createdAt))),
    lines: computed(() => rows.value.map((row) => blockRecordLine(language.value, zone.value, row))),
    lastOn: computed(() => {
      const started = rows.value.find(({ state, startedAt }) => state !== 'withdrawn' && startedAt !== null)?.startedAt
      return started === undefined || started === null ? '' : dayOf(started)
    }),
    checks: computed(() => (block.value === null ? [] : blockAllows(block.value.code))),
  }
}
