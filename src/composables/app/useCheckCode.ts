import { ref, type Ref } from 'vue'
import type { CheckCodeAnswer } from '../../../shared/contract/record.ts'
import { checkApi } from '../../api/checkApi.ts'
import { useTask, type Task } from '../form/useTask.ts'

const LENGTH = 20

/** The check of a code as an outsider types it: capitals, blanks and dashes do not matter. */
export function useCheckCode(): {
  /** True when what was typed is no code. */
  unread: Ref<boolean>
  task: Task<[string], CheckCodeAnswer>
  /** Answers the code as it was read, or null. */
  check: (typed: string) => Promise<string | null>
} {
  const unread = ref(false)
  const task = useTask((code: string) => checkApi.read(code))

  async function check(typed: string): Promise<string | null> {
    const code = typed.toLowerCase().replace(/[^0-9a-z]/g, '')
    unread.value = code.length !== LENGTH || !/^[0-9a-f]+$/.test(code)
    task.result.value = undefined
    task.error.value = null
    if (unread.value) return null
    await task.run(code)
    return code
  }

  return { unread, task, check }
}
