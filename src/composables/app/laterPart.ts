import { defineAsyncComponent, type Component } from 'vue'
import { readLaterWords } from '../../plugins/i18n.ts'
import { openNewBuild } from '../../stores/newBuild.ts'

type Load = () => Promise<unknown>

const loads = new Set<Load>()

/** A part or a view, with all the words it may say. */
export async function withWords<Loaded>(load: () => Promise<Loaded>): Promise<Loaded> {
  const [loaded] = await Promise.all([load(), readLaterWords()])
  return loaded
}

/** Something that a page does without until it is used: read then, or ahead when the browser is idle. */
export function laterCode<Loaded>(load: () => Promise<Loaded>): () => Promise<Loaded> {
  loads.add(load)
  return load
}

/**
 * A part that a page does without until somebody opens it, read in the same way; of a piece with several parts, the one that is picked.
 * Named beside a component, not in its setup: each instance would name it anew.
 */
export function laterPart(load: () => Promise<{ default: Component }>): Component
export function laterPart<Parts>(load: () => Promise<Parts>, pick: (parts: Parts) => Component): Component
export function laterPart<Parts extends { default?: Component }>(load: () => Promise<Parts>, pick = ({ default: part }: Parts) => part): Component {
  const read = laterCode(load)
  return defineAsyncComponent({
    loader: async () => {
      const part = pick(await withWords(read))
      if (part === undefined) throw new Error('the piece has no such part')
      return part
    },
    onError: (_error, _retry, fail) => { void openNewBuild(window.location.href).finally(fail) },
  })
}

/** Reads all that comes later of everything that was read so far, and of what is read with it; what does not come now comes when it is used. */
export async function readLaterParts(): Promise<void> {
  for (let known = 0; known < loads.size;) {
    known = loads.size
    await Promise.allSettled([...loads].map((load) => load()))
  }
}
