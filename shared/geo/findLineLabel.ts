/** A point of a page or a map, x right and y down, in points or pixels. */
type FlatPoint = readonly [number, number]
interface FlatBox { x: number; y: number; width: number; height: number }

/** Middle of a label that runs along a line, and how far it is turned, degrees clockwise, never upside down. */
export interface LineLabel { x: number; y: number; turn: number }

const STEP = 3
/** Away from the middle of the frame, where the block's own label stands. */
const SHARE = 0.8

/**
 * Where the name of a line stands on its longest stretch inside the frame.
 * @param width of the name, in the same unit as the points.
 * @returns null if no stretch in the frame is long enough for it.
 */
export function findLineLabel(lines: readonly FlatPoint[][], frame: FlatBox, width: number): LineLabel | null {
  const stretch = longestStretch(lines, frame)
  const needed = Math.ceil(width / STEP)
  if (stretch.length < needed * 1.3) return null
  const middle = Math.min(Math.round(stretch.length * SHARE), stretch.length - 1 - Math.ceil(needed / 2))
  const from = stretch[Math.max(0, middle - Math.ceil(needed / 2))]
  const to = stretch[Math.min(stretch.length - 1, middle + Math.ceil(needed / 2))]
  if (!from || !to) return null
  const turn = (Math.atan2(to[1] - from[1], to[0] - from[0]) * 180) / Math.PI
  return { x: (from[0] + to[0]) / 2, y: (from[1] + to[1]) / 2, turn: turn > 90 ? turn - 180 : turn <= -90 ? turn + 180 : turn }
}

function longestStretch(lines: readonly FlatPoint[][], frame: FlatBox): FlatPoint[] {
  let best: FlatPoint[] = []
  for (const line of lines) {
    let current: FlatPoint[] = []
    for (const point of walk(line, frame)) {
      if (point === null) current = []
      else current.push(point)
      if (current.length > best.length) best = current
    }
  }
  return best
}

/** Points every few points along a line; null where it leaves the frame. */
function* walk(line: readonly FlatPoint[], frame: FlatBox): Generator<FlatPoint | null> {
  for (let index = 0; index + 1 < line.length; index += 1) {
    const [x, y] = line[index] ?? [0, 0]
    const [toX, toY] = line[index + 1] ?? [x, y]
    if (!touches(frame, [Math.min(x, toX), Math.min(y, toY)], [Math.max(x, toX), Math.max(y, toY)])) {
      yield null
      continue
    }
    const steps = Math.max(1, Math.min(20_000, Math.ceil(Math.hypot(toX - x, toY - y) / STEP)))
    for (let step = 0; step < steps; step += 1) {
      const point: FlatPoint = [x + ((toX - x) * step) / steps, y + ((toY - y) * step) / steps]
      yield touches(frame, point, point) ? point : null
    }
  }
}

function touches(frame: FlatBox, [left, top]: FlatPoint, [right, bottom]: FlatPoint): boolean {
  const inset = 5
  return right >= frame.x + inset && left <= frame.x + frame.width - inset
    && bottom >= frame.y + inset && top <= frame.y + frame.height - inset
}
