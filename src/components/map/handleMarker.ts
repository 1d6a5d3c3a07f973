import { divIcon, marker, type LatLngTuple, type Marker } from 'leaflet'

/** A small square on a corner: only to be seen, so it takes neither clicks nor focus. */
export function handleMarker(at: LatLngTuple, className: string): Marker {
  return marker(at, {
    icon: divIcon({ className, iconSize: [8, 8] }),
    interactive: false,
    keyboard: false,
    zIndexOffset: 600,
  })
}
