import type { Part } from '../contract/recordContent.ts'
import { ExactDecimal } from '../units/exactDecimal.ts'
import { measurePolygon } from './measurePolygon.ts'

/**
 * Ground treated on a block, square metres: the whole of it, a fraction, rows or beds counted as equal parts, or what was drawn.
 * A drawn part that is no valid polygon yet has 0.
 * @param blockM2 area of the block.
 */
export function partArea(part: Part, blockM2: number): number {
  switch (part.kind) {
    case 'whole':
      return blockM2
    case 'fraction':
      return new ExactDecimal(blockM2).times(part.fraction).toNumber()
    case 'rows':
    case 'beds':
      return new ExactDecimal(blockM2).times(part.to - part.from + 1).div(part.of).toNumber()
    case 'drawn':
      return drawnArea(part.geometry)
  }
}

function drawnArea(geometry: (Part & { kind: 'drawn' })['geometry']): number {
  try {
    return measurePolygon(geometry).areaM2
  } catch (error) {
    if (error instanceof RangeError) return 0
    throw error
  }
}
