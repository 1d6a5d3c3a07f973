import { mount } from '@vue/test-utils'
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest'
import FarmMap from '../../../../src/components/map/FarmMap.vue'
import { NO_GROUND } from '../../../../src/composables/map/mapGround.ts'
import type { MapBlock, MapView } from '../../../../src/composables/map/mapTypes.ts'

const SIZES = [['clientWidth', 600], ['clientHeight', 400]] as const
/** No size changes here. */
class StillSizes { observe = vi.fn(); unobserve = vi.fn(); disconnect = vi.fn() }
// A page that is not laid out has no sizes; a map of none shows nothing. Other tests of this worker are to find it as it was.
beforeAll(() => {
  for (const [name, px] of SIZES) Object.defineProperty(HTMLElement.prototype, name, { configurable: true, get: () => px })
  vi.stubGlobal('ResizeObserver', StillSizes)
})
afterAll(() => {
  for (const [name] of SIZES) Reflect.deleteProperty(HTMLElement.prototype, name)
  vi.unstubAllGlobals()
})

const blockAt = (lon: number, lat: number): MapBlock => ({
  id: `${lon}`, code: 'B1', areaM2: 10_000, areaText: '1 ha', areaFigure: '1', spoken: 'B1',
  geometry: { type: 'Polygon', coordinates: [[[lon, lat], [lon + 0.001, lat], [lon + 0.001, lat + 0.001], [lon, lat + 0.001], [lon, lat]]] },
})

function openMap() {
  const map = mount(FarmMap, {
    props: {
      blocks: [] as MapBlock[], chosenId: null, draft: null, edit: null, mode: 'draw', ground: NO_GROUND, imagery: null, startAt: null as MapView | null,
      footPx: 0, leftPx: 0, covered: () => null, label: 'Map', describedBy: 'x',
    },
  })
  const view = (): MapView | null => (map.emitted('moved')?.at(-1)?.[0] ?? null) as MapView | null
  return { map, view, crosses: () => map.emitted('cross')?.length ?? 0 }
}

describe('blocks that come after the map', () => {
  it('are what it opens on while nobody has touched it, with the cross in their middle', async () => {
    const { map, view } = openMap()
    await map.setProps({ blocks: [blockAt(-123.31, 44.61)] })
    expect(view()?.centre[0]).toBeCloseTo(-123.3095, 3)
    expect(map.emitted('cross')?.at(-1)?.[0]).toMatchObject([expect.closeTo(-123.3095, 3) as number, expect.closeTo(44.6105, 3) as number])
  })

  it('move neither view nor cross once a key was pressed', async () => {
    const { map, view, crosses } = openMap()
    await map.get('.farm-map').trigger('keydown', { key: 'ArrowRight' })
    await map.get('.farm-map').trigger('keydown', { key: '+' })
    const [before, count] = [view(), crosses()]
    await map.setProps({ blocks: [blockAt(-123.31, 44.61)] })
    expect(view()).toEqual(before)
    expect(crosses()).toBe(count)
  })
})
