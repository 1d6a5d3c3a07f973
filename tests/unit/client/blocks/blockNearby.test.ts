import { describe, expect, it } from 'vitest'
import { blockAllows } from '../../../../src/composables/block/blockAllows.ts'
import { blockNearby } from '../../../../src/composables/block/blockNearby.ts'
import type { MapSite } from '../../../../src/composables/map/mapGround.ts'
import { bufferPlace } from '../../../../shared/geo/bufferPlace.ts'
import type { Boundary } from '../../../../shared/geo/geometryTypes.ts'

/** Some 79 m by 111 m, its west side on 123.31° W. */
const block: Boundary = { type: 'Polygon', coordinates: [[[-123.31, 44.61], [-123.309, 44.61], [-123.309, 44.611], [-123.31, 44.611], [-123.31, 44.61]]] }
/** A well some metres west of the block: 79 400 m to a degree of longitude there. */
const well = (metresWest: number, keepClearM: number | null): MapSite => {
  const geometry = { type: 'Point' as const, coordinates: [-123.31 - metresWest / 79_400, 44.6105] as [number, number] }
  return { id: 'w', kind: 'well', name: 'Yard well', geometry, ring: keepClearM === null ? null : bufferPlace(geometry, keepClearM) }
}

describe('what lies beside a block', () => {
  it('is a caution where a distance reaches into it', () => {
    expect(blockNearby(block, [well(20, 30)])).toMatchObject({ verdict: 'caution', sites: 'Yard well' })
  })

  it('is never a pass where none does, and not known at all without sites', () => {
    for (const site of [well(40, 30), well(20, null)]) expect(blockNearby(block, [site])?.verdict).toBe('unknown')
    expect(blockNearby(block, [])).toBeNull()
  })

  it('stands in its line, with the names of the sites', () => {
    const line = blockAllows('A3', null, blockNearby(block, [well(20, 30)])).find(({ code }) => code === 'blocks.nearby')
    expect(line).toMatchObject({ verdict: 'caution', text: { id: 'blocks.allows.nearby.within', params: { code: 'A3', sites: 'Yard well' } } })
    expect(blockAllows('A3', null, null).find(({ code }) => code === 'blocks.nearby')).toMatchObject({ verdict: 'unknown', text: { id: 'blocks.allows.nearby.text' } })
  })
})
