export type PagePoint = [number, number]
export interface Stretch { x: number; y: number; width: number }
interface Clip { x: number; y: number; width: number; height: number }

const ROWS = 15

/**
 * Where a label stands best in an area: the middle of the widest level band inside it and inside the clip, of fifteen
 * tried; holes are outside. Bands near the area's middle win over wider ones at its edge.
 * @param height of the label, points. @returns null if no such band lies in the area.
 */
export function findLabelPlace(rings: readonly PagePoint[][], clip: Clip, height: number): Stretch | null {
  const ys = rings.flat().map(([, y]) => y)
  const top = Math.max(clip.y, Math.min(...ys))
  const bottom = Math.min(clip.y + clip.height, Math.max(...ys))
  if (!(bottom > top)) return null
  let best: { stretch: Stretch; worth: number } | null = null
  for (let row = 0; row < ROWS; row += 1) {
    const share = (row + 0.5) / ROWS
    const y = top + (bottom - top) * share
    const stretch = widestBand(rings, { y, height, clip })
    if (!stretch) continue
    const worth = stretch.width * (1 - 1.2 * Math.abs(share - 0.5))
    if (!best || worth > best.worth) best = { stretch, worth }
  }
  return best?.stretch ?? null
}

type Span = [from: number, to: number]

function widestBand(rings: readonly PagePoint[][], { y, height, clip }: { y: number; height: number; clip: Clip }): Stretch | null {
  const rows = [y - height / 2, y, y + height / 2].map((at) => spansAt(rings, at, clip))
  const inAll = rows.reduce((kept, spans) => kept.flatMap(([from, to]) =>
    spans.map(([start, end]): Span => [Math.max(from, start), Math.min(to, end)]).filter(([start, end]) => end > start)))
  const [from, to] = inAll.reduce<Span>((best, span) => (span[1] - span[0] > best[1] - best[0] ? span : best), [0, 0])
  return to > from ? { x: (from + to) / 2, y, width: to - from } : null
}

/** Where a level line at `y` lies inside the rings. */
function spansAt(rings: readonly PagePoint[][], y: number, clip: Clip): Span[] {
  if (y < clip.y || y > clip.y + clip.height) return []
  const crossings = rings.flatMap((ring) => crossingsAt(ring, y)).sort((a, b) => a - b)
  const spans: Span[] = []
  for (let index = 0; index + 1 < crossings.length; index += 2) {
    spans.push([Math.max(clip.x, crossings[index] ?? 0), Math.min(clip.x + clip.width, crossings[index + 1] ?? 0)])
  }
  return spans
}

function crossingsAt(ring: readonly PagePoint[], y: number): number[] {
  return ring.flatMap(([x, fromY], index) => {
    const [nextX, nextY] = ring[(index + 1) % ring.length] ?? [x, fromY]
    return (fromY <= y) === (nextY <= y) ? [] : [x + ((y - fromY) / (nextY - fromY)) * (nextX - x)]
  })
}
