import { v4 } from 'uuid'

/**
 * What lies over a page (a dialog, a sheet) has an entry of its own in the browser's history, so that Back closes it
 * instead of leaving the page. The router never hears of these entries: their address is the page's own.
 */
interface Overlay {
  id: string
  href: string
  close: () => void
}

interface Leaving {
  done: Promise<void>
  finish: () => void
}

/** A browser that takes no step back answers nothing; nobody waits longer for it. */
const PATIENCE_MS = 400

const open: Overlay[] = []
let leaving: Leaving | null = null

const entryOf = (state: unknown): string | null => (state as { overlay?: string } | null)?.overlay ?? null
const isOpen = (id: string | null): boolean => open.some((overlay) => overlay.id === id)

/** Begins to watch; call before the router does. */
export function watchOverlays(): void {
  window.addEventListener('popstate', onPop)
}

/** Something opens over the page. @returns its id, for `leaveOverlay`. */
export function enterOverlay(close: () => void): string {
  const overlay = { id: v4(), href: location.href, close }
  open.push(overlay)
  void overlaysSettled().then(() => {
    if (isOpen(overlay.id)) history.pushState({ ...history.state as object, overlay: overlay.id }, '')
  })
  return overlay.id
}

/** It closed by itself: its entry goes too, unless another page already stands on it. */
export function leaveOverlay(id: string): void {
  const at = open.findIndex((overlay) => overlay.id === id)
  if (at < 0) return
  open.splice(at, 1)
  if (leaving === null && entryOf(history.state) === id) stepBack()
}

/** Resolves once no entry is on its way out: only then may another page be opened. */
export function overlaysSettled(): Promise<void> {
  return leaving?.done ?? Promise.resolve()
}

function stepBack(): void {
  let finish = (): void => undefined
  const done = new Promise<void>((resolve) => { finish = resolve })
  leaving = { done, finish: () => { leaving = null; finish() } }
  const mine = leaving
  window.setTimeout(() => { if (leaving === mine) mine.finish() }, PATIENCE_MS)
  history.back()
}

function onPop(event: PopStateEvent): void {
  const landed = entryOf(event.state)
  const isLeft = landed !== null && !isOpen(landed)
  const top = open.at(-1)
  if (leaving !== null) {
    event.stopImmediatePropagation()
    if (isLeft) history.back()
    else leaving.finish()
  } else if (top !== undefined && top.id !== landed && location.href === top.href) {
    event.stopImmediatePropagation()
    open.pop()
    top.close()
  } else if (isLeft) {
    // The page itself is one step further down; the router is on its way to it already.
    window.setTimeout(() => { if (entryOf(history.state) === landed) stepBack() })
  }
}
