import { onMounted, onUnmounted } from 'vue'

/** Parts of the screen in the order F6 walks them. */
const PARTS = ['[data-part="spine"]', '[data-part="page"]', '[data-part="checks"]']

/** F6 moves the focus to the next part of the screen, Shift+F6 to the one before. */
export function useLandmarkKeys(): void {
  function onKey(event: KeyboardEvent): void {
    if (event.key !== 'F6' || isDialogOpen()) return
    const parts = PARTS.flatMap((selector) => [...document.querySelectorAll<HTMLElement>(selector)]).filter((part) => part.offsetParent !== null || part.getClientRects().length > 0)
    if (parts.length === 0) return
    event.preventDefault()
    const here = parts.findIndex((part) => part.contains(document.activeElement))
    const next = here < 0 ? 0 : (here + (event.shiftKey ? parts.length - 1 : 1)) % parts.length
    parts[next]?.focus()
  }
  onMounted(() => { window.addEventListener('keydown', onKey) })
  onUnmounted(() => { window.removeEventListener('keydown', onKey) })
}

/** Closed dialogs may stay in the page without a box. */
function isDialogOpen(): boolean {
  return [...document.querySelectorAll('[role="dialog"][aria-modal="true"]')].some((dialog) => dialog.getClientRects().length > 0)
}
