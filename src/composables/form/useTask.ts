import { ref, shallowRef, type Ref, type ShallowRef } from 'vue'
import { NetworkError } from '../../api/errors.ts'
import { useSignalBack } from '../app/useSignalBack.ts'

/** One piece of work and how it stands. */
export interface Task<Args extends unknown[], Answer> {
  run: (...args: Args) => Promise<Answer | undefined>
  running: Ref<boolean>
  error: ShallowRef<unknown>
  result: ShallowRef<Answer | undefined>
}

/** Runs `task` and keeps its answer or its error; an overtaken run may no longer write. `run` never throws. A lack of signal is no error any more once it is back. */
export function useTask<Args extends unknown[], Answer>(task: (...args: Args) => Promise<Answer>): Task<Args, Answer> {
  const running = ref(false)
  const error = shallowRef<unknown>(null)
  const result = shallowRef<Answer>()
  let latest = 0

  async function run(...args: Args): Promise<Answer | undefined> {
    latest += 1
    const mine = latest
    running.value = true
    error.value = null
    try {
      const answer = await task(...args)
      if (mine === latest) result.value = answer
      return answer
    } catch (cause) {
      if (mine === latest) error.value = cause
      return undefined
    } finally {
      if (mine === latest) running.value = false
    }
  }

  useSignalBack(() => { if (error.value instanceof NetworkError) error.value = null })
  return { run, running, error, result }
}
