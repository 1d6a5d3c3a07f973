import { describe, expect, it } from 'vitest'
import { readTimeText } from '../../../../src/components/app/readTimeText.ts'
import { stepQuantity } from '../../../../src/components/app/stepQuantity.ts'
import { outlinePath } from '../../../../src/components/marks/outlinePath.ts'

describe('readTimeText', () => {
  it.each([['7:35', '07:35'], ['735', '07:35'], ['0735', '07:35'], ['7.35', '07:35'], ['7h35', '07:35'], ['7', '07:00'], [' 23:59 ', '23:59'], ['', '']])(
    'reads %o as %o', (text, time) => { expect(readTimeText(text)).toBe(time) },
  )
  it.each(['24:00', '7:60', '7:5', 'noon', '12345', '-1'])('refuses %o', (text) => { expect(readTimeText(text)).toBeNull() })
})

describe('stepQuantity', () => {
  it.each([['40', 5, '45'], ['', 5, '5'], ['0.1', 0.2, '0.3'], ['1½', 0.5, '2'], ['1,5', -0.5, '1']])('%o and %d make %o', (text, step, next) => {
    expect(stepQuantity(text, step)).toBe(next)
  })
  it('never falls under 0, unless it is a temperature', () => {
    expect(stepQuantity('2', -5)).toBe('0')
    expect(stepQuantity('2', -5, { signed: true })).toBe('-3')
  })
  it('leaves what it cannot read', () => { expect(stepQuantity('12abc', 1)).toBe('12abc') })
})

describe('outlinePath', () => {
  const square = { type: 'Polygon' as const, coordinates: [[[10, 0], [10.002, 0], [10.002, 0.002], [10, 0.002], [10, 0]] as [number, number][]] }

  it('fills its square, north up', () => {
    expect(outlinePath(square, 22)).toBe('M2.00 20.00L20.00 20.00L20.00 2.00L2.00 2.00L2.00 20.00Z')
  })
  it('keeps the shape: at 60° north a degree of longitude is half one of latitude', () => {
    const north = { type: 'Polygon' as const, coordinates: [[[10, 59.999], [10.002, 59.999], [10.002, 60.001], [10, 60.001], [10, 59.999]] as [number, number][]] }
    const xs = [...outlinePath(north, 22).matchAll(/[ML]([\d.]+) /g)].map((found) => Number(found[1]))
    expect(Math.max(...xs) - Math.min(...xs)).toBeCloseTo(9, 1)
  })
  it('draws holes as further rings, and nothing for nothing', () => {
    const hole: [number, number][] = [[10.0005, 0.0005], [10.001, 0.0005], [10.001, 0.001], [10.0005, 0.0005]]
    expect(outlinePath({ type: 'Polygon', coordinates: [...square.coordinates, hole] }, 22).match(/Z/g)).toHaveLength(2)
    expect(outlinePath({ type: 'MultiPolygon', coordinates: [] }, 22)).toBe('')
  })
})
