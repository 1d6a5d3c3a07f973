/** Four whole numbers of two ends in grid units. */
export interface Segment { ax: number; ay: number; bx: number; by: number }

/** Which side of a→b the point lies: above 0 left, below 0 right, 0 on the line. Exact for ends within 6 degrees. */
export function sideOf({ ax, ay, bx, by }: Segment, px: number, py: number): number {
  return Math.sign((bx - ax) * (py - ay) - (by - ay) * (px - ax))
}

/** True where the inner parts of two segments cross in one point. */
export function crossesProperly(s: Segment, t: Segment): boolean {
  const a = sideOf(s, t.ax, t.ay)
  const b = sideOf(s, t.bx, t.by)
  if (a * b >= 0) return false
  return sideOf(t, s.ax, s.ay) * sideOf(t, s.bx, s.by) < 0
}

/** A point two segments share, in grid units, or null where they share none; for an overlap along a line, its lowest end. */
export function sharedPoint(s: Segment, t: Segment): readonly [number, number] | null {
  if (crossesProperly(s, t)) {
    const along = (t.bx - t.ax) * (t.ay - s.ay) - (t.by - t.ay) * (t.ax - s.ax)
    const fraction = along / ((t.bx - t.ax) * (s.by - s.ay) - (t.by - t.ay) * (s.bx - s.ax))
    return [s.ax + fraction * (s.bx - s.ax), s.ay + fraction * (s.by - s.ay)]
  }
  const touches: (readonly [number, number])[] = []
  if (isOn(s, t.ax, t.ay)) touches.push([t.ax, t.ay])
  if (isOn(s, t.bx, t.by)) touches.push([t.bx, t.by])
  if (isOn(t, s.ax, s.ay)) touches.push([s.ax, s.ay])
  if (isOn(t, s.bx, s.by)) touches.push([s.bx, s.by])
  return touches.sort((p, q) => p[0] - q[0] || p[1] - q[1])[0] ?? null
}

function isOn(s: Segment, px: number, py: number): boolean {
  return (
    px >= Math.min(s.ax, s.bx) && px <= Math.max(s.ax, s.bx) && py >= Math.min(s.ay, s.by) && py <= Math.max(s.ay, s.by) &&
    sideOf(s, px, py) === 0
  )
}
