import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'
import { isZone } from '../../../shared/time/isZone.ts'
import { parseInstant } from '../../../shared/time/parseInstant.ts'
import { toInstant } from '../../../shared/time/toInstant.ts'

const berlin = 'Europe/Berlin'

describe('toInstant', () => {
  it('reads a clock on the land', () => {
    expect(toInstant({ date: '2026-06-16', time: '06:30', zone: 'Pacific/Honolulu' })).toEqual({ ok: true, instant: '2026-06-16T16:30:00Z' })
    expect(toInstant({ date: '2026-06-16', time: '06:30:15', zone: berlin, offset: '+02:00' })).toEqual({ ok: true, instant: '2026-06-16T04:30:15Z' })
  })

  it('says that a clock skipped the time: 02:30 on 29 March 2026 in Berlin', () => {
    expect(toInstant({ date: '2026-03-29', time: '02:30', zone: berlin })).toEqual({
      ok: false, problem: { id: 'time.nonexistent', params: { date: '2026-03-29', time: '02:30', zone: berlin } }, candidates: [],
    })
  })

  it('says that a clock showed the time twice, and takes the offset for an answer: 02:30 on 25 October 2026', () => {
    const moment = { date: '2026-10-25', time: '02:30', zone: berlin }
    expect(toInstant(moment)).toEqual({
      ok: false,
      problem: { id: 'time.ambiguous', params: { ...moment, earlier: '+02:00', later: '+01:00' } },
      candidates: [{ instant: '2026-10-25T00:30:00Z', offset: '+02:00' }, { instant: '2026-10-25T01:30:00Z', offset: '+01:00' }],
    })
    expect(toInstant({ ...moment, offset: '+02:00' })).toEqual({ ok: true, instant: '2026-10-25T00:30:00Z' })
    expect(toInstant({ ...moment, offset: '+01:00' })).toEqual({ ok: true, instant: '2026-10-25T01:30:00Z' })
  })

  it.each([
    { date: '2026-02-30' }, { date: '2026-13-01' }, { date: '20266-01-01' }, { date: 'tomorrow' }, { date: '' }, { time: '24:00' }, { time: '23:59:60' }, { time: '6:30' },
    { time: '' }, { zone: 'Mars/Phobos' }, { zone: '' }, { offset: '+03:00' }, { offset: 'Z' },
  ])('refuses %o', (bad) => {
    const result = toInstant({ date: '2026-06-16', time: '06:30', zone: berlin, ...bad })
    expect(result).toMatchObject({ ok: false, problem: { id: 'time.invalid' }, candidates: [] })
  })

  it('comes back through the civil date and time of the zone', () => {
    const zone = fc.constantFrom('Pacific/Auckland', 'Pacific/Apia', 'America/St_Johns', 'Asia/Kolkata', 'Europe/Berlin', 'Australia/Lord_Howe')
    const minute = fc.integer({ min: 0, max: 60 * 24 * 365 * 60 }).map((count) => new Date(count * 60_000).toISOString().replace('.000', ''))
    fc.assert(fc.property(zone, minute, (name, instant) => {
      const result = toInstant({ date: civilDateIn(name, instant), time: civilTimeIn(name, instant), zone: name })
      if (result.ok) expect(result.instant).toBe(instant)
      else expect(result.candidates.map((candidate) => candidate.instant)).toContain(instant)
    }), { seed: 20_260_616, numRuns: 150 })
  })
})

describe('civil date', () => {
  it('is the date on the land, not in Greenwich', () => {
    expect(civilDateIn('Pacific/Tongatapu', '2026-06-15T11:30:00Z')).toBe('2026-06-16')
    expect(civilTimeIn('Pacific/Tongatapu', '2026-06-15T11:30:59Z')).toBe('00:30')
    expect(civilDateIn('Pacific/Honolulu', '2026-06-16T05:00:00+00:00')).toBe('2026-06-15')
  })

  it.each([['Mars/Phobos', '2026-06-16T05:00:00Z'], ['Europe/Berlin', '2026-06-16T05:00:00'], ['Europe/Berlin', 'now']])('refuses %s, %s', (zone, instant) => {
    expect(() => civilDateIn(zone, instant)).toThrow(RangeError)
    expect(() => civilTimeIn(zone, instant)).toThrow(RangeError)
  })
})

describe('isZone', () => {
  it.each(['Pacific/Honolulu', 'Europe/Berlin', 'America/Argentina/Buenos_Aires', 'Asia/Kolkata', 'UTC', 'Etc/GMT+5', 'America/Port-au-Prince', 'US/Pacific', 'Etc/UTC', 'America/Argentina/ComodRivadavia'])('knows %s', (name) => {
    expect(isZone(name)).toBe(true)
  })

  it.each(['EST5EDT', 'US/Pacific-New', 'SystemV/PST8', 'Canada/East-Saskatchewan', 'Etc/Unknown', 'Mars/Phobos', 'EST', '+02:00', 'europe/berlin', 'Europe/berlin', 'EUROPE/BERLIN', '', 'Europe/', 'Europe/Berlin ', 'GMT'])('refuses %o', (name) => {
    expect(isZone(name)).toBe(false)
  })
})

describe('parseInstant', () => {
  it.each([
    ['2026-06-16T06:30:00-10:00', '2026-06-16T16:30:00Z'], ['2026-06-16T06:30:00Z', '2026-06-16T06:30:00Z'], ['2026-06-16T06:30:00.250Z', '2026-06-16T06:30:00.25Z'],
    ['2028-02-29T00:00:00+13:00', '2028-02-28T11:00:00Z'],
  ])('reads %s', (text, instant) => {
    expect(parseInstant(text)).toEqual({ ok: true, instant })
  })

  it.each([
    ['2026-06-16T06:30:00', 'time.zone_needed'], ['2026-02-30T06:30:00Z', 'time.invalid'], ['2026-06-16T23:59:60Z', 'time.invalid'], ['2026-06-16', 'time.invalid'],
    ['infinity', 'time.invalid'], ['tomorrow', 'time.invalid'], ['epoch', 'time.invalid'], ['20266-01-01T00:00:00Z', 'time.invalid'], ['', 'time.invalid'],
    ['1969-12-31T23:59:59Z', 'time.range'], ['2200-01-01T00:00:00Z', 'time.range'], ['2026-06-16T06:30Z', 'time.invalid'], ['2026-06-16 06:30:00Z', 'time.invalid'],
  ])('refuses %o as %s', (text, id) => {
    expect(parseInstant(text)).toMatchObject({ ok: false, problem: { id } })
  })
})
