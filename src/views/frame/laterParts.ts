/** Parts of the frame that stand on no page until somebody opens them. */
export const LATER_PARTS = {
  kept: () => import('./KeptDialog.vue'),
  more: () => import('./MoreSheet.vue'),
  reentry: () => import('./ReentryDialog.vue'),
}
