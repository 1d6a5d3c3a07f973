import { strToU8, unzipSync, zipSync } from 'fflate'
import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { ImportFault } from '../../../shared/importing/read/importFault.ts'
import { readImport } from '../../../shared/importing/read/readImport.ts'
import { translate } from '../../../shared/messages/translate.ts'

/** Code of the refusal of a file, whose words both languages have. */
function faultOf(bytes: Uint8Array): string {
  try {
    readImport(bytes)
  } catch (error) {
    if (!(error instanceof ImportFault)) throw error
    const { id } = error.words
    for (const language of ['en', 'es'] as const) translate(language, id)
    return id.replace('importing.fault.', '')
  }
  return 'read'
}

const kml = (inside: string, head = ''): Uint8Array =>
  strToU8(`<?xml version="1.0" encoding="UTF-8"?>${head}<kml xmlns="http://www.opengis.net/kml/2.2"><Document>${inside}</Document></kml>`)
const placemark = '<Placemark><name>A</name><Point><coordinates>1,2</coordinates></Point></Placemark>'
const nested = '<!DOCTYPE kml [<!ENTITY a "aaaaaaaaaa"><!ENTITY b "&a;&a;&a;&a;&a;&a;&a;&a;&a;&a;">]>'
const utf16 = (text: string): Uint8Array => new Uint8Array([0xff, 0xfe, ...[...text].flatMap((letter) => [letter.charCodeAt(0) & 255, letter.charCodeAt(0) >> 8])])
const lying = (bytes: Uint8Array, claimed: number): Uint8Array => {
  const changed = bytes.slice()
  const view = new DataView(changed.buffer)
  // The size in the zip's own list of entries (central directory, offset 24 of its first record).
  for (let at = 0; at < changed.length - 4; at += 1) if (view.getUint32(at, true) === 0x02014b50) view.setUint32(at + 24, claimed, true)
  return changed
}

describe('files that are refused whole, in words', () => {
  it.each([
    { name: 'an empty file', bytes: new Uint8Array(), fault: 'empty' },
    { name: 'a picture', bytes: new Uint8Array([0x89, 0x50, 0x4e, 0x47, 1, 2, 3]), fault: 'encoding' },
    { name: 'plain words', bytes: strToU8('name,lat,lon\nA,1,2'), fault: 'format' },
    { name: 'broken JSON', bytes: strToU8('{"type":'), fault: 'json' },
    { name: 'JSON that is no GeoJSON', bytes: strToU8('{"type":"Topology"}'), fault: 'geojson' },
    { name: 'GeoJSON in another reference system', bytes: strToU8('{"type":"FeatureCollection","crs":{"type":"name","properties":{"name":"urn:ogc:def:crs:EPSG::32610"}},"features":[]}'), fault: 'crs' },
    { name: 'no shape at all', bytes: strToU8('{"type":"FeatureCollection","features":[]}'), fault: 'nothing' },
    { name: 'KML with entities in entities (B-16)', bytes: kml('<name>&b;</name>', nested), fault: 'dtd' },
    { name: 'the same in UTF-16', bytes: utf16(`<?xml version="1.0" encoding="UTF-16"?>${nested}<kml><name>&b;</name></kml>`), fault: 'dtd' },
    { name: 'KML with an entity of a file (B-18)', bytes: kml('<name>&x;</name>', '<!DOCTYPE kml [<!ENTITY x SYSTEM "file:///etc/passwd">]>'), fault: 'dtd' },
    { name: 'KML with an entity nobody named', bytes: kml('<name>&x;</name>'), fault: 'xml' },
    { name: 'KML cut off', bytes: strToU8('<kml><Document><Placemark>'), fault: 'xml' },
    { name: 'a web page', bytes: strToU8('<html><body></body></html>'), fault: 'xml_kind' },
    { name: 'a zip cut off', bytes: zipSync({ 'doc.kml': kml(placemark) }).slice(0, 60), fault: 'zip' },
    { name: 'a zip without shapes', bytes: zipSync({ 'notes.txt': strToU8('no') }), fault: 'zip_nothing' },
    { name: 'a zip of 21 entries (B-17)', bytes: zipSync(Object.fromEntries(Array.from({ length: 21 }, (_, index) => [`${index}.kml`, kml(placemark)]))), fault: 'zip_entries' },
    { name: 'a zip that unpacks to 6 MB (B-17)', bytes: zipSync({ 'doc.kml': new Uint8Array(6_000_000) }), fault: 'zip_size' },
    { name: 'a zip that unpacks to 300 times its size', bytes: zipSync({ 'doc.kml': new Uint8Array(4_000_000) }), fault: 'zip_ratio' },
    { name: 'a zip that lies about its size', bytes: lying(zipSync({ 'doc.kml': new Uint8Array(50_000_000) }), 400), fault: 'format' },
    { name: 'too many shapes', bytes: strToU8(JSON.stringify({ type: 'FeatureCollection', features: Array.from({ length: 2_001 }, () => ({ type: 'Feature' })) })), fault: 'shapes' },
    { name: 'too many points', bytes: strToU8(JSON.stringify({ type: 'LineString', coordinates: Array.from({ length: 100_001 }, () => [1, 2]) })), fault: 'points' },
    { name: 'more than 20 MB', bytes: new Uint8Array(20_000_001), fault: 'size' },
  ])('$name', ({ bytes, fault }) => { expect(faultOf(bytes)).toBe(fault) })

  it('a shapefile cut off, without its rows, or with a .prj nobody can read', () => {
    const parts = unzipped('tests/fixtures/import/utm.zip')
    const { shp, dbf } = parts
    expect(faultOf(zipSync({ 'a.shp': shp.slice(0, 900), 'a.dbf': dbf }))).toBe('shp')
    expect(faultOf(zipSync({ 'a.shp': shp, 'a.dbf': dbf.slice(0, 300) }))).toBe('dbf')
    const fewer = dbf.slice()
    new DataView(fewer.buffer).setUint32(4, 39, true)
    expect(faultOf(zipSync({ 'a.shp': shp, 'a.dbf': fewer }))).toBe('shp_rows')
    expect(faultOf(zipSync({ 'a.shp': shp, 'a.dbf': dbf, 'a.prj': strToU8('PROJCS["Nowhere",PROJECTION["Of_The_Moon"]]') }))).toBe('prj')
  })
})

function unzipped(path: string): { shp: Uint8Array; dbf: Uint8Array } {
  const files = unzipSync(new Uint8Array(readFileSync(path)))
  return { shp: files['blocks.shp'] ?? new Uint8Array(), dbf: files['blocks.dbf'] ?? new Uint8Array() }
}
