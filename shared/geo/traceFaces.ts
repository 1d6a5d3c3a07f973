import { signedArea } from './gridRing.ts'
import { isSamePoint, toFlatRing, type GridPoint } from './gridPoints.ts'
import { relateRings } from './relateRings.ts'

interface HalfEdge { from: GridPoint; to: GridPoint; cut: number | null; face: number }

/**
 * The polygons that cuts leave of one polygon: rings are followed with their ground on the left, turning off at every cut.
 * Cuts that separate nothing (from the outline to a hole and no further) are left out.
 * @param rings outer ring counter-clockwise, holes clockwise, with a corner wherever a cut begins or ends.
 * @param cuts lines from corner to corner of the rings, inside the polygon, not crossing one another.
 */
export function traceFaces(rings: readonly GridPoint[][], cuts: readonly GridPoint[][]): GridPoint[][][] {
  const halves = [
    ...rings.flatMap((ring) => ring.map((from, index) => halfEdge(from, ring[(index + 1) % ring.length] ?? from, null))),
    ...cuts.flatMap((cut, number) => cut.slice(1).flatMap((to, index) => {
      const from = cut[index] ?? to
      return [halfEdge(from, to, number), halfEdge(to, from, number)]
    })),
  ]
  const cycles = followAll(halves)
  const parting = cuts.filter((_, number) => new Set(halves.filter(({ cut }) => cut === number).map(({ face }) => face)).size > 1)
  if (parting.length < cuts.length) return traceFaces(rings, parting)
  return placeHoles(cycles.flatMap(untie))
}

const halfEdge = (from: GridPoint, to: GridPoint, cut: number | null): HalfEdge => ({ from, to, cut, face: -1 })
const keyOf = ([x, y]: GridPoint): string => `${x} ${y}`

function followAll(halves: readonly HalfEdge[]): GridPoint[][] {
  const leaving = new Map<string, HalfEdge[]>()
  for (const half of halves) leaving.set(keyOf(half.from), [...(leaving.get(keyOf(half.from)) ?? []), half])
  const cycles: GridPoint[][] = []
  for (const start of halves) {
    if (start.face !== -1) continue
    const cycle: GridPoint[] = []
    for (let half: HalfEdge | undefined = start; half !== undefined && half.face === -1; half = nextOf(half, leaving.get(keyOf(half.to)) ?? [])) {
      half.face = cycles.length
      cycle.push(half.from)
    }
    cycles.push(cycle)
  }
  return cycles
}

/** Of the edges leaving a corner the first one clockwise from the way back. */
function nextOf({ from, to }: HalfEdge, leaving: readonly HalfEdge[]): HalfEdge | undefined {
  const back = Math.atan2(from[1] - to[1], from[0] - to[0])
  const clockwise = ({ to: on }: HalfEdge): number => {
    const turned = (back - Math.atan2(on[1] - to[1], on[0] - to[0])) % (2 * Math.PI)
    return turned <= 0 ? turned + 2 * Math.PI : turned
  }
  return leaving.reduce<HalfEdge | undefined>((least, each) => (least === undefined || clockwise(each) < clockwise(least) ? each : least), undefined)
}

/** A ring that comes back to a corner, as where a cut passes by the corner of a hole, as rings that touch there. */
function untie(cycle: readonly GridPoint[]): GridPoint[][] {
  const rings: GridPoint[][] = []
  const open: GridPoint[] = []
  for (const corner of cycle) {
    const before = open.findIndex((each) => isSamePoint(each, corner))
    if (before !== -1) rings.push(open.splice(before))
    open.push(corner)
  }
  return [...rings, open].filter((ring) => ring.length > 2)
}

function placeHoles(cycles: readonly GridPoint[][]): GridPoint[][][] {
  const [outer, holes] = [cycles.filter((ring) => signedArea(toFlatRing(ring)) > 0), cycles.filter((ring) => signedArea(toFlatRing(ring)) < 0)]
  const faces = outer.map((ring) => [ring])
  for (const hole of holes) faces.find(([ring = []]) => relateRings(toFlatRing(hole), toFlatRing(ring)) === 'within')?.push(hole)
  return faces
}
