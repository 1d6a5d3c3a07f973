import { divIcon, layerGroup, marker, polygon, svg, type LayerGroup, type Map as LeafletMap } from 'leaflet'
import type { MapSite } from '../../composables/map/mapGround.ts'
import type { SiteKind } from '../../../shared/contract/ground.ts'
import { SITE_MARKS } from '../../../shared/geo/siteMarks.ts'
import { polygonsOf, toLatLng } from './leafletGeometry.ts'

/** What is kept clear of: its mark, and dashes round the ground that is kept clear, over the blocks. */
export interface SiteLayer {
  show(sites: readonly MapSite[]): void
}

/** Over the blocks, under what is being drawn. */
const PANE = 'sites'
const PANE_LAYER = '430'
const SVG = 'http://www.w3.org/2000/svg'
const MARK_PX = 16

export function createSiteLayer(map: LeafletMap): SiteLayer {
  const pane = map.createPane(PANE)
  pane.style.zIndex = PANE_LAYER
  pane.style.pointerEvents = 'none'
  const renderer = svg({ padding: 0.5, pane: PANE })
  const group = layerGroup().addTo(map)
  return {
    show(sites) {
      group.clearLayers()
      for (const { kind, geometry, ring } of sites) {
        for (const rings of ring === null ? [] : polygonsOf(ring)) {
          const outlines = rings.map((each) => each.map(toLatLng))
          for (const name of ['site-ring-case', 'site-ring']) group.addLayer(polygon(outlines, { renderer, interactive: false, fill: false, smoothFactor: 0.4, className: name, dashArray: '5 3.5' }))
        }
        if (geometry.type === 'Point') addMark(group, toLatLng(geometry.coordinates), kind)
      }
    },
  }
}

function addMark(group: LayerGroup, at: ReturnType<typeof toLatLng>, kind: SiteKind): void {
  const mark = document.createElementNS(SVG, 'svg')
  mark.setAttribute('viewBox', '0 0 16 16')
  for (const name of ['case', 'line']) {
    const path = document.createElementNS(SVG, 'path')
    path.setAttribute('d', SITE_MARKS[kind])
    path.setAttribute('class', name)
    mark.append(path)
  }
  // Leaflet takes any element here; its types know those of HTML alone.
  const html = document.createElement('span')
  html.append(mark)
  group.addLayer(marker(at, { icon: divIcon({ className: 'site-mark', html, iconSize: [MARK_PX, MARK_PX] }), interactive: false, keyboard: false, pane: PANE }))
}
