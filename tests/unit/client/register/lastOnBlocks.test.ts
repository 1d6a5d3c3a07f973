import { describe, expect, it } from 'vitest'
import type { Block } from '../../../../shared/contract/block.ts'
import { lastOnBlocks } from '../../../../shared/register/lastOnBlocks.ts'
import { buildRow } from './buildRow.ts'

const block = (id: string, code: string): Block => ({
  id, code, name: code, crop: null, areaM2: 1, perimeterM: 4, version: 1, revision: 1, createdAt: '2026-03-01T08:00:00Z',
  endedOn: null, endedBy: null, fromIds: [], intoIds: [], land: null, counts: { plants: null, beds: null, rows: null, rowM: null },
  geometry: { type: 'Polygon', coordinates: [[[0, 0], [1, 0], [1, 1], [0, 0]]] },
})
const on = (id: string, startedAt: string, state: 'signed' | 'withdrawn' = 'signed') =>
  buildRow({ id: `${id}/${startedAt}`, blocks: [{ id, code: id }], startedAt, state })

describe('lastOnBlocks', () => {
  it('takes the latest signed work of each block, whatever the order of the rows, longest ago first', () => {
    const found = lastOnBlocks([block('a', 'A1'), block('b', 'B1')], [
      on('a', '2026-06-01T08:00:00Z'), on('b', '2026-06-03T08:00:00Z'), on('a', '2026-06-10T08:00:00Z'),
    ])
    expect(found.map(({ block: { code }, row }) => [code, row?.startedAt])).toEqual([
      ['B1', '2026-06-03T08:00:00Z'], ['A1', '2026-06-10T08:00:00Z'],
    ])
  })

  it('puts a block without a record first and leaves withdrawn work out', () => {
    const found = lastOnBlocks([block('a', 'A1'), block('b', 'B1')], [on('a', '2026-06-01T08:00:00Z'), on('b', '2026-06-02T08:00:00Z', 'withdrawn')])
    expect(found.map(({ block: { code }, row }) => [code, row === null])).toEqual([['B1', true], ['A1', false]])
  })
})
