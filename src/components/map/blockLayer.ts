import { layerGroup, polygon, type LatLngTuple, type LayerGroup, type Map as LeafletMap, type Renderer } from 'leaflet'
import { handleMarker } from './handleMarker.ts'
import { polygonsOf, toLatLng } from './leafletGeometry.ts'
import { areMany } from './manyBlocks.ts'
import { hatchesOf } from './hatches.ts'
import { createManyLayer } from './manyLayer.ts'
import type { MapBlock } from '../../composables/map/mapTypes.ts'
import type { MapMarks } from '../../composables/map/useMapMarks.ts'

/** Handles on more corners than this would hide the outline. */
const MOST_HANDLES = 60

/** The outlines of the blocks: casing, ground and line; the chosen one last and heavier. */
export interface BlockLayer {
  show(blocks: readonly MapBlock[], chosenId: string | null, marks: MapMarks): void
  /** Whether pictures of the ground lie under the blocks and are to be seen through them. */
  setImagery(isThere: boolean): void
}

/**
 * Adds the layer of blocks to a map.
 * @param onChoose called with a block's id when it is clicked or tapped.
 */
export function createBlockLayer(map: LeafletMap, renderer: Renderer, onChoose: (id: string) => void): BlockLayer {
  const group = layerGroup().addTo(map)
  const many = createManyLayer(map, onChoose)
  return {
    setImagery: many.setImagery,
    show(blocks, chosenId, marks) {
      group.clearLayers()
      if (areMany(blocks)) {
        many.show(blocks, marks)
        for (const block of blocks) if (block.id === chosenId) addBlock(group, renderer, { block, isChosen: true, marks }).on('click', () => onChoose(block.id))
        return
      }
      many.clear()
      const chosenLast = [...blocks].sort((a, b) => Number(a.id === chosenId) - Number(b.id === chosenId))
      for (const block of chosenLast) {
        addBlock(group, renderer, { block, isChosen: block.id === chosenId, marks }).on('click', () => onChoose(block.id))
      }
    },
  }
}

function addBlock(group: LayerGroup, renderer: Renderer, { block, isChosen, marks }: { block: MapBlock; isChosen: boolean; marks: MapMarks }) {
  const rings: LatLngTuple[][][] = polygonsOf(block.geometry).map((polygonRings) =>
    polygonRings.map((ring) => ring.map(toLatLng)),
  )
  const chosen = isChosen ? ' is-chosen' : ''
  const common = { renderer, smoothFactor: 0.2, bubblingMouseEvents: false }
  group.addLayer(polygon(rings, { ...common, className: `map-case${chosen}`, interactive: false, fill: false }))
  const line = polygon(rings, { ...common, className: `map-block${block.isComing === true ? ' is-coming' : ''}${chosen}`, fill: true })
  group.addLayer(line)
  addMarks(group, renderer, { block, rings, marks })
  if (isChosen) addHandles(group, rings)
  return line
}

/** The hatches of the last days' work and of holds over the ground, and the line inside an outline that is not certified. */
function addMarks(group: LayerGroup, renderer: Renderer, { block, rings, marks }: { block: MapBlock; rings: LatLngTuple[][][]; marks: MapMarks }): void {
  const common = { renderer, smoothFactor: 0.2, interactive: false }
  for (const hatch of hatchesOf(block.id, marks)) {
    group.addLayer(polygon(rings, { ...common, className: 'map-hatch', stroke: false, fillColor: `url(#map-${hatch})`, fillOpacity: 1 }))
  }
  const inner = marks.inner.get(block.id)
  if (inner === undefined) return
  const lines = polygonsOf(inner.line).map((polygonRings) => polygonRings.map((ring) => ring.map(toLatLng)))
  group.addLayer(polygon(lines, { ...common, className: `map-inner is-${inner.status}`, fill: false }))
}

function addHandles(group: LayerGroup, rings: LatLngTuple[][][]): void {
  const corners = rings.flat().flatMap((ring) => ring.slice(0, -1))
  if (corners.length > MOST_HANDLES) return
  for (const corner of corners) group.addLayer(handleMarker(corner, 'map-handle'))
}
