import { expect, it } from 'vitest'
import { presentBlocks } from '../../../shared/register/presentBlocks.ts'

it.each([
  [[], '', ''], [['A3'], 'A3', 'A3'], [['T1', 'T2'], 'T1, T2', 'T1, T2'], [['P1', 'P2', 'C1, low'], 'P1, P2, C1, low', 'P1 +2'],
])('%j in a wide and in a narrow column', (codes, wide, narrow) => {
  expect(presentBlocks(codes.map((code) => ({ id: `id of ${code}`, code })))).toEqual({ blockIds: codes.map((code) => `id of ${code}`), codes: wide, codesShort: narrow })
})
