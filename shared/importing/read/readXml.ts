import { gpx, kmlWithFolders, type Folder, type Root } from '@tmcw/togeojson'
import { DOMParser, type Document } from '@xmldom/xmldom'
import type { ReadShape } from '../importTypes.ts'
import { ImportFault } from './importFault.ts'
import { readProperties } from './readProperties.ts'

/**
 * The shapes of a KML or GPX text. A document type or an entity of its own is refused before anything is parsed, so that nothing
 * is expanded and nothing is fetched.
 * @throws {ImportFault} if it holds a DTD, is no well-formed XML, or is neither KML nor GPX.
 */
export function readXml(text: string): { format: 'kml' | 'gpx'; shapes: ReadShape[] } {
  if (/<!(?:DOCTYPE|ENTITY)/i.test(text)) throw new ImportFault('dtd')
  const document = parse(text)
  const root = document.documentElement?.localName
  if (root === 'kml') return { format: 'kml', shapes: kmlShapes(kmlWithFolders(document), []) }
  if (root === 'gpx') return { format: 'gpx', shapes: gpx(document).features.map(shapeOf) }
  throw new ImportFault('xml_kind', { root: (root ?? '').slice(0, 40) })
}

function parse(text: string): Document {
  const stop = (): never => { throw new ImportFault('xml') }
  try {
    return new DOMParser({ onError: (level) => (level === 'warning' ? undefined : stop()) }).parseFromString(text, 'text/xml')
  } catch {
    return stop()
  }
}

/** Placemarks in the order of the file; one without a name goes by its folder's. */
function kmlShapes(folder: Folder | Root, above: readonly string[]): ReadShape[] {
  return folder.children.flatMap((child): ReadShape[] => {
    if (child.type === 'folder') return kmlShapes(child, [...above, String(child.meta['name'] ?? '')])
    // A link leads to another file, which nobody follows.
    if (child.properties?.['@geometry-type'] === 'networklink') return []
    const shape = shapeOf(child)
    const inFolder = above.filter((name) => name !== '').at(-1)
    if (inFolder !== undefined) shape.properties['folder'] ??= inFolder
    return [shape]
  })
}

function shapeOf({ geometry, properties }: { geometry: unknown; properties: Record<string, unknown> | null }): ReadShape {
  const isPicture = properties?.['@geometry-type'] === 'groundoverlay'
  return {
    geometry, properties: readProperties(properties),
    refusal: isPicture ? { id: 'importing.refused.picture', params: {} } : null,
  }
}
