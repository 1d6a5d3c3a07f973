import type { Map as LeafletMap } from 'leaflet'
import { NO_GROUND, type MapGround } from '../../composables/map/mapGround.ts'
import type { MapBlock } from '../../composables/map/mapTypes.ts'
import { createGroundLabels, type OverGround } from './groundLabels.ts'
import { createGroundLayer } from './groundLayer.ts'
import { createSiteLayer } from './siteLayer.ts'

/** Everything under and round the blocks: the ground, what is kept clear of, and the names of both. */
export interface GroundView {
  show(ground: MapGround): void
  /** The names keep clear of these. */
  setBlocks(blocks: readonly MapBlock[]): void
}

export function createGroundView(map: LeafletMap, over: OverGround): GroundView {
  const layer = createGroundLayer(map)
  const sites = createSiteLayer(map)
  const names = createGroundLabels(map, over)
  let shown: MapGround = NO_GROUND
  let blocks: readonly MapBlock[] = []
  map.on('zoomend', layer.rescale)
  map.on('moveend', names.replace)
  return {
    show(ground) {
      shown = ground
      layer.show(ground)
      sites.show(ground.sites)
      names.show(ground, blocks)
    },
    setBlocks(list) {
      if (blocks === list) return
      blocks = list
      names.show(shown, list)
    },
  }
}
