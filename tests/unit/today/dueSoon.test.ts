import { describe, expect, it } from 'vitest'
import { dueSoon, type DueFacts } from '../../../shared/today/dueSoon.ts'

const NOTHING: DueFacts = { today: '2026-06-16', certificate: null, sprayers: [], papers: [] }
const sprayer = (code: string, dueOn: string | null, retired: unknown = null): DueFacts['sprayers'][number] => ({ id: code, code, retired, calibration: dueOn === null ? null : { dueOn } })
const paper = (title: string, expiresOn: string | null): DueFacts['papers'][number] => ({ id: title, kind: 'licence', title, person: { name: 'Ines Calder' }, expiresOn })

describe('what falls due', () => {
  it.each([
    ['2026-06-15', true], ['2026-06-16', false], ['2026-07-16', false],
  ])('names a licence that holds until %s', (expiresOn, isPast) => {
    expect(dueSoon({ ...NOTHING, papers: [paper('Spray licence', expiresOn)] })).toEqual([
      { kind: 'licence', id: 'Spray licence', name: 'Ines Calder', what: 'Spray licence', on: expiresOn, isPast },
    ])
  })

  it.each(['2026-07-17', null])('says nothing of one that holds until %s', (expiresOn) => {
    expect(dueSoon({ ...NOTHING, papers: [paper('Spray licence', expiresOn)] })).toEqual([])
  })

  it('puts the soonest first and what was never measured last, and leaves out what is out of use', () => {
    const due = dueSoon({
      today: '2026-12-20', certificate: { number: 'OR-118', expiresOn: '2026-12-31' },
      sprayers: [sprayer('S3', null), sprayer('S1', '2027-01-10'), sprayer('S2', '2026-12-01'), sprayer('S9', '2026-12-01', { on: '2026-11-01' }), sprayer('S8', null, {})],
      papers: [paper('Course', '2027-01-19'), paper('Later', '2027-01-20')],
    })
    expect(due.map(({ kind, name, isPast }) => [kind, name, isPast])).toEqual([
      ['calibration', 'S2', true], ['certificate', 'OR-118', false], ['calibration', 'S1', false], ['licence', 'Ines Calder', false], ['uncalibrated', 'S3', false],
    ])
  })
})
