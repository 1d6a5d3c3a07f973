import { crc32, deflateSync } from 'node:zlib'
import sharp from 'sharp'

/** A small picture of one colour; each colour is another file. */
export function buildPicture(type: 'jpeg' | 'png' | 'webp' = 'jpeg', { width = 640, height = 480, colour = '#7a6a3c' } = {}): Promise<Buffer> {
  return sharp({ create: { width, height, channels: 3, background: colour } }).toFormat(type).toBuffer()
}

/** A JPEG lying on its side, with a position, a camera and a time in it: what a phone writes. */
export function buildPhonePhoto(): Promise<Buffer> {
  return sharp({ create: { width: 3000, height: 1000, channels: 3, background: '#456' } })
    .withExif({
      IFD0: { Make: 'Invented', Model: 'Pocket 1' },
      IFD2: { DateTimeOriginal: '2026:06:16 06:12:30', OffsetTimeOriginal: '-07:00' },
      IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '44/1 36/1 40/1', GPSLongitudeRef: 'W', GPSLongitude: '123/1 18/1 50/1' },
    })
    .withMetadata({ orientation: 6 })
    .jpeg()
    .toBuffer()
}

/** A PNG whose header says how large it is, and little else. */
export function buildHugePng(width: number, height: number): Buffer {
  const header = Buffer.alloc(13)
  header.writeUInt32BE(width, 0)
  header.writeUInt32BE(height, 4)
  header.set([8, 0, 0, 0, 0], 8)
  const chunk = (name: string, data: Buffer): Buffer => {
    const body = Buffer.concat([Buffer.from(name, 'latin1'), data])
    const frame = Buffer.alloc(8)
    frame.writeUInt32BE(data.length, 0)
    frame.writeUInt32BE(crc32(body), 4)
    return Buffer.concat([frame.subarray(0, 4), body, frame.subarray(4)])
  }
  const signature = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a])
  return Buffer.concat([signature, chunk('IHDR', header), chunk('IDAT', deflateSync(Buffer.alloc(100_000))), chunk('IEND', Buffer.alloc(0))])
}

/** The first bytes of a phone's own kind of picture (ISO/IEC 23008-12: brand `heic`). */
export function buildHeic(): Buffer {
  return Buffer.concat([Buffer.from([0, 0, 0, 24]), Buffer.from('ftypheic\0\0\0\0mif1heic', 'latin1'), Buffer.alloc(200)])
}
