import type { Ref } from 'vue'
import type { Acknowledged } from '../../../shared/contract/common.ts'
import { recordSchema, type ApplicationRecord } from '../../../shared/contract/record.ts'
import { type RecordContentInput } from '../../../shared/contract/recordContent.ts'
import { ApiError } from '../../api/errors.ts'
import { recordApi } from '../../api/recordApi.ts'
import { now } from '../../plugins/clock.ts'
import { FilesLeft } from './filesLeft.ts'
import type { RecordDraft } from './recordDraft.ts'
import { useSubmit } from '../form/useSubmit.ts'

interface RecordSendOptions {
  id: string
  farmId: () => string
  draft: Ref<RecordDraft>
  content: () => RecordContentInput
  /** Sends the photos and papers of the record; answers how many are left. */
  sendFiles?: () => Promise<number>
}

/** The revision that a refused write met at the server; null where it was refused for something else. */
async function revisionMet(error: unknown, read: () => Promise<ApplicationRecord>): Promise<number | null> {
  if (!(error instanceof ApiError)) return null
  // The id was sent from here before with less in it, and the answer never came.
  if (error.problem.errors.some(({ code }) => code === 'idempotency.mismatch')) return (await read()).revision
  const current = recordSchema.pick({ revision: true }).strip().safeParse(error.problem.current)
  return error.problem.code === 'stale' && current.success ? current.data.revision : null
}

/** Sends a record and signs it; the same record however often it is pressed, since its id was made with the form. */
export function useRecordSend({ id, farmId, draft, content, sendFiles = () => Promise.resolve(0) }: RecordSendOptions): {
  save: () => Promise<'sent' | 'kept'>
  sign: (password: string, acknowledged: Acknowledged) => Promise<ApplicationRecord | 'kept'>
} {
  const { submit } = useSubmit()

  async function write(): Promise<'sent' | 'kept'> {
    const { revision, jobs } = draft.value
    const body = { ...content(), deviceAt: now().toISOString(), ...(jobs.length > 0 && { jobs }) }
    const outcome = revision === null
      ? await submit({ kind: 'record.create', farmId: farmId(), id, body: { ...body, id } })
      : await submit({ kind: 'record.update', farmId: farmId(), id, body: { ...body, revision } })
    if (outcome.state === 'sent') draft.value.revision = outcome.answer.revision
    return outcome.state
  }

  /**
   * Puts what is written on the server. A record sent from here before and not known to be there is written over; one changed
   * elsewhere is refused once, so that the person is told.
   */
  async function save(): Promise<'sent' | 'kept'> {
    const wasKnown = draft.value.revision !== null
    try {
      return await write()
    } catch (error) {
      const revision = await revisionMet(error, () => recordApi.read(farmId(), id))
      if (revision === null) throw error
      draft.value.revision = revision
      if (wasKnown) throw error
      return write()
    }
  }

  /** Writes it down as it happened, then signs it; `kept` where there was no signal for the first. */
  async function sign(password: string, acknowledged: Acknowledged): Promise<ApplicationRecord | 'kept'> {
    if ((await save()) === 'kept') return 'kept'
    await sendFilesFirst()
    const { answer } = await signOnly(password, acknowledged)
    return answer
  }

  let toldOf = 0
  /** What was added before the signature belongs into it; who was told and signs again signs without. */
  async function sendFilesFirst(): Promise<void> {
    const left = await sendFiles()
    if (left === 0 || left === toldOf) return
    toldOf = left
    throw new FilesLeft(left)
  }

  async function signOnly(password: string, acknowledged: Acknowledged): Promise<{ answer: ApplicationRecord }> {
    const outcome = await submit({ kind: 'record.sign', farmId: farmId(), id, body: { password, acknowledged, ...(draft.value.revision !== null && { revision: draft.value.revision }) } })
    if (outcome.state === 'kept') throw new TypeError('A signature is never kept')
    return outcome
  }

  return { save, sign }
}
