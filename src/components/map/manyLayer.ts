import { canvas, layerGroup, polygon, type LatLngTuple, type Map as LeafletMap, type PathOptions } from 'leaflet'
import type { MapBlock } from '../../composables/map/mapTypes.ts'
import type { MapMarks } from '../../composables/map/useMapMarks.ts'
import { canvasHatch } from './canvasHatches.ts'
import { HATCHES, hatchesOf } from './hatches.ts'
import { polygonsOf, toLatLng } from './leafletGeometry.ts'

/** What was painted last. */
interface Shown extends Pick<MapMarks, 'work' | 'holds'> { blocks: readonly MapBlock[] }

/** Very many blocks, painted once and moved as one picture. */
export interface ManyLayer {
  show(blocks: readonly MapBlock[], marks: Pick<MapMarks, 'work' | 'holds'>): void
  clear(): void
  /** Whether pictures of the ground are to be seen through the blocks. */
  setImagery(isThere: boolean): void
}

/** @param onChoose called with a block's id when it is clicked or tapped. */
export function createManyLayer(map: LeafletMap, onChoose: (id: string) => void): ManyLayer {
  const group = layerGroup().addTo(map)
  const renderer = canvas({ padding: 0.2 })
  let shown: Shown | null = null
  let isOverImagery = false

  function paint({ blocks, work, holds }: Shown): void {
    group.clearLayers()
    const hatches = new Map(HATCHES.map((hatch) => [hatch, canvasHatch(map.getContainer(), hatch)]))
    const style = { ...inksOf(map.getContainer(), isOverImagery), renderer, bubblingMouseEvents: false }
    for (const block of blocks) {
      const rings: LatLngTuple[][][] = polygonsOf(block.geometry).map((polygonRings) => polygonRings.map((ring) => ring.map(toLatLng)))
      group.addLayer(polygon(rings, block.isComing === true ? { ...style, dashArray: '5 4' } : style).on('click', () => { onChoose(block.id) }))
      for (const hatch of hatchesOf(block.id, { work, holds })) {
        const pattern = hatches.get(hatch) ?? null
        if (pattern !== null) group.addLayer(polygon(rings, { renderer, interactive: false, stroke: false, fillOpacity: 1, fillColor: asFill(pattern) }))
      }
    }
  }
  // A canvas keeps the ink it was painted with; the page's own light may change.
  const light = new MutationObserver(() => { if (shown !== null) paint(shown) })
  light.observe(document.documentElement, { attributeFilter: ['data-light'] })
  map.on('unload', () => { light.disconnect() })

  return {
    show(blocks, { work, holds }) {
      if (blocks === shown?.blocks && work === shown.work && holds === shown.holds) return
      shown = { blocks, work, holds }
      paint(shown)
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

/** The canvas is handed a fill as it is, so a pattern does where Leaflet's types know of colours alone. */
const asFill = (pattern: CanvasPattern): string => pattern as unknown as string

/** The inks that farmMap.css gives to blocks drawn as elements. */
function inksOf(host: HTMLElement, isOverImagery: boolean): PathOptions {
  const style = getComputedStyle(host)
  const isForced = window.matchMedia('(forced-colors: active)').matches
  const ink = (name: string): string => style.getPropertyValue(name).trim()
  return { color: isForced ? 'CanvasText' : ink('--elder'), weight: 1.6, fillColor: isForced ? 'Canvas' : ink('--map-fill'), fillOpacity: isOverImagery ? 0.12 : 0.86 }
}
