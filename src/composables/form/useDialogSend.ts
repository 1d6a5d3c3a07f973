import { reactive, ref, type Ref } from 'vue'
import type { Command, CommandKind } from '../../api/commandTypes.ts'
import { fieldErrors } from './fieldErrors.ts'
import { useMessages } from '../app/useMessages.ts'
import { useSubmit } from './useSubmit.ts'

export interface DialogSend {
  /** By field: what the form found itself, else what the server refused. */
  errors: Record<string, string>
  /** What stands against the whole form rather than one field. */
  refusal: Ref<string>
  busy: Ref<boolean>
  /** Nothing has been found yet. */
  begin: () => void
  /** Sends a command once the form's own checks found nothing; null where it was not sent. */
  send: <Kind extends CommandKind>(found: Record<string, string>, command: Command<Kind>) => Promise<'sent' | 'kept' | null>
}

/** What a form in a dialog does when it is saved: its findings stand at their fields, and no press sends it twice. */
export function useDialogSend(): DialogSend {
  const { submit } = useSubmit()
  const { problem } = useMessages()
  const errors = reactive<Record<string, string>>({})
  const refusal = ref('')
  const busy = ref(false)

  function show(found: Record<string, string>): void {
    for (const path of Object.keys(errors)) errors[path] = ''
    Object.assign(errors, found)
  }

  function begin(): void {
    refusal.value = ''
    show({})
  }

  const send: DialogSend['send'] = async (found, command) => {
    if (busy.value) return null
    refusal.value = ''
    show(found)
    if (Object.keys(found).length > 0) return null
    busy.value = true
    try {
      return (await submit(command)).state
    } catch (error) {
      const refused = fieldErrors(error)
      show(refused)
      if (Object.keys(refused).length === 0) refusal.value = problem(error)
      return null
    } finally {
      busy.value = false
    }
  }
  return { errors, refusal, busy, begin, send }
}
