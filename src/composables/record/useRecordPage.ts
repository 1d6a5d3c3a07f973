import { computed, ref, toRef, type MaybeRefOrGetter } from 'vue'
import { useI18n } from 'vue-i18n'
import { lastEnd } from '../../../shared/records/registerRow.ts'
import { useSession } from '../../stores/session.ts'
import { groundOfSigned, groundOfStock } from './recordGround.ts'
import { useRecord } from './useRecord.ts'
import { useRecordActs, type ActDraft, type ActKind } from './useRecordActs.ts'
import { useRecordReading } from './useRecordReading.ts'
import { useRecordStock } from './useRecordStock.ts'
import { useRecordVersions } from './useRecordVersions.ts'
import { useToast } from '../app/useToast.ts'

const HOUR_MS = 3_600_000
const LATE_HOURS = 24

/** One record's page: what it says, its versions, and what may be done with it. @param gone called when the record is no more. */
export function useRecordPage(recordId: MaybeRefOrGetter<string>, gone: () => unknown) {
  const { t } = useI18n()
  const session = useSession()
  const toast = useToast()
  const id = toRef(recordId)
  const { stock, ready: stockReady } = useRecordStock()
  const read = useRecord(() => session.farmId, id)
  const record = computed(() => read.data.value ?? null)
  const isOpen = computed(() => record.value?.state === 'draft' || record.value?.state === 'started')
  const { versions, signed, signerIds } = useRecordVersions(() => session.farmId, id, () => record.value !== null && !isOpen.value)
  const ground = computed(() => (signed.value ? groundOfSigned(signed.value) : groundOfStock(stock.value, record.value?.sprayerId ?? null)))
  const acts = useRecordActs(record, signerIds)
  const asked = ref<ActKind | null>(null)

  /** Hours from the end of the work to its first signature, where that was late. */
  const lateHours = computed(() => {
    const end = record.value === null ? null : lastEnd(record.value)
    const first = versions.value.at(-1)?.signedAt
    const hours = end === null || first === undefined ? 0 : Math.floor((Date.parse(first) - Date.parse(end)) / HOUR_MS)
    return hours >= LATE_HOURS ? hours : null
  })

  async function act(draft: ActDraft): Promise<void> {
    const kind = asked.value
    if (kind === null || !(await acts.act(kind, draft))) return
    asked.value = null
    toast.done(t(`versions.act.done.${kind}`))
    if (kind === 'discard') await gone()
  }

  return {
    read, record, isOpen, stock, versions, ground, acts, asked, act, lateHours,
    ready: computed(() => record.value !== null && (isOpen.value ? stockReady.value : signed.value !== null)),
    reading: useRecordReading(record, ground),
    ask: (kind: ActKind | null): void => { acts.forget(); asked.value = kind },
  }
}
