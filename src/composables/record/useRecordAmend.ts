import { computed, ref, watch } from 'vue'
import { useI18n } from 'vue-i18n'
import { freshStops } from '../../../shared/checks/freshStops.ts'
import type { ApplicationRecord } from '../../../shared/contract/record.ts'
import { addDecimals } from '../../../shared/units/addDecimals.ts'
import { convertQuantity } from '../../../shared/units/convertQuantity.ts'
import { dimensionOf } from '../../../shared/units/dimensionOf.ts'
import { now } from '../../plugins/clock.ts'
import { useSession } from '../../stores/session.ts'
import { goToFault } from './goToFault.ts'
import { contentOf } from './recordContent.ts'
import { draftOfRecord, emptyRecord, type RecordDraft } from './recordDraft.ts'
import { useAmendDraft } from './useAmendDraft.ts'
import { keepSeconds } from './keepSeconds.ts'
import { signGaps } from './recordGaps.ts'
import { timeFaults } from './timeFaults.ts'
import { formErrors } from './formErrors.ts'
import { askedFor } from './askedFor.ts'
import { useClock } from '../app/useClock.ts'
import { useJars } from './useJars.ts'
import { useLineRows } from './useLineRows.ts'
import { useMixRows } from './useMixRows.ts'
import { useRecord } from './useRecord.ts'
import { useRecordChecks } from './useRecordChecks.ts'
import { useRecordSheet } from './useRecordSheet.ts'
import { useRecordStock, type RecordStock } from './useRecordStock.ts'
import { useSigning } from './useSigning.ts'
import { useSubmit } from '../form/useSubmit.ts'

/** What a lot holds for this amendment: what is left of it, and what the record itself took. */
function withOwnDraws(stock: RecordStock, record: ApplicationRecord | null): RecordStock {
  if (record === null) return stock
  const lots = stock.lots.map((lot) => record.components.reduce((kept, { lotId, used }, index) => {
    const taken = used ?? record.computed.components[index]?.amount ?? null
    if (lotId !== lot.id || taken === null || dimensionOf(taken.unit) !== dimensionOf(lot.left.unit)) return kept
    return { ...kept, left: { ...kept.left, value: addDecimals(kept.left.value, convertQuantity(taken, lot.left.unit)) } }
  }, lot))
  return { ...stock, lots }
}

/** The form of a signed record, filled with what stands: a new version is signed over it, with the reason. */
export function useRecordAmend(id: string) {
  const { t } = useI18n()
  const session = useSession()
  const { submit } = useSubmit()
  const { stock: farmStock, ready: stockReady, error: stockError, again } = useRecordStock()
  const read = useRecord(() => session.farmId, id)
  const record = computed(() => read.data.value ?? null)
  const standing = ref<ApplicationRecord | null>(null)
  const stock = computed(() => withOwnDraws(farmStock.value, standing.value))
  const { time } = useClock()
  const zone = computed(() => stock.value.farm?.zone ?? 'UTC')
  const kept = useAmendDraft(id)
  const { draft, reason } = kept
  /** What stands, as a form: judged over the same stock as what is typed, so that only what the amendment brings is new. */
  const before = ref<RecordDraft>(emptyRecord())
  const tried = ref(false)
  const filled = ref(false)
  const amended = ref<ApplicationRecord | null>(null)

  // Filled once: what is typed is not written over by what comes from elsewhere; the server then says that it is stale.
  watch([record, stockReady], ([one, ready]) => {
    if (one === null || !ready || standing.value !== null) return
    standing.value = one
    before.value = draftOfRecord(one, zone.value)
    void kept.fill(one, zone.value).finally(() => { filled.value = true })
  }, { immediate: true })

  const sheet = useRecordSheet(draft, stock)
  const checking = useRecordChecks(draft, stock, sheet, () => true)
  const stood = useRecordChecks(before, stock, useRecordSheet(before, stock), () => true)
  const mix = useMixRows({ draft, sheet, stock })
  /** A stop that was explained at the signature before asks no second time. */
  const stops = computed(() => freshStops(checking.checks.value, stood.checks.value))
  const gaps = computed(() => signGaps({ draft: draft.value, sheet: sheet.value, zone: zone.value, hasStops: signing.hasStops.value }))

  const signing = useSigning({
    draft, stops,
    sign: async (password, acknowledged) => {
      const content = keepSeconds(contentOf(draft.value, { zone: zone.value, happened: true }), standing.value?.lines ?? [])
      const body = { ...content, reason: reason.value.trim(), password, acknowledged, deviceAt: now().toISOString(), revision: standing.value?.revision ?? 1 }
      const outcome = await submit({ kind: 'record.amend', farmId: session.farmId, id, body })
      return outcome.state === 'sent' ? outcome.answer : 'kept'
    },
  })
  const errors = formErrors({
    gaps, live: computed(() => ({ ...checking.shortLots.value, ...timeFaults(draft.value, zone.value, time.value) })), tried, refusals: [signing.error],
  })

  /** The signature stands under both steps; what happened, and why in spite of a stop, is asked on the second. */
  function showStepOf(paths: readonly string[]): void {
    if (paths.some((path) => /^stop\.|^workedInOn$|\.(day|startedAt|endedAt|amount|used)$/.test(path))) draft.value.step = 2
  }

  async function sign(): Promise<void> {
    tried.value = true
    showStepOf(Object.keys(gaps.value))
    if (Object.keys(gaps.value).length > 0) await goToFault()
    if (Object.keys(gaps.value).length > 0 || signing.password.value === '' || reason.value.trim() === '') return
    const answer = await signing.run()
    if (signing.doubts.value.length > 0) draft.value.step = 2
    if (answer === undefined || answer === 'kept') return
    await kept.discard()
    amended.value = answer
  }

  return {
    ...checking, ...mix, read, record: standing, stock, stockError, again, zone, draft, reason, sheet, errors, signing, sign, amended, stops, discard: kept.discard,
    lines: useLineRows({ draft, sheet, stock, zone, errors }),
    jars: useJars({ draft, stock, rows: mix.rows }),
    asked: computed(() => askedFor(draft.value)),
    ready: computed(() => filled.value && stockReady.value),
    signError: computed(() => {
      if (!tried.value) return ''
      const [gap] = Object.values(gaps.value)
      if (gap !== undefined) return t('records.sign.notSigned', { reason: t(gap) })
      if (reason.value.trim() === '') return t('versions.amend.needReason')
      return signing.words.value || (signing.password.value === '' ? t('versions.act.needPassword') : '')
    }),
  }
}
