import { describe, expect, it } from 'vitest'
import { recordSheet } from '../../../../shared/mix/recordSheet.ts'
import { sheetInputOf } from '../../../../src/composables/record/recordContent.ts'
import { signGaps } from '../../../../src/composables/record/recordGaps.ts'
import { timeFaults } from '../../../../src/composables/record/timeFaults.ts'
import { buildDraft, buildLine } from './buildRecord.ts'

const ZONE = 'America/Los_Angeles'
/** 16 June, 14:00 on the farm. */
const NOW = new Date('2026-06-16T21:00:00Z')
const start = (date: string, time = '06:50') => ({ date, time, offset: '' })
const end = (time: string, nextDay = false) => ({ time, offset: '', nextDay })
const faultsOf = (line: Parameters<typeof buildLine>[0]) => timeFaults(buildDraft({ lines: [buildLine(line)] }), ZONE, NOW)

describe('when the work was', () => {
  it.each([
    ['today', {}],
    ['long ago', { start: start('1998-06-16') }],
    ['a few minutes ahead, as clocks differ', { start: start('2026-06-16', '13:55'), end: end('14:09') }],
    ['without times', { start: start('2026-06-16', ''), end: end('') }],
    ['without a day', { start: start(''), end: end('') }],
  ])('is as it can be: %s', (_when, line) => {
    expect(faultsOf(line)).toEqual({})
  })

  it.each([
    ['2062-06-16', 'recordForm.gap.dayToCome'],
    ['2026-06-17', 'recordForm.gap.dayToCome'],
    ['1926-06-16', 'problems.date.years'],
    ['0202-06-16', 'problems.date.years'],
    ['9999-06-16', 'problems.date.years'],
  ])('on %s is said of the day, times or none, and of nothing else', (date, words) => {
    expect(faultsOf({ start: start(date) })).toEqual({ 'lines.0.day': words })
    expect(faultsOf({ start: start(date, ''), end: end('') })).toEqual({ 'lines.0.day': words })
  })

  it('later today is said of the time', () => {
    expect(faultsOf({ end: end('14:30') })).toEqual({ 'lines.0.endedAt': 'problems.time.future' })
    expect(faultsOf({ start: start('2026-06-16', '20:00'), end: end('01:00', true) })).toEqual({ 'lines.0.startedAt': 'problems.time.future', 'lines.0.endedAt': 'problems.time.future' })
  })

  it('says when a solid was worked in, likewise', () => {
    const solid = (workedInOn: string) => timeFaults(buildDraft({ method: 'solid', workedInOn, lines: [buildLine()] }), ZONE, NOW)
    expect(solid('2026-06-17')).toEqual({ workedInOn: 'recordForm.gap.dayToCome' })
    expect(solid('1926-06-17')).toEqual({ workedInOn: 'problems.date.years' })
    expect(solid('')).toEqual({})
  })

  it('bars the signature for a year that no record has, and not for what this clock says', () => {
    const gapsOf = (date: string) => {
      const draft = buildDraft({ step: 2, lines: [buildLine({ start: start(date) })] })
      return signGaps({ draft, sheet: recordSheet(sheetInputOf(draft, { blocks: [], sprayer: null })), zone: ZONE, hasStops: false })
    }
    expect(gapsOf('1926-06-16')).toMatchObject({ 'lines.0.day': 'problems.date.years' })
    expect(gapsOf('2062-06-16')).not.toHaveProperty('lines.0.day')
  })
})
