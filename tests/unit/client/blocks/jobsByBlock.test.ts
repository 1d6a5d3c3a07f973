import { expect, it } from 'vitest'
import { jobsByBlock } from '../../../../src/composables/map/useMapMarks.ts'

it('marks a block late where one of its jobs is, whichever comes first', () => {
  const jobs = jobsByBlock([
    { blockId: 'a', state: 'due' }, { blockId: 'b', state: 'late' }, { blockId: 'c', state: 'due' }, { blockId: 'c', state: 'late' }, { blockId: 'b', state: 'due' },
  ])
  expect([...jobs]).toEqual([['a', 'due'], ['b', 'late'], ['c', 'late']])
})
