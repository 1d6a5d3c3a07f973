import { computed, onMounted, onScopeDispose, ref, type ComputedRef, type Ref } from 'vue'

export interface SheetScrollOptions {
  /** The box that scrolls. */
  box: Readonly<Ref<HTMLElement | null>>
  days: () => number
  dayWidth: () => number
  /** Days drawn at once. */
  stretch: number
  /** The first Monday, as a day from 0. */
  monday: () => number
}

/**
 * Which stretches of the sheet are in sight, and one more on each side. A scroll that stays inside them changes nothing, so most
 * frames of a scroll run no work of ours at all.
 */
export function useSheetScroll({ box, days, dayWidth, stretch, monday }: SheetScrollOptions): { shown: ComputedRef<number[]>; onScroll: () => void; show: (day: number, share?: number) => void } {
  const first = ref(0)
  const last = ref(1)

  function onScroll(): void {
    const at = box.value
    if (at === null) return
    const width = stretch * dayWidth()
    const from = Math.floor(at.scrollLeft / width) - 1
    const to = Math.floor((at.scrollLeft + at.clientWidth) / width) + 1
    if (from !== first.value) first.value = from
    if (to !== last.value) last.value = to
  }

  /** Scrolls so that a day is in sight: at about a share of the width where one is given, so that a week begins at the edge, else no further than it must. */
  function show(day: number, share?: number): void {
    const at = box.value
    if (at === null) return
    const x = day * dayWidth()
    const room = at.clientWidth - names(at)
    if (share !== undefined) at.scrollLeft = weekBefore(x - room * share)
    else if (x < at.scrollLeft) at.scrollLeft = x - dayWidth()
    else if (x + 2 * dayWidth() > at.scrollLeft + room) at.scrollLeft = x + 2 * dayWidth() - room
    onScroll()
  }

  function weekBefore(left: number): number {
    const [start, week] = [monday() * dayWidth(), 7 * dayWidth()]
    return start + Math.floor((left - start) / week) * week
  }
  const names = (at: HTMLElement): number => at.querySelector<HTMLElement>('.sheet-names')?.offsetWidth ?? 0
  const watcher = new ResizeObserver(onScroll)
  onMounted(() => { if (box.value !== null) watcher.observe(box.value); onScroll() })
  onScopeDispose(() => { watcher.disconnect() })
  const shown = computed(() => {
    const most = Math.ceil(days() / stretch)
    const [from, to] = [Math.max(0, first.value), Math.min(most - 1, last.value)]
    return Array.from({ length: Math.max(0, to - from + 1) }, (_, index) => from + index)
  })
  return { shown, onScroll, show }
}
