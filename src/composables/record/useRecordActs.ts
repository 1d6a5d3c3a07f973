import { computed, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { ApplicationRecord } from '../../../shared/contract/record.ts'
import { ApiError } from '../../api/errors.ts'
import { useSession } from '../../stores/session.ts'
import { fieldErrors } from '../form/fieldErrors.ts'
import { useMessages } from '../app/useMessages.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useTask } from '../form/useTask.ts'

export type ActKind = 'withdraw' | 'review' | 'discard'
/** What a person writes in the dialog of an act. */
export interface ActDraft { reason: string; password: string }

export interface RecordActs {
  /** What this person may do with the record as it stands. */
  may: ComputedRef<Record<ActKind | 'amend', boolean>>
  busy: Ref<boolean>
  errors: ComputedRef<Record<string, string>>
  /** What stands against the whole of it. */
  failure: ComputedRef<string>
  /** Does it; true when it is done, or kept for sending. */
  act: (kind: ActKind, draft: ActDraft) => Promise<boolean>
  forget: () => void
}

/** Withdrawing, reviewing and discarding one record, and who may. @param signerIds whoever signed a version of it. */
export function useRecordActs(record: Ref<ApplicationRecord | null>, signerIds: Ref<string[]>): RecordActs {
  const { t } = useI18n()
  const session = useSession()
  const { submit } = useSubmit()
  const { problem } = useMessages()
  const personId = computed(() => session.membership?.personId ?? '')

  const task = useTask(async (kind: ActKind, { reason, password }: ActDraft) => {
    const { id, revision, version } = record.value ?? { id: '', revision: 0, version: 0 }
    const of = { farmId: session.farmId, id }
    const said = reason.trim() === '' ? null : reason.trim()
    if (kind === 'withdraw') return submit({ kind: 'record.withdraw', ...of, body: { reason: reason.trim(), password, revision } })
    if (kind === 'review') return submit({ kind: 'record.review', ...of, body: { version, note: said } })
    return submit({ kind: 'record.discard', ...of, body: { reason: said } })
  })

  const refused = computed(() => fieldErrors(task.error.value))
  return {
    may: computed(() => {
      const one = record.value
      const isSigned = one?.state === 'signed'
      const isOpen = one?.state === 'draft' || one?.state === 'started'
      const isOwn = one !== null && [one.doneBy?.id, one.enteredBy?.id].includes(personId.value)
      const mayChange = session.canManage || (session.canRecord && signerIds.value.includes(personId.value))
      const isReviewed = one?.reviews.some(({ version, by }) => version === one.version && by?.id === personId.value) ?? false
      return {
        amend: isSigned && mayChange,
        withdraw: isSigned && mayChange,
        review: session.canManage && isSigned && !isReviewed,
        discard: isOpen && (session.canManage || (session.canRecord && isOwn)),
      }
    }),
    busy: task.running,
    errors: refused,
    failure: computed(() => {
      const error = task.error.value
      if (error === null || Object.keys(refused.value).length > 0) return ''
      return error instanceof ApiError && error.problem.code === 'stale' ? t('versions.act.stale') : problem(error)
    }),
    act: async (kind, draft) => (task.running.value ? false : (await task.run(kind, draft)) !== undefined),
    forget: () => { task.error.value = null },
  }
}
