import { computed, reactive, type ComputedRef } from 'vue'
import type { Job } from '../../../shared/contract/job.ts'
import { ApiError } from '../../api/errors.ts'
import { useOutbox } from '../../stores/outbox.ts'
import { useSession } from '../../stores/session.ts'
import { useMessages } from '../app/useMessages.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useTask } from '../form/useTask.ts'

/** Moving and skipping one job: what is typed, what was refused, and why it is right all the same. */
export interface JobActs {
  form: { mode: 'none' | 'move' | 'skip'; to: string | null; reason: string; why: string; tried: boolean }
  /** What is unlikely about the day, in words; empty where nothing is. */
  doubt: ComputedRef<string>
  /** A skip was sent without its reason. */
  needsReason: ComputedRef<boolean>
  /** Why it was not done. */
  problem: ComputedRef<string>
  busy: ComputedRef<boolean>
  /** Something about the job waits on this device for signal. */
  kept: ComputedRef<boolean>
  begin: (mode: 'move' | 'skip', to?: string) => void
  cancel: () => void
  move: (to: string | null) => Promise<void>
  skip: () => Promise<void>
  unskip: () => Promise<void>
}

const OUTSIDE = 'job.outside_window'

export function useJobActs(job: () => Job): JobActs {
  const session = useSession()
  const outbox = useOutbox()
  const { submit } = useSubmit()
  const { problem } = useMessages()
  const form = reactive<JobActs['form']>({ mode: 'none', to: null, reason: '', why: '', tried: false })
  const task = useTask(async (command: Parameters<typeof submit>[0]) => {
    await submit(command)
    form.mode = 'none'
  })
  const doubt = computed(() => {
    const error = task.error.value
    return error instanceof ApiError && error.problem.acknowledgeable === true ? (error.problem.errors.find(({ code }) => code === OUTSIDE)?.message ?? '') : ''
  })
  const about = () => ({ farmId: session.farmId, id: job().id, about: { name: `${job().blockCode}, ${job().preparation}`, day: job().plannedOn } })

  async function send(command: Parameters<typeof submit>[0]): Promise<void> {
    if (!task.running.value) await task.run(command)
  }

  return {
    form, doubt,
    needsReason: computed(() => form.tried && form.reason.trim() === ''),
    busy: computed(() => task.running.value),
    kept: computed(() => outbox.waiting.some(({ command }) => command.kind.startsWith('job.') && command.id === job().id)),
    problem: computed(() => {
      if (task.error.value === null || doubt.value !== '') return ''
      const first = task.error.value instanceof ApiError ? task.error.value.problem.errors[0]?.message : undefined
      return first ?? problem(task.error.value)
    }),
    begin: (mode, to) => {
      task.error.value = null
      Object.assign(form, { mode, to: to ?? job().plannedOn, reason: '', why: '', tried: false })
    },
    cancel: () => { form.mode = 'none'; task.error.value = null },
    move: async (to) => {
      if (doubt.value !== '' && form.why.trim() === '') return
      const acknowledged = form.why.trim() === '' ? [] : [{ code: OUTSIDE, reason: form.why }]
      await send({ kind: 'job.move', ...about(), body: { revision: job().revision, to, acknowledged } })
    },
    skip: async () => {
      form.tried = true
      if (form.reason.trim() === '') return
      await send({ kind: 'job.skip', ...about(), body: { revision: job().revision, reason: form.reason } })
    },
    unskip: () => send({ kind: 'job.unskip', ...about(), body: { revision: job().revision } }),
  }
}
