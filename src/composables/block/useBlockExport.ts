import { writeGeoJson } from '../../../shared/importing/writeGeoJson.ts'
import { writeKml } from '../../../shared/importing/writeKml.ts'
import type { BlocksPlace } from './useBlocksPlace.ts'

export type ExportFormat = 'geojson' | 'kml'
const TYPES: Record<ExportFormat, string> = { geojson: 'application/geo+json', kml: 'application/vnd.google-earth.kml+xml' }

/** Gives the blocks of the farm out as a file, made on this device from what it has read. */
export function useBlockExport({ blocks, farm }: Pick<BlocksPlace, 'blocks' | 'farm'>): { giveOut: (format: ExportFormat) => void } {
  function giveOut(format: ExportFormat): void {
    const title = farm.value?.name ?? ''
    const text = format === 'geojson' ? writeGeoJson(blocks.value) : writeKml(blocks.value, title)
    const address = URL.createObjectURL(new Blob([text], { type: TYPES[format] }))
    const link = document.createElement('a')
    link.href = address
    link.download = `blocks.${format}`
    link.click()
    URL.revokeObjectURL(address)
  }
  return { giveOut }
}
