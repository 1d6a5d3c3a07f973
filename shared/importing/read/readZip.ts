import { unzipSync, type UnzipFileInfo } from 'fflate'
import { IMPORT_LIMITS } from '../importTypes.ts'
import { ImportFault } from './importFault.ts'

const MB = 1_000_000
const READ = /\.(?:shp|dbf|prj|cpg|kml|gpx|geojson|json)$/i
/** Indexes and descriptions that go with a layer and hold no shapes, and what some systems add of their own. */
const SILENT = /\.(?:shx|sbn|sbx|qix|qpj|xml)$|^__MACOSX\/|(?:^|\/)\.|\/$/i

/** What a zip holds for us, unpacked, and the names of what it holds besides. */
export interface ReadZip {
  files: { name: string; bytes: Uint8Array }[]
  notRead: string[]
}

/**
 * Unpacks the files of a zip that may hold shapes. Entries are counted and their sizes added up from the zip's own list before
 * anything is unpacked; no entry is given more room than the list says, so one that lies about its size is cut, never grown.
 * @throws {ImportFault} beyond the limits, or if it is no zip that can be read.
 */
export function readZip(bytes: Uint8Array): ReadZip {
  const notRead: string[] = []
  let entries = 0
  let unpacked = 0
  const filter = ({ name, size, originalSize }: UnzipFileInfo): boolean => {
    entries += 1
    if (entries > IMPORT_LIMITS.zipEntries) throw new ImportFault('zip_entries', { most: IMPORT_LIMITS.zipEntries })
    if (SILENT.test(name)) return false
    if (!READ.test(name)) {
      notRead.push(name.slice(0, 80))
      return false
    }
    unpacked += originalSize
    if (unpacked > IMPORT_LIMITS.unpackedMB * MB) throw new ImportFault('zip_size', { most: IMPORT_LIMITS.unpackedMB })
    if (originalSize > MB && originalSize > size * IMPORT_LIMITS.zipRatio) throw new ImportFault('zip_ratio')
    return true
  }
  try {
    const files = Object.entries(unzipSync(bytes, { filter })).map(([name, content]) => ({ name, bytes: content }))
    return { files, notRead }
  } catch (error) {
    if (error instanceof ImportFault) throw error
    throw new ImportFault('zip')
  }
}
