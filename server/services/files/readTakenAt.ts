import readExif from 'exif-reader'
import { parseInstant } from '../../../shared/time/parseInstant.ts'
import { toInstant } from '../../../shared/time/toInstant.ts'

/**
 * When a picture was taken, as the camera's clock said: with its own offset, else read as a clock time of the farm.
 * @param exif the block of the picture, as Exif 2.32 lays it out; @param zone IANA name.
 * @returns RFC 3339, or null where nothing readable is said, or a clock time that the zone does not have or has twice.
 */
export function readTakenAt(exif: Buffer | undefined, zone: string): string | null {
  const said = exif && tryExif(exif)?.Photo
  const local = said?.DateTimeOriginal
  if (!(local instanceof Date) || Number.isNaN(local.getTime())) return null
  // The reader gives the clock time as if it were UTC.
  const [date = '', time = ''] = local.toISOString().slice(0, 19).split('T')
  const offset = said?.OffsetTimeOriginal
  if (typeof offset === 'string' && /^[+-]\d\d:\d\d$/.test(offset)) return known(`${date}T${time}${offset}`)
  const found = toInstant({ date, time, zone })
  return found.ok ? known(found.instant) : null
}

function tryExif(exif: Buffer): ReturnType<typeof readExif> | null {
  try {
    return readExif(exif)
  } catch {
    // A damaged block says nothing; the picture itself may be whole.
    return null
  }
}

function known(text: string): string | null {
  const read = parseInstant(text)
  return read.ok ? read.instant : null
}
