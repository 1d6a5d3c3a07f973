import { describe, expect, it } from 'vitest'
import { overlapOf } from '../../../shared/people/overlapOf.ts'

const paper = (id: string, issuedOn: string | null, expiresOn: string | null, more: { kind?: 'training' | 'licence'; title?: string } = {}) =>
  ({ id, kind: 'licence' as const, title: 'Applicator licence', issuedOn, expiresOn, ...more })
const old = paper('a', '2025-03-01', '2026-03-31')

describe('the days on which two papers of one name hold', () => {
  it.each([
    ['a renewal a month early', paper('b', '2026-03-01', '2027-03-31'), { from: '2026-03-01', until: '2026-03-31' }],
    ['one day alone', paper('b', '2026-03-31', null), { from: '2026-03-31', until: '2026-03-31' }],
    ['none, the day after', paper('b', '2026-04-01', null), null],
    ['one without days', paper('b', null, null), { from: '2025-03-01', until: '2026-03-31' }],
    ['another spacing and case', paper('b', null, null, { title: ' applicator  Licence' }), { from: '2025-03-01', until: '2026-03-31' }],
    ['another name', paper('b', null, null, { title: 'First aid' }), null],
    ['another kind', paper('b', null, null, { kind: 'training' }), null],
    ['itself', old, null],
  ])('%s', (_name, other, days) => {
    expect(overlapOf(old, other)).toEqual(days)
    expect(overlapOf(other, old)).toEqual(days)
  })

  it('are open where neither is bounded', () => {
    expect(overlapOf(paper('a', null, null), paper('b', null, null))).toEqual({ from: null, until: null })
  })
})
