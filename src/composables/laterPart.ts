import { defineAsyncComponent, type Component } from 'vue'
import { openNewBuild } from '../stores/newBuild.ts'

type Load = () => Promise<{ default: Component }>

const loads = new Set<Load>()

/** A part that a page does without until somebody opens it: read when it is first shown, or ahead when the browser is idle. */
export function laterPart(load: Load): Component {
  loads.add(load)
  return defineAsyncComponent({
    loader: load,
    onError: (_error, _retry, fail) => { void openNewBuild(window.location.href).finally(fail) },
  })
}

/** Reads the later parts of everything that was read so far; what does not come now comes when it is opened. */
export async function readLaterParts(): Promise<void> {
  await Promise.allSettled([...loads].map((load) => load()))
}
