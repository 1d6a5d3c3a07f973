import { nextTick, onBeforeUnmount, onMounted } from 'vue'

interface RowKeys {
  ids: () => readonly string[]
  chosen: () => string | null
  choose: (id: string) => void
  open: (id: string) => void
  /** Makes sure that the row is drawn, where a long list draws those in sight only. */
  draw?: (id: string) => Promise<void>
}

const TYPING = 'input, textarea, select, [contenteditable="true"], [role="dialog"], [role="listbox"]'

/** J and K walk the rows of a ledger, Enter opens the chosen one; silent while someone types or a dialog is open. */
export function useRowKeys({ ids, chosen, choose, open, draw = () => nextTick() }: RowKeys): void {
  function walk(step: 1 | -1): void {
    const all = ids()
    const at = all.indexOf(chosen() ?? '')
    const next = all[at === -1 ? (step === 1 ? 0 : all.length - 1) : Math.min(Math.max(at + step, 0), all.length - 1)]
    if (next === undefined) return
    choose(next)
    void draw(next).then(() => {
      const row = [...document.querySelectorAll<HTMLElement>('[data-row]')].find((each) => each.dataset['row'] === next)
      row?.scrollIntoView({ block: 'nearest' })
      row?.querySelector<HTMLElement>('a')?.focus({ preventScroll: true })
    })
  }

  function onKey(event: KeyboardEvent): void {
    if (event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey) return
    const target = event.target instanceof Element ? event.target : null
    if (target?.closest(TYPING) || isDialogOpen()) return
    const key = event.key.toLowerCase()
    if (key === 'j' || key === 'k') {
      event.preventDefault()
      walk(key === 'j' ? 1 : -1)
      return
    }
    const id = chosen()
    const isElsewhere = target?.closest('a, button') && !target.closest('[data-row]')
    if (event.key !== 'Enter' || id === null || isElsewhere) return
    event.preventDefault()
    open(id)
  }

  onMounted(() => { window.addEventListener('keydown', onKey) })
  onBeforeUnmount(() => { window.removeEventListener('keydown', onKey) })
}

/** Closed dialogs may stay in the page without a box. */
function isDialogOpen(): boolean {
  return [...document.querySelectorAll('[role="dialog"]')].some((dialog) => dialog.getClientRects().length > 0)
}
