import { computed, ref, watch, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { Acknowledged } from '../../../shared/contract/common.ts'
import type { ApplicationRecord, Check } from '../../../shared/contract/record.ts'
import { ApiError } from '../../api/errors.ts'
import { useOutbox } from '../../stores/outbox.ts'
import { FilesLeft } from './filesLeft.ts'
import type { RecordDraft } from './recordDraft.ts'
import { useMessages } from '../app/useMessages.ts'
import { useSignalBack } from '../app/useSignalBack.ts'
import { useTask } from '../form/useTask.ts'

/** Something the server finds unlikely and takes when a reason is given. */
export interface Doubt {
  code: string
  words: string
}

interface SigningOptions {
  draft: Ref<RecordDraft>
  /** Stops that ask for a reason. */
  stops: Ref<Check[]>
  sign: (password: string, acknowledged: Acknowledged) => Promise<ApplicationRecord | 'kept'>
}

export interface Signing {
  password: Ref<string>
  /** Reasons by the code of a doubt. */
  reasons: Ref<Record<string, string>>
  doubts: ComputedRef<Doubt[]>
  /** A stop asks for its reason, found here or by the server alone. */
  hasStops: ComputedRef<boolean>
  busy: Ref<boolean>
  /** Why it is not signed, in words; empty where nothing was tried. */
  words: ComputedRef<string>
  error: Ref<unknown>
  run: () => Promise<ApplicationRecord | 'kept' | undefined>
}

/** Under this the server asks about a stop. */
export const STOP_DOUBT = 'record.stop'

function doubtsOf(error: unknown): Doubt[] {
  if (!(error instanceof ApiError) || error.problem.acknowledgeable !== true) return []
  return error.problem.errors.map(({ code, message }) => ({ code, words: message }))
}

/** Signing with a password: reasons for stops and doubts go along, and a refusal loses nothing that was typed. */
export function useSigning({ draft, stops, sign }: SigningOptions): Signing {
  const { t } = useI18n()
  const { problem } = useMessages()
  const password = ref('')
  const reasons = ref<Record<string, string>>({})
  const doubts = ref<Doubt[]>([])

  const isStopAsked = (): boolean => doubts.value.some(({ code }) => code === STOP_DOUBT)

  function acknowledged(): Acknowledged {
    const { why, told, done } = draft.value.stop
    const reason = t('records.stop.reason', { why: why.trim(), told: told.trim(), done: done.trim() })
    const codes = new Set([...stops.value.map(({ code }) => code), ...(isStopAsked() ? [STOP_DOUBT] : [])])
    const given = doubts.value.filter(({ code }) => code !== STOP_DOUBT).flatMap(({ code }) => ((reasons.value[code] ?? '').trim() === '' ? [] : [{ code, reason: reasons.value[code] ?? '' }]))
    return [...[...codes].map((code) => ({ code, reason })), ...given]
  }

  const task = useTask(async () => {
    try {
      return await sign(password.value, acknowledged())
    } catch (error) {
      const found = doubtsOf(error)
      if (found.length > 0) doubts.value = [...new Map([...doubts.value, ...found].map((doubt) => [doubt.code, doubt])).values()]
      throw error
    }
  })

  // "No signal" is said as long as it is so.
  function forgetKept(): void {
    if (task.result.value === 'kept') task.result.value = undefined
  }
  const outbox = useOutbox()
  useSignalBack(forgetKept)
  watch(() => outbox.lastSentAt, forgetKept)

  const words = computed(() => {
    const error = task.error.value
    if (error === null) return task.result.value === 'kept' ? t('records.sign.kept') : ''
    if (error instanceof ApiError && error.problem.code === 'session.wrong_password') return t('records.sign.wrongPassword')
    if (error instanceof ApiError && error.problem.code === 'session.wrong_pin') return t('records.sign.wrongPin')
    if (error instanceof ApiError && error.problem.code === 'stale') return t('records.sign.stale')
    if (error instanceof FilesLeft) return t('records.filesNotSent', { count: error.count })
    const first = error instanceof ApiError ? error.problem.errors[0]?.message : undefined
    return t('records.sign.notSigned', { reason: first ?? problem(error) })
  })

  return {
    password, reasons, busy: task.running, words,
    doubts: computed(() => doubts.value),
    hasStops: computed(() => stops.value.length > 0 || isStopAsked()),
    error: task.error,
    // Two presses are one signature: the second finds the first at work.
    run: () => (task.running.value ? Promise.resolve(undefined) : task.run()),
  }
}
