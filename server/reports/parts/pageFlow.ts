import { frameOf, PAGE, type Canvas, type Frame } from './canvas.ts'

/** The frame of an upright page. */
export const FRAME = frameOf(PAGE)
export const FRAME_WIDTH = FRAME.width
/** A running head of one line with its rule and the white under it. */
const HEAD_HEIGHT = 26

/** Where the next thing goes; `y` falls down the page. */
export interface Flow {
  canvas: Canvas
  y: number
  footHeights: { first: number; later: number }
  /** Of the pages that are still to be turned to. */
  headHeight: number
  pages: number
  /** The page that bears the first foot. */
  firstPage: number
  /** The frame of each page so far. */
  frames: Frame[]
}

/** Starts the first page. Heights of foot and head are in points, measured from the frame's bottom and top. */
export function startFlow(canvas: Canvas, footHeights: Flow['footHeights'], headHeight = HEAD_HEIGHT): Flow {
  const flow: Flow = { canvas, y: 0, footHeights, headHeight, pages: 0, firstPage: 1, frames: [] }
  turnPage(flow)
  return flow
}

export function turnPage(flow: Flow): void {
  flow.canvas.doc.addPage()
  enterPage(flow)
}

/** Turns to a page of A4 that stands or lies; those after it are like it until another is asked for. */
export function turnTo(flow: Flow, { isLying }: { isLying: boolean }): void {
  const { canvas } = flow
  const size = isLying ? { width: PAGE.height, height: PAGE.width } : PAGE
  canvas.doc.options.size = [size.width, size.height]
  canvas.doc.addPage()
  canvas.frame = frameOf(size)
  enterPage(flow)
}

/** Goes back to a page to draw what could not be drawn before. */
export function backTo({ canvas, frames }: Flow, page: number): void {
  canvas.doc.switchToPage(page - 1)
  canvas.frame = frames[page - 1] ?? canvas.frame
}

function enterPage(flow: Flow): void {
  flow.pages += 1
  flow.frames.push(flow.canvas.frame)
  flow.y = flow.canvas.frame.top + flow.headHeight
}

/** What is left of the page, points. */
export function roomLeft({ canvas, pages, firstPage, footHeights, y }: Flow): number {
  return canvas.frame.bottom - (pages === firstPage ? footHeights.first : footHeights.later) - y
}

/**
 * Turns the page if the next thing does not fit on this one. What is higher than a whole page stays where it is.
 * @returns whether a page was turned.
 */
export function ensureRoom(flow: Flow, height: number): boolean {
  if (height <= roomLeft(flow)) return false
  if (flow.y <= flow.canvas.frame.top + flow.headHeight) return false
  turnPage(flow)
  return true
}
