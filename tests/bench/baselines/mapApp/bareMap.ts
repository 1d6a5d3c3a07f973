import { canvas, latLngBounds, map, polygon, type LatLngTuple } from 'leaflet'
import type { Round } from './main.ts'

/** The least that shows the same: bare Leaflet, its canvas, a polygon for each block that answers a click. */
export async function drawBare(host: HTMLElement, outlines: readonly LatLngTuple[][], { painted, pans, panPx }: Round): Promise<string> {
  const place = host.appendChild(document.createElement('div'))
  place.id = 'bare'
  const bare = map(place, { attributionControl: false, zoomControl: false, fadeAnimation: false, zoomSnap: 0.1, maxZoom: 22 }).setView([20, 0], 2)
  const padding: [number, number] = [26, 26]
  bare.fitBounds(latLngBounds(outlines.flat()), { paddingTopLeft: padding, paddingBottomRight: padding, maxZoom: 19, animate: false })
  const renderer = canvas({ padding: 0.2 })
  for (const outline of outlines) {
    polygon(outline, { renderer, color: '#4f3a66', weight: 1.6, fillColor: '#fcfaf4', fillOpacity: 0.86, bubblingMouseEvents: false }).on('click', () => undefined).addTo(bare)
  }
  await painted()
  for (let pan = 0; pan < pans; pan += 1) {
    bare.panBy([panPx, 0], { animate: false })
    await painted()
  }
  const answer = inkOf(place)
  bare.remove()
  place.remove()
  return answer
}

/** How much of the canvas holds ink, in percent: the same picture has the same. */
export function inkOf(place: HTMLElement): string {
  const found = place.querySelector('canvas')
  const pixels = found?.getContext('2d')?.getImageData(0, 0, found.width, found.height).data ?? new Uint8ClampedArray()
  let inked = 0
  for (let at = 3; at < pixels.length; at += 4) if ((pixels[at] ?? 0) > 0) inked += 1
  return `${found?.width ?? 0} x ${found?.height ?? 0}, ${Math.round((inked * 400) / pixels.length)} %`
}
