import { computed, ref, watch, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { sumRegisterRows, type RegisterSums } from '../../shared/register/sumRegisterRows.ts'
import type { RegisterLine } from '../../shared/register/registerLine.ts'
import { formatNumber, formatVolumeL } from '../../shared/units/formatQuantity.ts'
import { usePreferences } from '../stores/preferences.ts'
import { useSession } from '../stores/session.ts'
import { useBlocks } from './useBlocks.ts'
import { useRecord } from './useRecord.ts'
import { useRecords } from './useRecords.ts'
import { unsentDrafts, useRegisterLines, type RegisterWords } from './useRegisterLines.ts'

export interface Register extends Pick<RegisterWords, 'place' | 'outlines'> {
  rows: ReturnType<typeof useRecords>
  record: ReturnType<typeof useRecord>
  /** Drafts first, then what the server has, newest first. */
  lines: ComputedRef<RegisterLine[]>
  ready: ComputedRef<boolean>
  /** Code of the one block whose records are shown, or null. */
  onlyBlock: ComputedRef<string | null>
  /** Rows of the server that are shown. */
  shown: ComputedRef<number>
  chosenId: Ref<string | null>
  chosen: ComputedRef<RegisterLine | null>
  sums: ComputedRef<RegisterSums>
  sumWords: ComputedRef<{ words: string; hectares: string; litres: string } | null>
  /** Message that heads the checks column. */
  headWords: ComputedRef<string>
}

/** The register page: its rows page by page, of one block where asked, the chosen one with its checks, and the totals of what is shown. */
export function useRegister(blockId: () => string | null): Register {
  const { t } = useI18n()
  const session = useSession()
  const preferences = usePreferences()
  const farmId = computed(() => session.farmId)
  const rows = useRecords(farmId, () => (blockId() === null ? { limit: 50 } : { limit: 50, block: blockId() ?? '' }))
  const { data: blocks } = useBlocks(farmId)
  const { place, draftLines, present, outlines } = useRegisterLines()

  const items = computed(() => rows.data.value?.pages.flatMap((page) => page.items) ?? [])
  const lines = computed(() => [...(blockId() === null ? unsentDrafts(draftLines.value, items.value) : []), ...present(items.value)])
  const chosenId = ref<string | null>(null)
  const chosen = computed(() => lines.value.find(({ id }) => id === chosenId.value) ?? null)
  const record = useRecord(farmId, () => (chosen.value === null || chosen.value.onDevice ? '' : chosen.value.id))
  const ready = computed(() => rows.data.value !== undefined && place.value !== null)

  const onlyBlock = computed(() => blocks.value?.find(({ id }) => id === blockId())?.code ?? null)

  watch(ready, (isReady) => {
    if (isReady) chosenId.value ??= firstOf(lines.value)
  }, { immediate: true })

  const sums = computed(() => sumRegisterRows(items.value))
  const sumWords = computed(() => {
    const { signed, withdrawn, areaHa, totalL } = sums.value
    if (items.value.length === 0) return null
    const number = (count: number): string => formatNumber(count, { digits: 0 }, preferences.language)
    const parts = [t('register.sum.signed', { number: number(signed) }, signed)]
    if (withdrawn > 0) parts.push(t('register.sum.withdrawn', { number: number(withdrawn) }, withdrawn))
    return {
      words: parts.join(', '),
      hectares: formatNumber(areaHa, { digits: 2 }, preferences.language),
      litres: formatVolumeL(totalL, preferences.language, 0),
    }
  })

  return {
    rows, record, lines, ready, onlyBlock, place, outlines, chosenId, chosen, sums, sumWords,
    shown: computed(() => items.value.length),
    headWords: computed(() => headOf(chosen.value)),
  }
}

/** The newest signed record, else the first line. */
function firstOf(lines: readonly RegisterLine[]): string | null {
  return (lines.find(({ state }) => state === 'signed') ?? lines[0])?.id ?? null
}

function headOf(line: RegisterLine | null): string {
  if (line === null || line.onDevice) return 'register.checks.head'
  return line.state === 'draft' || line.state === 'started' ? 'register.checks.asOfNow' : 'register.checks.asSigned'
}
