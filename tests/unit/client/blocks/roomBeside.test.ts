import { describe, expect, it } from 'vitest'
import { roomBeside, type Fitting } from '../../../../src/components/map/roomBeside.ts'
import type { Pixel } from '../../../../src/composables/map/mapTypes.ts'

const ROOM = { top: 10, right: 10, bottom: 10, left: 10 }
const square = (x: number, y: number, side = 1): Pixel[][] => [[[x, y], [x + side, y], [x + side, y + side], [x, y + side]]]
/** Four squares in the corners of a field of ten by ten, on a map of 500 by 500. */
const field = (polygons: Pixel[][][]): Fitting => ({ polygons, bounds: { minX: 0, minY: 0, maxX: 10, maxY: 10 }, size: [500, 500], zoomSnap: 0.01, mostZoom: 20 })
const CORNERS = [square(0, 0), square(9, 0), square(0, 9), square(9, 9)]
const KEY = { minX: 400, minY: 420, maxX: 490, maxY: 490 }

describe('room beside what lies over the map', () => {
  it('is as it was where nothing is covered', () => {
    expect(roomBeside(field(CORNERS.slice(0, 3)), ROOM, KEY)).toEqual(ROOM)
  })
  it('grows by as much as lays the last block free, and no more', () => {
    const { right, bottom } = roomBeside(field(CORNERS), ROOM, KEY)
    // The lowest corner of the field ends over the key, or left of it.
    expect(bottom - 10 >= 60 || right - 10 >= 80).toBe(true)
    expect(bottom <= 90 && right <= 110).toBe(true)
  })
  it('does not draw a farm small for it', () => {
    const wide = { minX: 20, minY: 250, maxX: 490, maxY: 490 }
    expect(roomBeside(field([square(0, 0, 10)]), ROOM, wide)).toEqual(ROOM)
  })
  it('finds no block under it that has a hole there', () => {
    const ring = (from: number, to: number): Pixel[] => [[from, from], [to, from], [to, to], [from, to]]
    expect(roomBeside(field([[ring(0, 10), ring(2, 9.8)]]), ROOM, { minX: 300, minY: 300, maxX: 400, maxY: 400 })).toEqual(ROOM)
  })
})
