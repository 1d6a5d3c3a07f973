import { computed, shallowRef, type ComputedRef } from 'vue'
import type { Shape } from './shape.ts'

/** The way back and forth over the steps of one shape. */
export interface ShapeSteps {
  /** Goes on to another shape; what was here can be had back. */
  go: (next: Shape) => void
  undo: () => void
  redo: () => void
  canUndo: ComputedRef<boolean>
  canRedo: ComputedRef<boolean>
}

/** @param here the shape as it is. @param put shows another one. @param turned called after going back or forth. */
export function useShapeSteps(here: () => Shape, put: (shape: Shape) => void, turned: () => void): ShapeSteps {
  const past = shallowRef<readonly Shape[]>([])
  const future = shallowRef<readonly Shape[]>([])

  function go(next: Shape): void {
    past.value = [...past.value, here()]
    future.value = []
    put(next)
  }
  function step(from: typeof past, to: typeof past): void {
    const shape = from.value.at(-1)
    if (shape === undefined) return
    to.value = [...to.value, here()]
    from.value = from.value.slice(0, -1)
    put(shape)
    turned()
  }
  return {
    go,
    undo: () => { step(past, future) },
    redo: () => { step(future, past) },
    canUndo: computed(() => past.value.length > 0),
    canRedo: computed(() => future.value.length > 0),
  }
}
