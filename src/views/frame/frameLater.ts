// What the frame opens over a page. Read as one piece, before all else: signal may go any moment.
export { default as KeptDialog } from './KeptDialog.vue'
export { default as MoreSheet } from './MoreSheet.vue'
export { default as ReentryDialog } from './ReentryDialog.vue'
