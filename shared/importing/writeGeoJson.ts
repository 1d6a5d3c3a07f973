import type { Block } from '../contract/block.ts'

/** What goes out of a block. */
export type GivenBlock = Pick<Block, 'code' | 'name' | 'crop' | 'areaM2' | 'geometry'>

/** Blocks as GeoJSON (RFC 7946): degrees on WGS 84, outer rings counter-clockwise, code, name, crop and area in square metres. */
export function writeGeoJson(blocks: readonly GivenBlock[]): string {
  const features = blocks.map(({ code, name, crop, areaM2, geometry }) => ({
    type: 'Feature', properties: { code, name, crop, areaM2: Number(areaM2.toFixed(1)) }, geometry,
  }))
  return `${JSON.stringify({ type: 'FeatureCollection', features }, null, 1)}\n`
}
