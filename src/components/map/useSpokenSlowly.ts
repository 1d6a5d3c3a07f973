import { onScopeDispose, ref, watch, type Ref } from 'vue'

const LEAST_MS = 1000

/** The latest words, changed at most once a second, so that a screen reader can finish a sentence. */
export function useSpokenSlowly(words: () => string): Readonly<Ref<string>> {
  const spoken = ref('')
  let timer: number | undefined
  let latest = ''
  let resting = false

  function say(): void {
    spoken.value = latest
    resting = true
    timer = window.setTimeout(() => {
      resting = false
      if (latest !== spoken.value) say()
    }, LEAST_MS)
  }
  watch(words, (value) => {
    latest = value
    if (!resting) say()
  }, { immediate: true })
  onScopeDispose(() => { window.clearTimeout(timer) })
  return spoken
}
