import { frameOf, PAGE, type Canvas } from './canvas.ts'

/** The frame of an upright page. */
export const FRAME = frameOf(PAGE)
export const FRAME_WIDTH = FRAME.width
/** Running head with its rule and the white under it. */
const HEAD_HEIGHT = 26

/** Where the next thing goes; `y` falls down the page. */
export interface Flow { canvas: Canvas; y: number; footHeights: { first: number; later: number }; pages: number }

/** Starts the first page. Foot heights are in points, measured up from the frame's bottom. */
export function startFlow(canvas: Canvas, footHeights: Flow['footHeights']): Flow {
  const flow: Flow = { canvas, y: 0, footHeights, pages: 0 }
  turnPage(flow)
  return flow
}

export function turnPage(flow: Flow): void {
  flow.canvas.doc.addPage()
  flow.pages += 1
  flow.y = flow.canvas.frame.top + HEAD_HEIGHT
}

/** What is left of the page, points. */
export function roomLeft({ canvas, pages, footHeights, y }: Flow): number {
  return canvas.frame.bottom - (pages === 1 ? footHeights.first : footHeights.later) - y
}

/**
 * Turns the page if the next thing does not fit on this one. What is higher than a whole page stays where it is.
 * @returns whether a page was turned.
 */
export function ensureRoom(flow: Flow, height: number): boolean {
  if (height <= roomLeft(flow)) return false
  if (flow.y <= flow.canvas.frame.top + HEAD_HEIGHT) return false
  turnPage(flow)
  return true
}
