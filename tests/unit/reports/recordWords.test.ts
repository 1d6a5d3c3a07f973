import { describe, expect, it } from 'vitest'
import { checksTally, groupChecks } from '../../../server/reports/record/checksTable.ts'
import { peopleFacts } from '../../../server/reports/record/peopleFacts.ts'
import { placeFacts } from '../../../server/reports/record/placeFacts.ts'
import { weatherFacts } from '../../../server/reports/record/weatherFacts.ts'
import type { Fact } from '../../../server/reports/parts/factsList.ts'
import { recordFigures } from '../../../server/reports/record/recordFigures.ts'
import { openWords } from '../../../server/reports/record/reportWords.ts'
import { buildRecordReportData } from '../../support/buildRecordReportData.ts'
import { buildCheck, buildSignedRecord } from '../../support/buildSignedRecord.ts'

const words = openWords('en', 'America/Los_Angeles')
const base = buildSignedRecord()
const read = (facts: Fact[], label: string): string | undefined =>
  facts.find((fact) => fact.label === label)?.spans.map(({ text }) => text).join('')

describe('groupChecks', () => {
  it('puts law first and recipe last, the worst first in each', () => {
    const checks = [
      buildCheck({ code: 'a', rests: 'recipe', verdict: 'stop' }), buildCheck({ code: 'b', rests: 'house', verdict: 'pass' }),
      buildCheck({ code: 'c', rests: 'house', verdict: 'unknown' }), buildCheck({ code: 'd', rests: 'house', verdict: 'caution' }),
      buildCheck({ code: 'e', rests: 'certifier' }), buildCheck({ code: 'f', rests: 'law', verdict: 'pass' }), buildCheck({ code: 'g', rests: 'label' }),
    ]
    expect(groupChecks(checks).map(({ code }) => code)).toEqual(['f', 'g', 'e', 'd', 'c', 'b', 'a'])
  })
})

describe('checksTally', () => {
  const stop = buildCheck({ verdict: 'stop' })
  const unknown = buildCheck({ verdict: 'unknown' })
  it.each([
    [[buildCheck()], 'No stop found'],
    [[unknown, buildCheck({ verdict: 'caution' })], 'No stop found; 1 caution; 1 not known'],
    [[stop], '1 stop, signed as it happened'],
    [[stop, stop, unknown], '2 stops, signed as it happened; 1 not known'],
  ])('never counts what passed', (checks, tally) => {
    expect(checksTally(checks, words)).toBe(tally)
  })
})

describe('peopleFacts', () => {
  const entered = (receivedAt: string): string | undefined =>
    read(peopleFacts(buildRecordReportData({ signed: buildSignedRecord({ times: { ...base.times, receivedAt } }) }), words), 'Entered by')
  it.each([
    ['2026-06-16T15:36:00Z', 'Oda Verrill, 1 min before the end'],
    ['2026-06-16T15:37:00Z', 'Oda Verrill, 0 min after the end'],
    ['2026-06-16T17:07:00Z', 'Oda Verrill, 1 h after the end'],
    ['2026-06-17T15:37:00Z', 'Oda Verrill, 24 h after the end'],
    ['2026-06-17T15:37:01Z', 'Oda Verrill, late: 24 h after the end'],
    ['2026-06-19T15:37:00Z', 'Oda Verrill, late: 3 d after the end'],
  ])('received %s', (receivedAt, text) => {
    expect(entered(receivedAt)).toBe(text)
  })

  it.each([
    [null, 'not told'],
    ['2026-06-16T16:16:00Z', '16 June 2026, 09:16:00'],
    ['2026-06-16T16:18:04Z', '16 June 2026, 09:18:04, 6 min ahead of the server'],
  ])('device clock %s against the server', (deviceAt, text) => {
    expect(read(peopleFacts(buildRecordReportData({ signed: buildSignedRecord({ times: { ...base.times, deviceAt } }) }), words), 'Device clock')).toBe(text)
  })
})

describe('facts', () => {
  it('says so where a name was blanked', () => {
    const facts = peopleFacts(buildRecordReportData({ names: { doneBy: '', enteredBy: 'Oda Verrill', signedBy: '' } }), words)
    expect(read(facts, 'Done by')).toBe('name no longer kept')
    expect(read(facts, 'Signed')).toBe('16 June 2026, 09:12:40, name no longer kept, by password')
  })


  it('says so where nothing was read or written', () => {
    const signed = buildSignedRecord({ sprayer: null, computed: { ...base.computed, air: null }, content: { ...base.content, weather: null, purpose: null } })
    const facts = [...weatherFacts(buildRecordReportData({ signed }), words), ...placeFacts(buildRecordReportData({ signed }), words)]
    expect(['Sprayer', 'Wind', 'Air', 'Humidity', 'For'].map((label) => read(facts, label)))
      .toEqual(['none named', 'not read', 'not read', 'not read', 'not written down'])
  })

  it('keeps the digits that were typed', () => {
    const weather = { ...base.content.weather!, air: { value: '-0.50', unit: 'degC' as const, kind: 'felt' as const } }
    const signed = buildSignedRecord({ content: { ...base.content, weather } })
    expect(read(weatherFacts(buildRecordReportData({ signed }), words), 'Air')).toBe('−0.50 °C, felt')
  })
})

describe('words', () => {
  it('gives a small area four decimals, a large one two', () => {
    expect([words.hectares('6'), words.hectares('999'), words.hectares('1000'), words.hectares('5003000')]).toEqual(['0.0006', '0.0999', '0.10', '500.30'])
  })
  it('gives a worked-out figure the decimals its size asks for', () => {
    expect(['0.01234', '0.5', '1.9', '37.5', '750', '12345.67', '0'].map((value) => words.amount(value)))
      .toEqual(['0.0123', '0.5', '1.90', '37.50', '750.0', '12\u00A0346', '0.0'])
  })
  it('tells day and time where the farm is, over a change of clocks too', () => {
    expect(words.moment('2026-11-01T08:30:00Z')).toBe('1 November 2026, 01:30')
    expect(words.moment('2026-11-01T09:30:07Z', { seconds: true })).toBe('1 November 2026, 01:30:07')
  })
})

describe('recordFigures', () => {
  it('agrees with what the sheet gave at signing and notices any other figure', () => {
    expect(recordFigures(base).agrees).toBe(true)
    const { computed } = base
    for (const changed of [
      { ...computed, totalL: '791.2' }, { ...computed, waterL: null }, { ...computed, loads: null },
      { ...computed, components: [{ amount: { value: '37.5', unit: 'mL' as const } }, ...computed.components.slice(1)] },
    ]) expect(recordFigures({ ...base, computed: changed }).agrees).toBe(false)
  })
})
