import { computed, ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { workingLines } from '../../../shared/checks/workingLines.ts'
import type { ApplicationRecord } from '../../../shared/contract/record.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import { now } from '../../plugins/clock.ts'
import { useFileQueue } from '../../stores/fileQueue.ts'
import { goToFault } from './goToFault.ts'
import { askedFor } from './askedFor.ts'
import { formErrors } from './formErrors.ts'
import { contentOf } from './recordContent.ts'
import { momentAt } from './lineDraft.ts'
import { writtenLines } from './recordDraft.ts'
import { signGaps, startGap, unreadable } from './recordGaps.ts'
import { timeFaults } from './timeFaults.ts'
import { useClock } from '../app/useClock.ts'
import { useFigures } from '../app/useFigures.ts'
import { useJars } from './useJars.ts'
import { useLateEntry } from './useLateEntry.ts'
import { useLineRows } from './useLineRows.ts'
import { useMessages } from '../app/useMessages.ts'
import { useMixRows } from './useMixRows.ts'
import { useRecordChecks } from './useRecordChecks.ts'
import { useRecordForm } from './useRecordForm.ts'
import { useRecordSend } from './useRecordSend.ts'
import { useRecordSheet } from './useRecordSheet.ts'
import { useRecordStock } from './useRecordStock.ts'
import { useSigning } from './useSigning.ts'
import { useTask } from '../form/useTask.ts'

/** Everything the form of one record does: what is typed, worked out and judged, and how it is started and signed. */
export function useRecordEdit(options: { id: string; fresh: boolean; likeId: string; blockIds: readonly string[]; jobIds: readonly string[] }) {
  const { t } = useI18n()
  const { language, reader } = useFigures()
  const { problem } = useMessages()
  const { stock, ready: stockReady, error: stockError, again } = useRecordStock()
  const form = useRecordForm({ ...options, stock, stockReady })
  const { draft } = form
  const { time } = useClock()
  const zone = computed(() => stock.value.farm?.zone ?? 'UTC')
  const sheet = useRecordSheet(draft, stock)
  const checking = useRecordChecks(draft, stock, sheet)
  const mix = useMixRows({ draft, sheet, stock })
  const signed = ref<ApplicationRecord | null>(null)
  const tried = ref(false)

  const files = useFileQueue()
  const send = useRecordSend({
    id: options.id, draft, farmId: () => stock.value.farmId, sendFiles: () => files.sendOf(options.id),
    content: () => contentOf(draft.value, { zone: zone.value, happened: draft.value.step === 2 }),
  })
  const facts = (): { draft: typeof draft.value; sheet: typeof sheet.value; zone: string } => ({ draft: draft.value, sheet: sheet.value, zone: zone.value })
  const signing = useSigning({ draft, stops: checking.reasoned, sign: send.sign })
  const gaps = computed(() => signGaps({ ...facts(), hasStops: signing.hasStops.value }))

  /** The block that Start begins with: the first that was not begun. */
  const nextLine = computed(() => writtenLines(draft.value).find(({ start, end }) => start.time === '' && end.time === '') ?? null)
  const starting = useTask(async () => {
    const line = nextLine.value
    const before = line?.start
    if (line) line.start = momentAt(zone.value, now().toISOString())
    try {
      const outcome = await send.save()
      draft.value.step = 2
      return outcome
    } catch (error) {
      if (line && before) line.start = before
      throw error
    }
  })

  async function sign(): Promise<void> {
    tried.value = true
    if (Object.keys(gaps.value).length > 0) await goToFault()
    if (Object.keys(gaps.value).length > 0 || signing.password.value === '') return
    const answer = await signing.run()
    if (answer === undefined || answer === 'kept') return
    signed.value = answer
    await form.discard()
  }

  const errors = formErrors({
    gaps, live: computed(() => ({ ...unreadable(draft.value), ...checking.shortLots.value, ...timeFaults(draft.value, zone.value, time.value) })), tried, refusals: [starting.error, signing.error],
  })

  return {
    ...form, ...checking, ...mix, stock, stockError, again, zone, sheet, signed, signing, sign, errors,
    lines: useLineRows({ draft, sheet, stock, zone, errors }),
    jars: useJars({ draft, stock, rows: mix.rows }),
    asked: computed(() => askedFor(draft.value)),
    late: useLateEntry({ draft, zone }),
    startCode: computed(() => stock.value.blocks.find(({ id }) => id === nextLine.value?.blockId)?.code ?? ''),
    start: (): Promise<unknown> => (starting.running.value ? Promise.resolve() : starting.run()),
    starting: starting.running,
    startFailed: computed(() => (starting.error.value === null ? '' : t('records.sign.notStarted', { reason: problem(starting.error.value) }))),
    startGap: computed(() => { const gap = startGap(facts()); return gap === null ? '' : t(gap) }),
    signError: computed(() => {
      if (!tried.value) return ''
      const [gap] = Object.values(gaps.value)
      if (gap !== undefined) return t('records.sign.notSigned', { reason: t(gap) })
      return signing.words.value || (signing.password.value === '' ? t('records.sign.needPassword') : '')
    }),
    working: computed(() => workingLines(sheet.value, { names: mix.rows.value.map(({ name }) => name), sizedFrom: draft.value.water.sizedFrom, units: reader.value.units }).map((line) => renderMessage(language.value, line))),
  }
}
