import type { Pixel } from '../../composables/map/mapTypes.ts'

/**
 * The next block in a direction: the nearest whose middle lies within 60° of it.
 * @param middles middles of all blocks in pixels by id, y downwards.
 * @param from id to start from; where it is null or unknown, the block nearest the start of that direction.
 * @param direction one of the four unit steps.
 * @returns an id, or null where nothing lies that way.
 */
export function neighbourOf(middles: ReadonlyMap<string, Pixel>, from: string | null, direction: Pixel): string | null {
  const start = from === null ? undefined : middles.get(from)
  if (start === undefined) return firstAlong(middles, direction)
  let best: string | null = null
  let least = Number.POSITIVE_INFINITY
  for (const [id, [x, y]] of middles) {
    const [dx, dy] = [x - start[0], y - start[1]]
    const ahead = dx * direction[0] + dy * direction[1]
    const aside = Math.abs(dx * direction[1]) + Math.abs(dy * direction[0])
    if (id === from || ahead <= 0 || aside > ahead * 1.75) continue
    const cost = ahead + aside * 1.5
    if (cost < least) [best, least] = [id, cost]
  }
  return best
}

function firstAlong(middles: ReadonlyMap<string, Pixel>, direction: Pixel): string | null {
  let best: string | null = null
  let least = Number.POSITIVE_INFINITY
  for (const [id, [x, y]] of middles) {
    const cost = x * direction[0] + y * direction[1]
    if (cost < least) [best, least] = [id, cost]
  }
  return best
}
