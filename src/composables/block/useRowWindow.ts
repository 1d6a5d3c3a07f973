import { onBeforeUnmount, onMounted, ref, watch, type Ref } from 'vue'

/** Which rows of a long list are drawn: those in sight and some on either side. */
export interface RowWindow {
  /** Number of the first row drawn, and of the first one after the last. */
  from: Ref<number>
  to: Ref<number>
  /** Height of one row, pixels; all have the same. */
  rowPx: Ref<number>
  /** Draws the row of that number, so that it can be brought into view. */
  draw: (row: number) => void
}

const AROUND = 12
const FIRST_PX = 36

/** @param body the element that holds the rows, each marked by `data-row`. @param count how many rows there are. */
export function useRowWindow(body: Readonly<Ref<HTMLElement | null>>, count: () => number): RowWindow {
  const [from, to, rowPx] = [ref(0), ref(AROUND * 4), ref(FIRST_PX)]

  function put(first: number, last: number): void {
    from.value = Math.max(0, Math.min(first - AROUND, count() - 1))
    to.value = Math.min(count(), last + AROUND)
  }
  function look(): void {
    if (body.value === null) return
    rowPx.value = body.value.querySelector<HTMLElement>('[data-row]')?.offsetHeight ?? rowPx.value
    const { top } = body.value.getBoundingClientRect()
    put(Math.floor(-top / rowPx.value), Math.ceil((window.innerHeight - top) / rowPx.value))
  }

  watch([body, count], look, { flush: 'post' })
  onMounted(() => {
    // Whatever scrolls, the page or a panel in it.
    window.addEventListener('scroll', look, { capture: true, passive: true })
    window.addEventListener('resize', look)
    look()
  })
  onBeforeUnmount(() => {
    window.removeEventListener('scroll', look, { capture: true })
    window.removeEventListener('resize', look)
  })
  return { from, to, rowPx, draw: (row) => { if (row < from.value || row >= to.value) put(row, row + 1) } }
}
