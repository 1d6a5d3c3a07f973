import sharp from 'sharp'
import { invalid } from '../../errors.ts'
import { readTakenAt } from './readTakenAt.ts'

/** Most pixels of a picture, counted from its header before anything is unpacked. */
const MOST_PIXELS = 50_000_000
const LONGEST_SIDE = 2000
const SMALL_SIDE = 360
const QUALITY = 84
export const SERVED_TYPE = 'image/jpeg'

export interface EncodedImage {
  bytes: Buffer
  width: number
  height: number
  /** As the camera's clock said, RFC 3339; null where it said nothing. */
  takenAt: string | null
}

/**
 * The picture that is shown: turned upright, at most 2000 pixels long, JPEG, without position, camera or owner in it.
 * @param zone of the farm, for a camera that wrote no offset.
 * @throws {AppError} invalid-input `image.pixels` above 50 megapixels, `image.broken` if it cannot be read to its end.
 */
export async function encodeImage(original: Buffer, zone: string): Promise<EncodedImage> {
  const { width, height, exif } = await readHeader(original)
  if (width * height > MOST_PIXELS) throw invalid([{ path: 'file', code: 'image.pixels', params: { megapixels: Math.round((width * height) / 1e6), maximum: MOST_PIXELS / 1e6 } }])
  const picture = sharp(original, { failOn: 'error', limitInputPixels: MOST_PIXELS })
    .autoOrient()
    .resize({ width: LONGEST_SIDE, height: LONGEST_SIDE, fit: 'inside', withoutEnlargement: true })
    .flatten({ background: 'white' })
    .jpeg({ quality: QUALITY, chromaSubsampling: '4:4:4' })
  const { data, info } = await orBroken(picture.toBuffer({ resolveWithObject: true }))
  return { bytes: data, width: info.width, height: info.height, takenAt: readTakenAt(exif, zone) }
}

/** A small picture for a list, out of the one that is shown. */
export function shrinkImage(served: Buffer): Promise<Buffer> {
  return sharp(served).resize({ width: SMALL_SIDE, height: SMALL_SIDE, fit: 'inside', withoutEnlargement: true }).jpeg({ quality: QUALITY }).toBuffer()
}

async function readHeader(original: Buffer): Promise<{ width: number; height: number; exif: Buffer | undefined }> {
  const { width, height, exif } = await orBroken(sharp(original, { limitInputPixels: false }).metadata())
  return { width, height, exif }
}

/** The decoder throws plain errors for pictures that are cut off or damaged. */
async function orBroken<T>(work: Promise<T>): Promise<T> {
  return work.catch(() => { throw invalid([{ path: 'file', code: 'image.broken' }]) })
}
