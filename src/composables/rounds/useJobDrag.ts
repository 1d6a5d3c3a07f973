import { ref, type Ref } from 'vue'

/** A cell by its row and day, both from 0. */
export interface SheetPlace { row: number; day: number }

export interface JobDragOptions<Job> {
  placeAt: (event: PointerEvent) => SheetPlace
  /** The job that can be dragged from there, or null. */
  jobAt: (place: SheetPlace) => Job | null
  dropped: (job: Job, to: SheetPlace) => void
  pressed: (place: SheetPlace) => void
}

const LEAST_PX = 4

/** A job dragged along its row to another day by a pointer; a press that does not move chooses the cell. A finger scrolls. */
export function useJobDrag<Job>({ placeAt, jobAt, dropped, pressed }: JobDragOptions<Job>): {
  ghost: Ref<SheetPlace | null>
  down: (event: PointerEvent) => void
  move: (event: PointerEvent) => void
  up: (event: PointerEvent) => void
  cancel: () => void
} {
  const ghost = ref<SheetPlace | null>(null)
  let held: { job: Job | null; from: SheetPlace; x: number } | null = null

  return {
    ghost,
    down: (event) => {
      if (event.button !== 0) return
      const from = placeAt(event)
      const job = event.pointerType === 'touch' ? null : jobAt(from)
      held = { job, from, x: event.clientX }
      if (job !== null) (event.currentTarget as HTMLElement).setPointerCapture(event.pointerId)
    },
    move: (event) => {
      if (held === null || held.job === null || (ghost.value === null && Math.abs(event.clientX - held.x) < LEAST_PX)) return
      ghost.value = { row: held.from.row, day: placeAt(event).day }
    },
    up: (event) => {
      const was = held
      const to = ghost.value
      held = null
      ghost.value = null
      if (was === null) return
      if (to === null) pressed(placeAt(event))
      else if (was.job !== null && to.day !== was.from.day) dropped(was.job as Job, to)
    },
    cancel: () => { held = null; ghost.value = null },
  }
}
