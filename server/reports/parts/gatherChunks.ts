import { Transform } from 'node:stream'

const CHUNK = 64 * 1024

/** Gathers the library's many scraps of a few bytes into chunks of 64 KiB, each of which costs a write or a message. */
export function gatherChunks(): Transform {
  let scraps: Buffer[] = []
  let size = 0
  const take = (): Buffer => {
    const chunk = Buffer.concat(scraps)
    scraps = []
    size = 0
    return chunk
  }
  return new Transform({
    transform(scrap: Buffer, _encoding, done) {
      scraps.push(scrap)
      size += scrap.length
      done(null, size >= CHUNK ? take() : undefined)
    },
    flush(done) {
      done(null, take())
    },
  })
}
