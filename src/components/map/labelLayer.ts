import { divIcon, layerGroup, marker, point, type LayerGroup, type Map as LeafletMap } from 'leaflet'
import { freeSpot, type LabelBox } from './freeSpot.ts'
import { labelSpot, type LabelForm } from './labelSpot.ts'
import { pixelRings } from './leafletGeometry.ts'
import type { MapBlock, Pixel } from '../../composables/mapTypes.ts'

/** Codes and areas on the map; each block shows as much as has room in it at this zoom. */
export interface LabelLayer {
  show(blocks: readonly MapBlock[], chosenId: string | null): void
  /** Middles of the labels in the map's pixels, by block. */
  middles(): ReadonlyMap<string, Pixel>
}

interface Labels {
  map: LeafletMap
  group: LayerGroup
  middles: Map<string, Pixel>
  /** Ground that labels already cover. */
  taken: LabelBox[]
}

/** Width and height in pixels that a label of each form covers. */
const SIZES: Record<LabelForm, readonly [number, number]> = {
  full: [50, 37], narrow: [27, 35], slip: [50, 19], code: [20, 17], outside: [18, 12],
}
/** Below this width in pixels a farm is a dot and labels would lie on each other. */
const LEAST_BOX = 4

export function createLabelLayer(map: LeafletMap): LabelLayer {
  const group = layerGroup().addTo(map)
  let middles = new Map<string, Pixel>()
  return {
    show(blocks, chosenId) {
      group.clearLayers()
      middles = new Map()
      const labels: Labels = { map, group, middles, taken: [] }
      // Those with room of their own first, then the tiny ones between them.
      const largestFirst = [...blocks].sort((a, b) => b.areaM2 - a.areaM2)
      for (const block of largestFirst) addLabel(labels, block, block.id === chosenId)
    },
    middles: () => middles,
  }
}

function addLabel({ map, group, middles, taken }: Labels, block: MapBlock, isChosen: boolean): void {
  const largest = largestPolygon(pixelRings(map, block.geometry))
  if (largest === null) return
  const { form, at: middle } = labelSpot(largest.rings)
  middles.set(block.id, middle)
  if (form === 'outside' && largest.width < LEAST_BOX && !isChosen) return
  const at = freeSpot(taken, middle, SIZES[form], form === 'outside') ?? (isChosen ? middle : null)
  if (at === null) return
  const className = `map-label is-${form}${isChosen ? ' is-chosen' : ''}`
  group.addLayer(
    marker(map.unproject(point(at[0], at[1])), {
      icon: divIcon({ className, html: labelElement(block, form), iconSize: [0, 0] }),
      interactive: false,
      keyboard: false,
      zIndexOffset: isChosen ? 1000 : 0,
    }),
  )
}

function labelElement(block: MapBlock, form: LabelForm): HTMLElement {
  const label = document.createElement('span')
  const code = document.createElement('b')
  code.textContent = block.code
  label.append(code)
  if (form !== 'outside' && form !== 'code') {
    const area = document.createElement('i')
    area.textContent = form === 'full' ? block.areaText : block.areaFigure
    label.append(area)
  }
  return label
}

function largestPolygon(polygons: Pixel[][][]): { rings: Pixel[][]; width: number } | null {
  let largest: { rings: Pixel[][]; width: number } | null = null
  for (const rings of polygons) {
    const xs = (rings[0] ?? []).map(([x]) => x)
    const width = xs.reduce((most, x) => Math.max(most, x), -Infinity) - xs.reduce((least, x) => Math.min(least, x), Infinity)
    if (largest === null || width > largest.width) largest = { rings, width }
  }
  return largest
}
