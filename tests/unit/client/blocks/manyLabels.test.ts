import { bounds, CRS, latLng, point, type LatLngExpression } from 'leaflet'
import { describe, expect, it } from 'vitest'
import { findManyLabels } from '../../../../src/components/map/manyLabels.ts'
import type { MapBlock } from '../../../../src/composables/map/mapTypes.ts'

/** A map of 800 by 600 pixels over the given place. */
function mapAt(place: LatLngExpression, zoom: number) {
  const project = (at: LatLngExpression) => CRS.EPSG3857.latLngToPoint(latLng(at as [number, number]), zoom)
  const middle = project(place)
  return { project, getPixelBounds: () => bounds(middle.subtract(point(400, 300)), middle.add(point(400, 300))) }
}

const square = (index: number, side: number): MapBlock => {
  const [west, south] = [10 + (index % 30) * 0.002, 45 + Math.floor(index / 30) * 0.002]
  const ring: [number, number][] = [[west, south], [west + side, south], [west + side, south + side], [west, south + side], [west, south]]
  return { id: `b${index}`, code: `N${index}`, geometry: { type: 'Polygon', coordinates: [ring] }, areaM2: 1, areaText: '', areaFigure: '', spoken: '' }
}
const blocks = Array.from({ length: 900 }, (_, index) => square(index, 0.0015))

describe('codes on a map of very many blocks', () => {
  it('stand in the middle of blocks in view that have room for them, and in no other', () => {
    const near = findManyLabels(mapAt([45.003, 10.005], 16), blocks, null)
    expect(near.labels.length).toBeGreaterThan(8)
    expect(near.labels.length).toBeLessThan(40)
    for (const { block, at, isInside } of near.labels) {
      expect(isInside).toBe(true)
      expect(at).toEqual(near.middles.get(block.id))
    }
    expect(findManyLabels(mapAt([45.003, 10.005], 11), blocks, null).labels).toEqual([])
    expect(findManyLabels(mapAt([50, 20], 16), blocks, null).labels).toEqual([])
  })

  it('name the chosen one whatever its size, and find a middle of every block for the arrow keys', () => {
    const far = findManyLabels(mapAt([45.003, 10.005], 11), blocks, 'b7')
    expect(far.labels.map(({ block, isInside }) => [block.code, isInside])).toEqual([['N7', false]])
    expect(far.middles.size).toBe(900)
  })

  it('are 150 at most', () => {
    const dense = Array.from({ length: 900 }, (_, index) => square(index, 0.0019))
    expect(findManyLabels(mapAt([45.03, 10.03], 14), dense, null).labels.length).toBeLessThanOrEqual(150)
  })
})
