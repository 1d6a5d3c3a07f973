import { computed, ref, watch, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { sumRegisterRows, type RegisterSums } from '../../shared/register/sumRegisterRows.ts'
import type { RegisterLine } from '../../shared/register/registerLine.ts'
import { formatNumber, formatVolumeL } from '../../shared/units/formatQuantity.ts'
import { usePreferences } from '../stores/preferences.ts'
import { useSession } from '../stores/session.ts'
import { countChosen, type RegisterChoice } from './registerAddress.ts'
import { useRecord } from './useRecord.ts'
import { useRecords } from './useRecords.ts'
import { useRegisterTotals } from './useRegisterTotals.ts'
import { unsentDrafts, useRegisterLines, type RegisterWords } from './useRegisterLines.ts'

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
  sumWords: ComputedRef<{ words: string; hectares: string; litres: string; mass: string } | null>
  /** Message that heads the checks column. */
  headWords: ComputedRef<string>
}

/** The register page: the rows of a choice page by page, the chosen one with its checks, and the totals of all that was found. */
export function useRegister(choice: () => RegisterChoice): Register {
  const { t } = useI18n()
  const session = useSession()
  const preferences = usePreferences()
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
  const sumWords = computed(() => {
    const { signed, withdrawn, areaHa, totalL, totalKg } = sums.value
    if (items.value.length === 0) return null
    const number = (count: number): string => formatNumber(count, { digits: 0 }, preferences.language)
    const parts = [t('register.sum.signed', { number: number(signed) }, signed)]
    if (withdrawn > 0) parts.push(t('register.sum.withdrawn', { number: number(withdrawn) }, withdrawn))
    return {
      words: parts.join(', '),
      hectares: formatNumber(areaHa, { digits: 2 }, preferences.language),
      litres: formatVolumeL(totalL, preferences.language, 0),
      mass: Number(totalKg) === 0 ? '' : t('register.kilogramsUnit', { value: formatNumber(totalKg, { digits: 0 }, preferences.language) }),
    }
  })

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
