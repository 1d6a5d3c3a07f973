import { expect, it } from 'vitest'
import { fileSize } from '../../../shared/files/fileSize.ts'

it.each([
  [1, '1', 'kB'], [999, '1', 'kB'], [1_499, '1', 'kB'], [1_500, '2', 'kB'], [999_499, '999', 'kB'], [999_500, '1.0', 'MB'], [10_485_760, '10.5', 'MB'],
])('%d bytes are %s %s', (bytes, value, unit) => {
  expect(fileSize(bytes)).toEqual({ value, unit })
})
