import { divIcon, layerGroup, marker, point, type LayerGroup, type Map as LeafletMap } from 'leaflet'
import { codeWidth } from './codeWidth.ts'
import { freeSpot } from './freeSpot.ts'
import { labelSpot, type LabelForm } from './labelSpot.ts'
import { pixelRings } from './leafletGeometry.ts'
import { areMany } from './manyBlocks.ts'
import { findManyLabels } from './manyLabels.ts'
import { boxOf, type PixelBox } from './pixelRing.ts'
import { thinRing } from './thinRing.ts'
import type { MapMarks } from '../../composables/map/useMapMarks.ts'
import type { MapBlock, Pixel } from '../../composables/map/mapTypes.ts'

/** Codes and areas on the map, in the trough of a job that waits; each block shows as much as has room in it at this zoom. */
export interface LabelLayer {
  show(blocks: readonly MapBlock[], chosenId: string | null, jobs: MapMarks['jobs']): void
  /** Middles of the labels in the map's pixels, by block. */
  middles(): ReadonlyMap<string, Pixel>
  /** Ground that labels cover, in the same pixels. */
  taken(): readonly PixelBox[]
}

interface Labels {
  jobs: MapMarks['jobs']
  map: LeafletMap
  group: LayerGroup
  middles: Map<string, Pixel>
  /** Ground that labels already cover. */
  taken: PixelBox[]
  /** The polygons of every block in pixels. */
  shapes: readonly Shape[]
}

/** One polygon of a block. */
interface Shape { id: string; rings: readonly (readonly Pixel[])[]; box: PixelBox }

/** Width and height in pixels that a label of each form covers. */
const SIZES: Record<LabelForm, readonly [number, number]> = {
  full: [50, 37], narrow: [27, 35], slip: [50, 19], code: [20, 17], small: [18, 12], outside: [18, 12],
}
/** No label is set farther from its block, so blocks beyond are not looked at. */
const REACH = 40
/** Below this width in pixels a farm is a dot and labels would lie on each other. */
const LEAST_BOX = 4

export function createLabelLayer(map: LeafletMap): LabelLayer {
  const group = layerGroup().addTo(map)
  let middles = new Map<string, Pixel>()
  let taken: PixelBox[] = []
  return {
    show(blocks, chosenId, jobs) {
      group.clearLayers()
      middles = new Map()
      taken = []
      if (areMany(blocks)) {
        const found = findManyLabels(map, blocks, chosenId)
        middles = found.middles
        for (const { block, at, isInside } of found.labels) setLabel({ map, group, jobs }, block, { form: isInside ? 'code' : 'outside', at, isChosen: block.id === chosenId })
        return
      }
      const shapes = blocks.flatMap(({ id, geometry }) => pixelRings(map, geometry).map((rings) => shapeOf(id, rings)))
      const labels: Labels = { map, group, jobs, middles, taken, shapes }
      // Those with room of their own first, then the tiny ones between them.
      const largestFirst = [...blocks].sort((a, b) => b.areaM2 - a.areaM2)
      for (const block of largestFirst) addLabel(labels, block, block.id === chosenId)
    },
    middles: () => middles,
    taken: () => taken,
  }
}

function addLabel({ map, group, jobs, middles, taken, shapes }: Labels, block: MapBlock, isChosen: boolean): void {
  const largest = largestShape(shapes.filter(({ id }) => id === block.id))
  if (largest === null) return
  const code = codeWidth(block.code)
  const near = shapes.filter(({ id, box }) => id !== block.id && isWithin(box, largest.box, REACH))
  const beside = near.filter(({ box }) => isWithin(box, largest.box, 0)).flatMap(({ rings }) => rings)
  const { form, at: middle, orAt } = labelSpot(largest.rings, beside, code)
  middles.set(block.id, middle)
  const isOutside = form === 'outside'
  if (isOutside && widthOf(largest) < LEAST_BOX && !isChosen) return
  const [width, height] = SIZES[form]
  const size = [isOutside || form === 'small' ? code.small : Math.max(width, code.large), height] as const
  const blocks = isOutside ? [...near.map(({ rings }) => rings), largest.rings] : []
  const find = (labels: PixelBox[]): Pixel | null =>
    freeSpot({ labels, blocks }, middle, size, isOutside) ?? (orAt === null ? null : freeSpot({ labels, blocks }, orAt, size, isOutside))
  // The chosen one may lie on other labels, yet on no other block.
  const at = find(taken) ?? (isChosen ? find([]) : null)
  if (at === null) return
  setLabel({ map, group, jobs }, block, { form, at, isChosen })
}

function setLabel({ map, group, jobs }: Pick<Labels, 'map' | 'group' | 'jobs'>, block: MapBlock, { form, at, isChosen }: { form: LabelForm; at: Pixel; isChosen: boolean }): void {
  const job = jobs.get(block.id)
  const className = `map-label is-${form}${isChosen ? ' is-chosen' : ''}${job === undefined ? '' : ` job-${job}`}`
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
  if (form !== 'outside' && form !== 'code' && form !== 'small') {
    const area = document.createElement('i')
    area.textContent = form === 'full' ? block.areaText : block.areaFigure
    label.append(area)
  }
  return label
}

function shapeOf(id: string, rings: readonly (readonly Pixel[])[]): Shape {
  return { id, rings: rings.map(thinRing), box: boxOf(rings[0] ?? []) }
}

function isWithin(a: PixelBox, b: PixelBox, reach: number): boolean {
  return a.minX < b.maxX + reach && b.minX < a.maxX + reach && a.minY < b.maxY + reach && b.minY < a.maxY + reach
}

function widthOf({ box }: Shape): number {
  return box.maxX - box.minX
}

function largestShape(shapes: readonly Shape[]): Shape | null {
  return shapes.reduce<Shape | null>((largest, shape) => (largest === null || widthOf(shape) > widthOf(largest) ? shape : largest), null)
}
