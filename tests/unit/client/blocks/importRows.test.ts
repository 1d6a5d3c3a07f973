import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Candidate } from '../../../../shared/importing/importTypes.ts'
import { comingBlocks, shapeNumber, viewOf } from '../../../../src/composables/block/comingBlocks.ts'
import { countRows, faultOfAll, importRows } from '../../../../src/composables/block/importRows.ts'

const square: Candidate['geometry'] = { type: 'Polygon', coordinates: [[[10, 45], [10.001, 45], [10.001, 45.001], [10, 45.001], [10, 45]]] }
const candidate = (number: number, change: Partial<Candidate> = {}): Candidate => ({
  number, name: `Piece ${number}`, code: `P${number}`, crop: '', geometry: square, areaM2: 8_000, points: 5, pointsRead: 5,
  refusals: [], cautions: [], twin: null, notes: [], ...change,
})
const refused = (number: number): Candidate => candidate(number, { geometry: null, refusals: [{ id: 'importing.refused.point', params: {} }] })
const doubted = (number: number): Candidate => candidate(number, { cautions: [{ code: 'geometry.overlap', message: { id: 'problems.geometry.overlap', params: { code: 'A', areaHa: 1 } } }] })
const twin = (number: number): Candidate => candidate(number, { twin: { id: 'importing.twin.name', params: { code: 'A' } } })

describe('rows of an import', () => {
  it('tick what nothing speaks against, and never what is refused', () => {
    const list = [candidate(1), refused(2), doubted(3), twin(4)]
    expect(importRows(list, new Map(), []).map(({ taken }) => taken)).toEqual([true, false, false, false])
    const all = new Map(list.map(({ number }) => [number, { taken: true }]))
    expect(importRows(list, all, []).map(({ taken }) => taken)).toEqual([true, false, true, true])
  })

  it('count every shape once, whatever is ticked', () => {
    const kinds = fc.constantFrom(candidate, refused, doubted, twin)
    fc.assert(fc.property(fc.array(fc.tuple(kinds, fc.option(fc.boolean())), { maxLength: 40 }), (list) => {
      const edits = new Map(list.flatMap(([, taken], index) => (taken === null ? [] : [[index + 1, { taken }] as const])))
      const count = countRows(importRows(list.map(([kind], index) => kind(index + 1)), edits, []))
      expect(count.read).toBe(list.length)
      expect(count.taken + count.refused + count.left).toBe(count.read)
    }))
  })

  it('hold codes and names of ticked ones against the farm, each other, and what a block can bear', () => {
    const list = [candidate(1, { code: 'a1' }), candidate(2, { code: 'X' }), candidate(3, { code: 'x' }), candidate(4, { code: '' }), candidate(5, { name: ' ' }), candidate(6)]
    const rows = importRows(list, new Map(), ['A1'])
    expect(rows.map(({ codeError, nameError }) => codeError ?? nameError)).toEqual(['taken', 'twice', 'twice', 'code', 'name', null])
    const without = importRows(list, new Map([[1, { taken: false }], [2, { taken: false }]]), ['A1'])
    expect(without.map(({ codeError }) => codeError)).toEqual([null, null, null, 'code', null, null])
  })

  it('are sent only where they fit into one go', () => {
    const count = countRows(importRows([candidate(1), refused(2)], new Map(), []))
    expect(faultOfAll(count, 1_000)).toBeNull()
    expect(faultOfAll(count, 1_000_000)).toBe('heavy')
    expect(faultOfAll({ ...count, taken: 0 }, 0)).toBe('none')
    expect(faultOfAll({ ...count, taken: 501 }, 0)).toBe('many')
  })
})

describe('the shapes on the map', () => {
  it('are those that come in, found again by their number, in a view that holds them', () => {
    const rows = importRows([candidate(1), refused(2), candidate(3)], new Map(), [])
    const onMap = comingBlocks({ language: 'en', units: 'metric' }, rows)
    expect(onMap.map(({ id, code, areaText, isComing }) => [shapeNumber(id), code, areaText, isComing])).toEqual([[1, 'P1', '0.80\u00a0ha', true], [3, 'P3', '0.80\u00a0ha', true]])
    expect(shapeNumber('01a2324c-5ad8-7495-9b6c-97ad4b253bc4')).toBeNull()
    expect(viewOf(rows, 480)?.centre).toEqual([expect.closeTo(10.0005, 7), expect.closeTo(45.0005, 7)])
    expect(viewOf(importRows([refused(1)], new Map(), []), 480)).toBeNull()
  })
})
