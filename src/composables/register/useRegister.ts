import { computed, ref, watch, type ComputedRef, type Ref } from 'vue'
import { sumRegisterRows, type RegisterSums } from '../../../shared/register/sumRegisterRows.ts'
import type { RegisterLine } from '../../../shared/register/registerLine.ts'
import { useSession } from '../../stores/session.ts'
import { countChosen, type RegisterChoice } from './registerAddress.ts'
import { useRecord } from '../record/useRecord.ts'
import { useRecords } from './useRecords.ts'
import { useRegisterTotals } from './useRegisterTotals.ts'
import { unsentDrafts, useRegisterLines, type RegisterWords } from './useRegisterLines.ts'
import { useSumWords, type SumWords } from './useSumWords.ts'

export interface Register extends Pick<RegisterWords, 'place' | 'outlines'> {
  rows: ReturnType<typeof useRecords>
  record: ReturnType<typeof useRecord>
  /** Drafts first, then what the server has, newest first. */
  lines: ComputedRef<RegisterLine[]>
  ready: ComputedRef<boolean>
  /** Records that fit, shown or not; null until they are counted. */
  found: ComputedRef<number | null>
  /** Rows of the server that are shown. */
  shown: ComputedRef<number>
  chosenId: Ref<string | null>
  chosen: ComputedRef<RegisterLine | null>
  sums: ComputedRef<RegisterSums>
  sumWords: ComputedRef<SumWords | null>
  /** Message that heads the checks column. */
  headWords: ComputedRef<string>
}

/** The register page: the rows of a choice page by page, the chosen one with its checks, and the totals of all that was found. */
export function useRegister(choice: () => RegisterChoice): Register {
  const session = useSession()
  const farmId = computed(() => session.farmId)
  const rows = useRecords(farmId, () => ({ ...choice().filter, sort: choice().sort, limit: 50 }))
  const totals = useRegisterTotals(farmId, () => choice().filter)
  const isWhole = computed(() => countChosen(choice().filter) === 0 && choice().sort === '-when')
  const { place, draftLines, present, outlines } = useRegisterLines()

  const items = computed(() => rows.data.value?.pages.flatMap((page) => page.items) ?? [])
  const lines = computed(() => [...(isWhole.value ? unsentDrafts(draftLines.value, items.value) : []), ...present(items.value)])
  const chosenId = ref<string | null>(null)
  const chosen = computed(() => lines.value.find(({ id }) => id === chosenId.value) ?? null)
  const record = useRecord(farmId, () => (chosen.value === null || chosen.value.onDevice ? '' : chosen.value.id))
  const ready = computed(() => rows.data.value !== undefined && place.value !== null)

  watch([ready, lines], () => {
    if (ready.value && chosen.value === null) chosenId.value = firstOf(lines.value)
  }, { immediate: true })

  /** Of everything found; until that is known, of the rows that were read. */
  const sums = computed(() => {
    const all = totals.data.value
    return all === undefined ? sumRegisterRows(items.value) : { ...all, signed: all.records }
  })
  const { wordsOf } = useSumWords()
  const sumWords = computed(() => (items.value.length === 0 ? null : wordsOf(sums.value)))

  return {
    rows, record, lines, ready, found: computed(() => totals.data.value?.found ?? null), place, outlines, chosenId, chosen, sums, sumWords,
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
