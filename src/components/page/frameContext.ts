import { inject, type ComputedRef, type InjectionKey } from 'vue'
import type { SyncState } from '../marks/syncState.ts'

/** What the frame knows and every page shows in its head: set once by the app, read by the page's parts. */
export interface FrameContext {
  farmName: ComputedRef<string>
  /** Season of today on the open farm, null while not known. */
  season: ComputedRef<number | null>
  /** The open farm is one to try things on. */
  practice: ComputedRef<boolean>
  /** Farms to switch between; empty for who has one. */
  farms: ComputedRef<{ id: string; name: string }[]>
  farmId: ComputedRef<string>
  sync: ComputedRef<SyncState>
  /** "Oda Verrill, manager". */
  person: ComputedRef<string>
  chooseFarm: (id: string) => void
  openKept: () => void
  openMore: () => void
}

/** Under which the app provides the frame. */
export const frameKey: InjectionKey<FrameContext> = Symbol('frame')

/**
 * The frame around this page.
 * @throws {Error} outside of it.
 */
export function useFrame(): FrameContext {
  const frame = inject(frameKey)
  if (frame === undefined) throw new Error('No frame around this component')
  return frame
}
