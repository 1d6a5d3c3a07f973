import { defineAsyncComponent, type Component } from 'vue'
import { openNewBuild } from '../../stores/newBuild.ts'

/** Parts of the frame that stand on no page until somebody opens them. */
export const LATER_PARTS: Record<'kept' | 'more' | 'reentry', () => Promise<{ default: Component }>> = {
  kept: () => import('./KeptDialog.vue'),
  more: () => import('./MoreSheet.vue'),
  reentry: () => import('./ReentryDialog.vue'),
}

/** A part read when it is first shown. */
export function laterPart(name: keyof typeof LATER_PARTS): Component {
  return defineAsyncComponent({
    loader: LATER_PARTS[name],
    onError: (_error, _retry, fail) => { void openNewBuild(window.location.href).finally(fail) },
  })
}
