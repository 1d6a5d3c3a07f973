import { describe, expect, it } from 'vitest'
import { certificateOn, certificateRuns, certificatesDuring, certificatesReplaced, certifiedUntil, coverEveryDay } from '../../../shared/season/certificateRuns.ts'
import { buildCertificate } from '../../support/buildCertificate.ts'

const A = buildCertificate({ number: 'A', validFrom: '2025-03-01', validUntil: '2026-02-28' })
const B = buildCertificate({ number: 'B', validFrom: '2026-03-01', validUntil: '2027-02-28' })
const OPEN = buildCertificate({ number: 'open', validFrom: null, validUntil: null })
const taken = { ...B, number: 'slip', withdrawn: { at: '2026-03-02T08:00:00Z', reason: 'A slip' } }
const runs = (...certificates: Parameters<typeof certificateRuns>[0]) => certificateRuns(certificates).map(({ certificate, from, until }) => [certificate.number, from, until])

describe('certificates of a farm', () => {
  it.each([
    ['one after the other', runs(B, A), [['A', '2025-03-01', '2026-02-28'], ['B', '2026-03-01', '2027-02-28']]],
    ['an early renewal ends the one before', runs(A, { ...B, validFrom: '2026-02-10' }), [['A', '2025-03-01', '2026-02-09'], ['B', '2026-02-10', '2027-02-28']]],
    ['one without days runs until the next', runs(OPEN, B), [['open', null, '2026-02-28'], ['B', '2026-03-01', '2027-02-28']]],
    ['of two from one day the one written later', runs(A, { ...A, number: 'A2' }), [['A2', '2025-03-01', '2026-02-28']]],
    ['one taken back runs never', runs(A, taken), [['A', '2025-03-01', '2026-02-28']]],
  ])('%s', (_case, got, wanted) => { expect(got).toEqual(wanted) })

  it.each([
    ['one after the other: none', [A, B], []],
    ['an early renewal, from its first day', [A, { ...B, id: 'b', validFrom: '2026-02-10' }], [['A', 'B', '2026-02-10', false]]],
    ['one that has no end, by the next', [{ ...OPEN, id: 'o' }, B], [['open', 'B', '2026-03-01', false]]],
    ['of two from one day the one written earlier, on all its days', [A, { ...A, id: 'a2', number: 'A2' }], [['A', 'A2', '2025-03-01', true]]],
    ['one before two from one day, by the one that stands then', [A, { ...B, id: 'b', validFrom: '2026-02-10' }, { ...B, id: 'b2', number: 'B2', validFrom: '2026-02-10' }], [['A', 'B2', '2026-02-10', false], ['B', 'B2', '2026-02-10', true]]],
    ['none by one taken back', [A, { ...taken, validFrom: '2026-02-10' }], []],
  ])('replaced: %s', (_case, certificates, wanted) => {
    const numbers = new Map(certificates.map(({ id, number }) => [id, number]))
    expect([...certificatesReplaced(certificates)].map(([id, { by, from, never }]) => [numbers.get(id), by.number, from, never])).toEqual(wanted)
  })

  it.each([
    ['2025-02-28', undefined], ['2025-03-01', 'A'], ['2026-02-28', 'A'], ['2026-03-01', 'B'], ['2027-03-01', undefined],
  ])('on %s: %s', (day, number) => { expect(certificateOn([A, B], day)?.number).toBe(number) })

  it.each([
    ['2026-01-01', '2026-06-30', ['A', 'B'], true], ['2025-02-28', '2025-06-30', ['A'], false], ['2027-01-01', '2027-03-01', ['B'], false], ['2024-01-01', '2024-12-31', [], false],
  ])('from %s to %s: %j, every day %s', (from, to, numbers, every) => {
    const during = certificatesDuring([A, B], { from, to })
    expect(during.map(({ certificate }) => certificate.number)).toEqual(numbers)
    expect(coverEveryDay(during, { from, to })).toBe(every)
  })

  it('finds a gap between two', () => {
    const span = { from: '2026-01-01', to: '2026-06-30' }
    expect(coverEveryDay(certificatesDuring([A, { ...B, validFrom: '2026-03-02' }], span), span)).toBe(false)
  })

  it.each([
    ['renewed without a gap', [A, B], '2025-06-01', { number: 'B', expiresOn: '2027-02-28' }],
    ['renewed after a gap', [A, { ...B, validFrom: '2026-03-02' }], '2025-06-01', { number: 'A', expiresOn: '2026-02-28' }],
    ['ended', [A], '2026-06-01', { number: 'A', expiresOn: '2026-02-28' }],
    ['without a last day', [OPEN], '2026-06-01', { number: 'open', expiresOn: null }],
    ['not begun', [B], '2026-01-01', null],
  ])('certified until, %s', (_case, certificates, day, wanted) => { expect(certifiedUntil(certificates, day)).toEqual(wanted) })
})
