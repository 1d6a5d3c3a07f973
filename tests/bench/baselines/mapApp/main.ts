import type { LatLngTuple } from 'leaflet'
import { createApp } from 'vue'
import FarmMap from '../../../../src/components/map/FarmMap.vue'
import { NO_GROUND } from '../../../../src/composables/map/mapGround.ts'
import type { MapBlock } from '../../../../src/composables/map/mapTypes.ts'
import type { Position } from '../../../../shared/geo/geometryTypes.ts'
import { drawBare, inkOf } from './bareMap.ts'

/** One drawing of all blocks and so many moves of the map, each waited for until it is on the screen. */
export interface Round { painted: () => Promise<void>; pans: number; panPx: number }

const COUNT = 5_000
const CORNERS = 12
const ACROSS = 80
const blocks = Array.from({ length: COUNT }, (_, index): MapBlock => blockAt(index))
const round: Round = {
  pans: 5, panPx: 80,
  painted: () => new Promise((resolve) => { requestAnimationFrame(() => { requestAnimationFrame(() => { resolve() }) }) }),
}

function blockAt(index: number): MapBlock {
  const [lon, lat] = [-123.4 + (index % ACROSS) * 0.0016, 44.5 + Math.floor(index / ACROSS) * 0.0012]
  const open = Array.from({ length: CORNERS }, (__, corner): Position => {
    const angle = (2 * Math.PI * corner) / CORNERS
    const reach = 0.8 + (((index * 7 + corner * 13) % 10) / 50)
    return [lon + 0.0007 * reach * Math.cos(angle), lat + 0.0005 * reach * Math.sin(angle)]
  })
  return { id: `block ${index}`, code: `N${index}`, geometry: { type: 'Polygon', coordinates: [[...open, ...open.slice(0, 1)]] }, areaM2: 8_000, areaText: '0.80 ha', areaFigure: '0.80', spoken: `N${index}` }
}

/** The product's own map component, moved by its own keys. */
async function drawOurs(host: HTMLElement): Promise<string> {
  const place = host.appendChild(document.createElement('div'))
  const app = createApp(FarmMap, {
    blocks, chosenId: null, draft: null, edit: null, mode: 'look', ground: NO_GROUND, imagery: null, startAt: null, footPx: 0, leftPx: 0, covered: () => null, label: 'Map', describedBy: '',
  })
  app.mount(place)
  await round.painted()
  const map = place.querySelector('.farm-map')
  for (let pan = 0; pan < round.pans; pan += 1) {
    map?.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowRight', shiftKey: true, bubbles: true }))
    await round.painted()
  }
  const answer = inkOf(place)
  app.unmount()
  place.remove()
  return answer
}

const host = document.querySelector<HTMLElement>('#app')
if (host === null) throw new Error('the page has no room for a map')
const outlines = blocks.map(({ geometry }) => (geometry.type === 'Polygon' ? (geometry.coordinates[0] ?? []).map(([lon, lat]): LatLngTuple => [lat, lon]) : []))
Object.assign(window, { drawOurs: () => drawOurs(host), drawBare: () => drawBare(host, outlines, round) })
