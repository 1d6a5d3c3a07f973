import { LRUCache } from 'lru-cache'
import { AppError, notFound } from '../../errors.ts'
import { fetchPicture, type Fetched } from './fetchPicture.ts'
import type { Tile, TileSource } from './tileSource.ts'

/** A tile service as an operator names it. */
export interface TileService {
  /** Address of a square with {z}, {x} and {y} in it. */
  template: string
  attribution: string
  maxZoom: number
}

const CACHE_BYTES = 64_000_000
const DAY_MS = 86_400_000

/**
 * Tiles of one service, fetched by this server and kept in memory for a day. The host is the one in the template; of what is asked for only
 * three whole numbers go into the address.
 */
export function createProxyTiles({ template, attribution, maxZoom }: TileService): TileSource {
  const kept = new LRUCache<string, Tile>({ maxSize: CACHE_BYTES, sizeCalculation: ({ bytes }) => bytes.length + 100, ttl: DAY_MS })
  const asked = new Map<string, Promise<Fetched>>()
  async function read(z: number, x: number, y: number): Promise<Tile> {
    const address = addressOf(template, { z, x, y })
    const known = kept.get(address)
    if (known) return known
    // Two people who look at one place ask once.
    const asking = asked.get(address) ?? fetchPicture(address).finally(() => asked.delete(address))
    asked.set(address, asking)
    const fetched = await asking
    if (fetched.state === 'none') throw notFound()
    if (fetched.state === 'failed') throw new AppError('unavailable', 'tiles')
    kept.set(address, fetched.tile)
    return fetched.tile
  }
  return {
    attribution, maxZoom,
    read: async (z, x, y) => {
      if (![z, x, y].every(Number.isSafeInteger) || z < 0 || z > maxZoom || Math.min(x, y) < 0 || Math.max(x, y) >= 2 ** z) throw notFound()
      return read(z, x, y)
    },
  }
}

function addressOf(template: string, numbers: { z: number; x: number; y: number }): string {
  return template.replaceAll(/\{([zxy])\}/g, (_whole, name: 'z' | 'x' | 'y') => String(numbers[name]))
}
