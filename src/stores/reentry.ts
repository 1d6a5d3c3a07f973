import { defineStore } from 'pinia'
import { ref } from 'vue'

/** The session has ended in the middle of work: one question at a time, and all that wait share its answer. */
export const useReentry = defineStore('reentry', () => {
  const asking = ref(false)
  let question: Promise<boolean> | null = null
  let answerQuestion: ((signedIn: boolean) => void) | null = null

  function ask(): Promise<boolean> {
    asking.value = true
    question ??= new Promise<boolean>((resolve) => { answerQuestion = resolve })
    return question
  }

  function settle(signedIn: boolean): void {
    asking.value = false
    answerQuestion?.(signedIn)
    question = null
    answerQuestion = null
  }

  return { asking, ask, settle }
})
