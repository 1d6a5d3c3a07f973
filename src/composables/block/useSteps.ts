import { computed, shallowRef, type ComputedRef } from 'vue'

/** The way back and forth over what was drawn. */
export interface Steps<Step> {
  /** Goes on; what was here can be had back. */
  go: (next: Step) => void
  undo: () => void
  redo: () => void
  canUndo: ComputedRef<boolean>
  canRedo: ComputedRef<boolean>
}

/** @param here what is drawn now. @param put shows another state of it. @param turned called after going back or forth. */
export function useSteps<Step>(here: () => Step, put: (step: Step) => void, turned: () => void = () => undefined): Steps<Step> {
  const past = shallowRef<readonly Step[]>([])
  const future = shallowRef<readonly Step[]>([])

  function go(next: Step): void {
    past.value = [...past.value, here()]
    future.value = []
    put(next)
  }
  function turn(from: typeof past, to: typeof past): void {
    const step = from.value.at(-1)
    if (step === undefined) return
    to.value = [...to.value, here()]
    from.value = from.value.slice(0, -1)
    put(step)
    turned()
  }
  return {
    go,
    undo: () => { turn(past, future) },
    redo: () => { turn(future, past) },
    canUndo: computed(() => past.value.length > 0),
    canRedo: computed(() => future.value.length > 0),
  }
}
