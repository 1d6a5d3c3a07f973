import { describe, expect, it } from 'vitest'
import { labelSpot } from '../../../../src/components/map/labelSpot.ts'
import type { Pixel } from '../../../../src/composables/map/mapTypes.ts'

const box = (x: number, y: number, width: number, height: number): Pixel[] => [
  [x, y], [x + width, y], [x + width, y + height], [x, y + height],
]

describe('labelSpot', () => {
  it.each([
    { form: 'full', width: 120, height: 80 },
    { form: 'narrow', width: 34, height: 110 },
    { form: 'slip', width: 130, height: 26 },
    { form: 'code', width: 28, height: 24 },
    { form: 'small', width: 22, height: 60 },
    { form: 'outside', width: 12, height: 60 },
  ])('gives a block of $width × $height the form $form', ({ form, width, height }) => {
    expect(labelSpot([box(0, 0, width, height)]).form).toBe(form)
  })

  it.each([
    { form: 'full', width: 76 }, { form: 'small', width: 62 }, { form: 'outside', width: 54 },
  ])('gives a code of seven letters in a block of $width the form $form', ({ form, width }) => {
    expect(labelSpot([box(0, 0, width, 60)], [], { large: 66, small: 58 }).form).toBe(form)
  })

  it('stands near the middle of a plain block', () => {
    const { at } = labelSpot([box(0, 0, 200, 100)])
    expect(Math.abs(at[0] - 100)).toBeLessThan(15)
    expect(Math.abs(at[1] - 50)).toBeLessThan(10)
  })

  it('keeps clear of a hole', () => {
    const { form, at } = labelSpot([box(0, 0, 100, 160), box(30, 60, 40, 40)])
    expect(form).toBe('full')
    expect(at[1] < 60 || at[1] > 100).toBe(true)
  })

  it('keeps clear of the edges of a block that overlaps', () => {
    const { form, at } = labelSpot([box(0, 0, 160, 100)], [box(70, -20, 200, 200)])
    expect(form).toBe('full')
    expect(at[0] + 29 <= 70 || at[0] - 29 >= 70).toBe(true)
  })

  it('stands over the top where nothing fits, or under the foot', () => {
    expect(labelSpot([box(10, 50, 8, 40)])).toEqual({ form: 'outside', at: [14, 41], orAt: [14, 99] })
  })

  it('answers for a ring with thousands of points', () => {
    const ring = Array.from({ length: 5000 }, (_, index): Pixel => {
      const angle = (index / 5000) * 2 * Math.PI
      return [200 * Math.cos(angle), 200 * Math.sin(angle)]
    })
    expect(labelSpot([ring]).form).toBe('full')
  })
})
