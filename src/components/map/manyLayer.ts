import { canvas, layerGroup, polygon, type LatLngTuple, type Map as LeafletMap, type PathOptions } from 'leaflet'
import type { MapBlock } from '../../composables/mapTypes.ts'
import { polygonsOf, toLatLng } from './leafletGeometry.ts'

/** Very many blocks, painted once and moved as one picture. */
export interface ManyLayer {
  show(blocks: readonly MapBlock[]): void
  clear(): void
  /** Whether pictures of the ground are to be seen through the blocks. */
  setImagery(isThere: boolean): void
}

/** @param onChoose called with a block's id when it is clicked or tapped. */
export function createManyLayer(map: LeafletMap, onChoose: (id: string) => void): ManyLayer {
  const group = layerGroup().addTo(map)
  const renderer = canvas({ padding: 0.2 })
  let shown: readonly MapBlock[] | null = null
  let isOverImagery = false

  function paint(blocks: readonly MapBlock[]): void {
    group.clearLayers()
    const style = { ...inksOf(map.getContainer(), isOverImagery), renderer, bubblingMouseEvents: false }
    for (const block of blocks) {
      const rings: LatLngTuple[][][] = polygonsOf(block.geometry).map((polygonRings) => polygonRings.map((ring) => ring.map(toLatLng)))
      group.addLayer(polygon(rings, block.isComing === true ? { ...style, dashArray: '5 4' } : style).on('click', () => { onChoose(block.id) }))
    }
  }
  // A canvas keeps the ink it was painted with; the page's own light may change.
  const light = new MutationObserver(() => { if (shown !== null) paint(shown) })
  light.observe(document.documentElement, { attributeFilter: ['data-light'] })
  map.on('unload', () => { light.disconnect() })

  return {
    show(blocks) {
      if (blocks === shown) return
      shown = blocks
      paint(blocks)
    },
    setImagery(isThere) {
      if (isThere === isOverImagery) return
      isOverImagery = isThere
      if (shown !== null) paint(shown)
    },
    clear() {
      shown = null
      group.clearLayers()
    },
  }
}

/** The inks that farmMap.css gives to blocks drawn as elements. */
function inksOf(host: HTMLElement, isOverImagery: boolean): PathOptions {
  const style = getComputedStyle(host)
  const isForced = window.matchMedia('(forced-colors: active)').matches
  const ink = (name: string): string => style.getPropertyValue(name).trim()
  return { color: isForced ? 'CanvasText' : ink('--elder'), weight: 1.6, fillColor: isForced ? 'Canvas' : ink('--map-fill'), fillOpacity: isOverImagery ? 0.12 : 0.86 }
}
