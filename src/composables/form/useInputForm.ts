import { computed, ref, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { z } from 'zod'
import type { Command, CommandAnswers, CommandKind } from '../../api/commandTypes.ts'
import { ApiError } from '../../api/errors.ts'
import { useSession } from '../../stores/session.ts'
import { fieldErrors } from './fieldErrors.ts'
import { newId } from './newId.ts'
import { useSchemaErrors } from './useSchemaErrors.ts'
import { useMessages } from '../app/useMessages.ts'
import { useSubmit } from './useSubmit.ts'
import { useTask } from './useTask.ts'
import { useToast } from '../app/useToast.ts'

type InputKind = Extract<CommandKind, 'material.create' | 'lot.create' | 'lot.count' | 'block.land' | 'planting.create' | 'planting.update' | 'bed.create' | 'bed.update' | 'event.create' | 'event.withdraw' | 'farm.update' | 'sprayer.update' | 'sprayer.retire' | 'calibration.create' | 'calibration.withdraw' | 'certificate.add' | 'certificate.change' | 'certificate.withdraw'>

export interface InputFormOptions<Kind extends InputKind> {
  kind: Kind
  schema: z.ZodType
  /** The thing the command is about, where that is not what is being made: the lot of a count. */
  aboutId?: () => string
  body: (id: string) => unknown
  /** Where another may have changed it meanwhile: puts both sides together, and holds the form back while something has to be chosen. */
  merge?: { meet: (error: unknown) => boolean; isHeld: Ref<boolean> }
  /** Sentence for the reader once the server has it. */
  done: (answer: CommandAnswers[Kind]) => string
}

export interface InputForm {
  errors: ComputedRef<Record<string, string>>
  /** What stands against the whole form rather than one field. */
  failure: ComputedRef<string>
  /** The server has newer figures than those the form began with. */
  isStale: ComputedRef<boolean>
  busy: Ref<boolean>
  /** Sends it once; true when it is written down or kept for sending. */
  save: () => Promise<boolean>
}

/** One form in a dialog: checks the body, sends it under an id made once, puts refusals at their fields. */
export function useInputForm<Kind extends InputKind>(options: InputFormOptions<Kind>): InputForm {
  const { t } = useI18n()
  const session = useSession()
  const { submit } = useSubmit()
  const { problem } = useMessages()
  const check = useSchemaErrors()
  const toast = useToast()
  const id = newId()
  const own = ref<Record<string, string>>({})
  const task = useTask((command: Command<Kind>) => submit<Kind>(command))

  async function save(): Promise<boolean> {
    if (task.running.value || options.merge?.isHeld.value === true) return false
    const body = options.body(id)
    own.value = check(options.schema, body)
    task.error.value = null
    if (Object.keys(own.value).length > 0) return false
    const command = { kind: options.kind, farmId: session.farmId, id: options.aboutId?.() ?? id, body } as Command<Kind>
    const sent = await task.run(command)
    if (sent === undefined) {
      if (options.merge?.meet(task.error.value) === true) task.error.value = null
      return false
    }
    toast.done(sent.state === 'sent' ? options.done(sent.answer) : t('inputs.kept'))
    return true
  }

  const refused = computed(() => fieldErrors(task.error.value))
  return {
    errors: computed(() => ({ ...refused.value, ...own.value })),
    failure: computed(() => (task.error.value === null || Object.keys(refused.value).length > 0 ? '' : problem(task.error.value))),
    isStale: computed(() => task.error.value instanceof ApiError && task.error.value.problem.status === 409),
    busy: task.running,
    save,
  }
}
