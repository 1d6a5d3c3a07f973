import { describe, expect, it } from 'vitest'
import { cornerOf, insertCorner, moveCorner, moveWhole, removeCorner } from '../../../shared/geo/boundaryCorners.ts'
import { checkBoundary } from '../../../shared/geo/checkBoundary.ts'
import { cutHole } from '../../../shared/geo/cutHole.ts'
import type { Position } from '../../../shared/geo/geometryTypes.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import { buildMultiPolygon, buildPolygon, buildSquare } from './buildRing.ts'

const square = buildPolygon(buildSquare(10, 45))
const pond = buildSquare(10.0002, 45.0002, 0.0002)
const two = buildMultiPolygon([buildSquare(10, 45), pond.toReversed()], [buildSquare(10.01, 45)])
const first = { part: 0, ring: 0, corner: 0 }

describe('corners of a boundary', () => {
  it('are found by part, ring and number', () => {
    expect(cornerOf(two, { part: 1, ring: 0, corner: 2 })).toEqual([10.011, 45.001])
    expect(cornerOf(two, { part: 0, ring: 0, corner: 4 })).toBeUndefined()
    expect(cornerOf(square, { part: 1, ring: 0, corner: 0 })).toBeUndefined()
  })

  it('move, and the ring stays closed', () => {
    const moved = moveCorner(square, first, [9.999, 44.999])
    expect(moved.coordinates[0]).toEqual([[9.999, 44.999], [10.001, 45], [10.001, 45.001], [10, 45.001], [9.999, 44.999]])
    expect(square).toEqual(buildPolygon(buildSquare(10, 45)))
  })

  it('come in after another, also after the last', () => {
    const last = insertCorner(square, { ...first, corner: 3 }, [9.9995, 45.0005])
    expect(last.coordinates[0]?.at(-2)).toEqual([9.9995, 45.0005])
    expect(checkBoundary(last).findings).toEqual([])
  })

  it('go; a hole or part of three goes whole, and nothing is left of the last', () => {
    const triangle = removeCorner(square, first)
    expect(triangle).toEqual(buildPolygon([[10.001, 45], [10.001, 45.001], [10, 45.001], [10.001, 45]]))
    expect(triangle && removeCorner(triangle, first)).toBeNull()
    const threeCornered = pond.toSpliced(1, 1)
    expect(removeCorner(buildPolygon(buildSquare(10, 45), threeCornered), { part: 0, ring: 1, corner: 0 })).toEqual(square)
    const withTriangle = buildMultiPolygon([buildSquare(10, 45)], [buildSquare(10.01, 45).toSpliced(1, 1)])
    expect(removeCorner(withTriangle, { part: 1, ring: 0, corner: 0 })).toEqual(square)
  })

  it('move together: the shape and its area stay', () => {
    const moved = moveWhole(two, 300, -200)
    expect(measurePolygon(moved).areaM2 / measurePolygon(two).areaM2).toBeCloseTo(1, 4)
    const back = checkBoundary(moveWhole(moved, -300, 200)).geometry
    expect(cornerOf(back ?? square, { part: 1, ring: 0, corner: 2 })?.[0]).toBeCloseTo(10.011, 6)
  })
})

describe('cutHole', () => {
  const corners = (lon: number, side = 0.0002): Position[] => buildSquare(lon, 45.0002, side).slice(0, -1)

  it('cuts the part that it lies in', () => {
    const cut = cutHole(buildMultiPolygon([buildSquare(10, 45)], [buildSquare(10.01, 45)]), corners(10.0102)).geometry
    expect(cut?.coordinates.map((rings) => rings.length)).toEqual([1, 2])
    const lostM2 = measurePolygon(square).areaM2 - measurePolygon(cutHole(square, corners(10.0002)).geometry ?? square).areaM2
    expect(lostM2).toBeCloseTo(measurePolygon(buildPolygon(pond)).areaM2, 3)
  })

  it.each([
    { what: 'across the outline', hole: corners(9.9999), code: 'geometry.hole_outside' },
    { what: 'outside', hole: corners(10.1), code: 'geometry.hole_outside' },
    { what: 'around everything', hole: buildSquare(9, 44, 2).slice(0, -1), code: 'geometry.hole_outside' },
    { what: 'of two corners', hole: corners(10.0002).slice(0, 2), code: 'geometry.too_few_points' },
    { what: 'across itself', hole: [[10.0002, 45.0002], [10.0004, 45.0004], [10.0004, 45.0002], [10.0002, 45.0004]] as Position[], code: 'geometry.self_intersection' },
  ])('refuses one $what', ({ hole, code }) => {
    expect(cutHole(square, hole).findings[0]?.code).toBe(code)
  })

  it('refuses one that runs into another', () => {
    const once = cutHole(square, corners(10.0002)).geometry ?? square
    expect(cutHole(once, corners(10.0003)).findings[0]?.code).toBe('geometry.holes_overlap')
  })
})
