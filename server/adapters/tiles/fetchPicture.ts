import { lookup as lookUp, type LookupAddress } from 'node:dns'
import { get as getPlain, type IncomingMessage } from 'node:http'
import { get as getSecure } from 'node:https'
import type { LookupFunction } from 'node:net'
import { isPrivateAddress } from './isPrivateAddress.ts'
import type { Tile } from './tileSource.ts'

/** A picture, none at that place, or no answer that can be used. */
export type Fetched = { state: 'found'; tile: Tile } | { state: 'none' } | { state: 'failed' }

/** SVG is left out: it can hold more than a picture. */
const PICTURES = new Set(['image/png', 'image/jpeg', 'image/webp', 'image/avif'])
const MOST_BYTES = 1_000_000
const PATIENCE_MS = 8_000
const AGENT = 'Drenchleaf'

/**
 * Fetches one picture. A redirect is not followed; what is larger than 1 MB, slower than 8 s or no picture is refused; so is a name that
 * leads into a private network, where a literal address in the operator's own setting is taken at its word. Never rejects.
 */
export function fetchPicture(address: string, patienceMs = PATIENCE_MS): Promise<Fetched> {
  return new Promise((resolve) => {
    const fail = (): void => resolve({ state: 'failed' })
    const get = address.startsWith('https:') ? getSecure : getPlain
    const request = get(address, { headers: { 'User-Agent': AGENT, Accept: [...PICTURES].join(', ') }, lookup: lookUpPublic, signal: AbortSignal.timeout(patienceMs) }, (response) => {
      readPicture(response).then(resolve, fail).finally(() => request.destroy())
    })
    request.on('error', fail)
  })
}

async function readPicture(response: IncomingMessage): Promise<Fetched> {
  const { statusCode, headers } = response
  if (statusCode === 404 || statusCode === 204) return { state: 'none' }
  const contentType = (headers['content-type'] ?? '').split(';')[0]?.trim().toLowerCase() ?? ''
  if (statusCode !== 200 || headers['content-encoding'] !== undefined || !PICTURES.has(contentType)) return { state: 'failed' }
  const chunks: Buffer[] = []
  let length = 0
  for await (const chunk of response as AsyncIterable<Buffer>) {
    length += chunk.length
    if (length > MOST_BYTES) return { state: 'failed' }
    chunks.push(chunk)
  }
  return length === 0 ? { state: 'failed' } : { state: 'found', tile: { contentType, bytes: Buffer.concat(chunks) } }
}

/** Names are resolved here and the answer is judged, so that no second look-up can lead elsewhere. */
const lookUpPublic: LookupFunction = (name, options, done) => {
  lookUp(name, { ...options, all: true }, (error, addresses: LookupAddress[]) => {
    const [first] = addresses ?? []
    if (error || !first || addresses.some(({ address }) => isPrivateAddress(address))) {
      done(error ?? new Error(`${name} leads into a private network`), '', 0)
    } else if (options.all === true) done(null, addresses)
    else done(null, first.address, first.family)
  })
}
