import { describe, expect, it } from 'vitest'
import { ref } from 'vue'
import { useTypedPoints } from '../../../../src/composables/block/useTypedPoints.ts'

const read = (text: string) => useTypedPoints(() => text, () => 'en')

describe('useTypedPoints', () => {
  it('reads latitude first and gives longitude first', () => {
    const { points, errors } = read('44.6, -123.3\n44.7, -123.3\n44.7, -123.2')
    expect(points.value).toEqual([[-123.3, 44.6], [-123.3, 44.7], [-123.2, 44.7]])
    expect(errors.value).toEqual([])
  })

  it('drops a last point that repeats the first', () => {
    expect(read('1, 2\n1, 3\n2, 3\n1, 2').points.value).toHaveLength(3)
  })

  it('says what is wrong line by line', () => {
    const { errors } = read('44.6, -123.3\nhere\n95, 3\n4941000, 475000')
    expect(errors.value).toEqual([
      'Line 2: not read. Write latitude, a comma, longitude.',
      'Line 3: latitude runs from −90 to 90, longitude from −180 to 180.',
      'Line 4: these look like metres. Degrees are needed.',
    ])
  })

  it('shows five lines and counts the rest', () => {
    const { errors } = read(Array.from({ length: 9 }, () => 'x').join('\n'))
    expect(errors.value).toHaveLength(6)
    expect(errors.value.at(-1)).toBe('and 4 more lines')
  })

  it('says once that longitude comes first, and exchanges every line', () => {
    const { errors, swapped } = read('-123.3, 44.6\n-123.3; 44.7\n\n-123,2 44,7\nhere\n44°42′N 123°12′W')
    expect(errors.value).toEqual([
      'Longitude seems to come first. Latitude stands first here.',
      'Line 5: not read. Write latitude, a comma, longitude.',
    ])
    expect(swapped.value).toBe('44.6, -123.3\n44.7; -123.3\n\n44,7; -123,2\nhere\n44°42′N 123°12′W')
    expect(read(swapped.value ?? '').points.value).toEqual([[-123.3, 44.6], [-123.3, 44.7], [-123.2, 44.7], [-123.2, 44.7]])
  })

  it.each(['44.6, -123.3\n95, 3', '44.6, 12.5', '-123.3, 200', ''])('offers no exchange for %j', (text) => {
    expect(read(text).swapped.value).toBeNull()
  })

  it('reads again as the text changes', () => {
    const text = ref('1, 2')
    const { points } = useTypedPoints(() => text.value, () => 'es')
    expect(points.value).toHaveLength(1)
    text.value = '1, 2\n3, 4'
    expect(points.value).toHaveLength(2)
  })
})
