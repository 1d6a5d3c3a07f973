import type { MapMode } from '../../composables/map/mapTypes.ts'

/** What a key does on the map. */
export type MapKeyAction =
  | { do: 'pan'; dx: number; dy: number }
  | { do: 'neighbour'; dx: number; dy: number }
  | { do: 'cross'; eastM: number; northM: number }
  | { do: 'zoom'; by: 1 | -1 }
  | { do: 'step'; by: 1 | -1 }
  | { do: 'open' | 'pick' | 'addPoint' | 'removePoint' | 'close' | 'leave' | 'undo' | 'redo' }

/** The part of a keyboard event that decides. */
export interface MapKey {
  key: string
  shiftKey: boolean
  altKey: boolean
  ctrlKey: boolean
  metaKey: boolean
}

const ARROWS: Partial<Record<string, readonly [number, number]>> = {
  ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, -1], ArrowDown: [0, 1],
}
const PAN_PX = 80
const DRAW_KEYS: Partial<Record<string, MapKeyAction>> = {
  ' ': { do: 'addPoint' }, Backspace: { do: 'removePoint' }, Enter: { do: 'close' }, Escape: { do: 'leave' },
}

const EDIT_KEYS: Partial<Record<string, MapKeyAction>> = {
  ...DRAW_KEYS, ' ': { do: 'pick' }, Delete: { do: 'removePoint' }, n: { do: 'step', by: 1 }, p: { do: 'step', by: -1 },
}

/**
 * What a key does while the map has the focus, or null where the map leaves it to the browser.
 * Looking: arrows go from block to block, with Shift they pan, Enter opens. Drawing: arrows move the cross
 * 1 m, with Shift 10 m, with Alt 0.1 m; Space sets a point, Backspace takes the last, Enter closes. Editing: Space takes up what is
 * under the cross or lets go of it, Delete removes it, N and P go from corner to corner.
 */
export function mapKeyAction(event: MapKey, mode: MapMode): MapKeyAction | null {
  if (event.ctrlKey || event.metaKey) return mode !== 'look' ? historyAction(event) : null
  if (event.key === '+' || event.key === '=') return { do: 'zoom', by: 1 }
  if (event.key === '-' || event.key === '_') return { do: 'zoom', by: -1 }
  const arrow = ARROWS[event.key]
  if (arrow !== undefined) return arrowAction(arrow, event, mode)
  if (mode === 'edit') return EDIT_KEYS[event.key.length === 1 ? event.key.toLowerCase() : event.key] ?? null
  if (mode === 'draw') return DRAW_KEYS[event.key] ?? null
  return event.key === 'Enter' ? { do: 'open' } : null
}

function arrowAction([dx, dy]: readonly [number, number], event: MapKey, mode: MapMode): MapKeyAction {
  if (mode !== 'look') {
    const metres = event.altKey ? 0.1 : event.shiftKey ? 10 : 1
    return { do: 'cross', eastM: dx * metres, northM: dy === 0 ? 0 : -dy * metres }
  }
  if (event.shiftKey) return { do: 'pan', dx: dx * PAN_PX, dy: dy * PAN_PX }
  return { do: 'neighbour', dx, dy }
}

function historyAction(event: MapKey): MapKeyAction | null {
  const key = event.key.toLowerCase()
  if (key === 'y' || (key === 'z' && event.shiftKey)) return { do: 'redo' }
  return key === 'z' ? { do: 'undo' } : null
}
