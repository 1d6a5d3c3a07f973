import { computed, ref, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { SignManyAnswer } from '../../../shared/contract/recordChanges.ts'
import type { RegisterLine } from '../../../shared/register/registerLine.ts'
import { useSession } from '../../stores/session.ts'
import { fieldErrors } from '../form/fieldErrors.ts'
import { useMessages } from '../app/useMessages.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useTask } from '../form/useTask.ts'

/** What became of one record. */
export interface SignedOne { id: string; words: string; isSigned: boolean }

export interface SignMany {
  /** Which records, by id. */
  chosen: Ref<string[]>
  password: Ref<string>
  busy: Ref<boolean>
  /** What stands against the whole of it, empty before it was tried. */
  failure: ComputedRef<string>
  results: ComputedRef<SignedOne[]>
  sign: () => Promise<void>
}

/** Signing several records with one password. @param lines those that wait for it, with words for each. */
export function useSignMany(lines: Ref<readonly RegisterLine[]>, wordsOf: (line: RegisterLine) => string): SignMany {
  const { t } = useI18n()
  const session = useSession()
  const { submit } = useSubmit()
  const { problem } = useMessages()
  const chosen = ref<string[]>([])
  const password = ref('')
  const gap = ref('')
  const asked = ref<ReadonlyMap<string, string>>(new Map())
  const task = useTask(async (ids: string[]): Promise<SignManyAnswer | null> => {
    const outcome = await submit({ kind: 'record.signMany', farmId: session.farmId, id: session.farmId, body: { ids, password: password.value } })
    return outcome.state === 'sent' ? outcome.answer : null
  })

  async function sign(): Promise<void> {
    if (task.running.value) return
    gap.value = chosen.value.length === 0 ? t('recordForm.many.choose') : password.value === '' ? t('records.sign.needPassword') : ''
    if (gap.value !== '') return
    // What is signed leaves the list of what waits: its words are kept for the answer.
    asked.value = new Map(lines.value.map((line) => [line.id, wordsOf(line)]))
    if ((await task.run(chosen.value)) === undefined) return
    chosen.value = []
    password.value = ''
  }

  const what = (id: string): string => asked.value.get(id) ?? ''
  return {
    chosen, password, busy: task.running, sign,
    failure: computed(() => {
      if (gap.value !== '' || task.error.value === null) return gap.value
      return Object.values(fieldErrors(task.error.value))[0] ?? problem(task.error.value)
    }),
    results: computed(() => {
      const { signed = [], refused = [] } = task.result.value ?? {}
      return [
        ...signed.map(({ id, number }) => ({ id, isSigned: true, words: t('recordForm.many.signed', { what: what(id), number }) })),
        ...refused.map(({ id, problem: why }) => ({ id, isSigned: false, words: t('recordForm.many.refused', { what: what(id), reason: why.detail }) })),
      ]
    }),
  }
}
