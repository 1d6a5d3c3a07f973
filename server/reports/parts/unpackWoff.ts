import { inflateSync } from 'node:zlib'

const HEADER = 44
const ENTRY = 20

/**
 * The plain font inside a WOFF 1.0 file. Opened packed, every glyph written would inflate the whole glyph table again.
 * @source W3C Recommendation WOFF File Format 1.0 (2012), sections 3 to 5.
 * @throws {RangeError} if the bytes are no WOFF 1.0 file.
 */
export function unpackWoff(woff: Buffer): Buffer {
  if (woff.length < HEADER || woff.toString('latin1', 0, 4) !== 'wOFF') throw new RangeError('not a WOFF 1.0 file')
  const count = woff.readUInt16BE(12)
  const directory = Buffer.alloc(12 + 16 * count)
  woff.copy(directory, 0, 4, 8)
  directory.writeUInt16BE(count, 4)
  const parts = [directory]
  let offset = directory.length
  for (let index = 0; index < count; index += 1) {
    const entry = HEADER + ENTRY * index
    const table = readTable(woff, entry)
    const at = 12 + 16 * index
    woff.copy(directory, at, entry, entry + 4)
    directory.writeUInt32BE(woff.readUInt32BE(entry + 16), at + 4)
    directory.writeUInt32BE(offset, at + 8)
    directory.writeUInt32BE(table.length, at + 12)
    const padded = Buffer.concat([table, Buffer.alloc((4 - (table.length % 4)) % 4)])
    parts.push(padded)
    offset += padded.length
  }
  return Buffer.concat(parts)
}

function readTable(woff: Buffer, entry: number): Buffer {
  const offset = woff.readUInt32BE(entry + 4)
  const packed = woff.readUInt32BE(entry + 8)
  const length = woff.readUInt32BE(entry + 12)
  const bytes = woff.subarray(offset, offset + packed)
  return packed < length ? inflateSync(bytes) : bytes
}
