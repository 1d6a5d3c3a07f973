import { bbox } from '@turf/turf'
import type { NamedBoundary } from '../../../shared/geo/findOverlaps.ts'

/** Outlines with their boxes, to be asked many times. */
export interface OutlineBook {
  /** Those that a boundary can share ground with, and the nearest of all: what a judge of it would find among all of them. */
  near(outline: NamedBoundary): NamedBoundary[]
  add(outline: NamedBoundary): void
}

interface Entry { outline: NamedBoundary; box: Box }
type Box = readonly [west: number, south: number, east: number, north: number]

/** Keeps outlines by their boxes: five hundred blocks beside five thousand are judged without comparing each pair corner by corner. */
export function openOutlineBook(outlines: readonly NamedBoundary[]): OutlineBook {
  const entries = outlines.map(entryOf)
  return {
    near(outline) {
      const { box } = entryOf(outline)
      const meeting = entries.filter((entry) => doMeet(entry.box, box))
      const nearest = entries.reduce<Entry | null>((best, entry) => (best === null || gap(entry.box, box) < gap(best.box, box) ? entry : best), null)
      return [...new Set([...meeting, ...(nearest === null ? [] : [nearest])])].map((entry) => entry.outline)
    },
    add: (outline) => void entries.push(entryOf(outline)),
  }
}

function entryOf(outline: NamedBoundary): Entry {
  const [west, south, east, north] = bbox(outline.geometry)
  return { outline, box: [west, south, east, north] }
}

function doMeet(a: Box, b: Box): boolean {
  return a[0] <= b[2] && b[0] <= a[2] && a[1] <= b[3] && b[1] <= a[3]
}

/** Between the middles of two boxes, in degrees of latitude squared: only compared, never shown. */
function gap(a: Box, b: Box): number {
  const [x, y] = [(a[0] + a[2] - b[0] - b[2]) / 2, (a[1] + a[3] - b[1] - b[3]) / 2]
  const narrow = Math.cos((((a[1] + a[3]) / 2) * Math.PI) / 180)
  return (x * narrow) ** 2 + y ** 2
}
