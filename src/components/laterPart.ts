import { defineAsyncComponent, type Component } from 'vue'
import { openNewBuild } from '../stores/newBuild.ts'

type Load = () => Promise<{ default: Component }>

/** Parts that a phone on its way to a record does without until somebody opens them. */
export const LATER_COMPONENTS = {
  list: () => import('./app/SelectList.vue'),
  happened: () => import('./record/RecordHappened.vue'),
  signFoot: () => import('./record/SignFoot.vue'),
  signed: () => import('./record/RecordSigned.vue'),
  partDrawing: () => import('./record/PartDrawing.vue'),
} satisfies Record<string, Load>

/** A part read when it is first shown. */
export function laterPart(load: Load): Component {
  return defineAsyncComponent({
    loader: load,
    onError: (_error, _retry, fail) => { void openNewBuild(window.location.href).finally(fail) },
  })
}
