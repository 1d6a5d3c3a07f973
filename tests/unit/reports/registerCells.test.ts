import { describe, expect, it } from 'vitest'
import { REGISTER_COLUMNS, registerCells } from '../../../server/reports/register/registerCells.ts'
import { buildPrintedRow } from '../../support/buildRegisterReportData.ts'

type Row = ReturnType<typeof buildPrintedRow>
const cell = (column: (typeof REGISTER_COLUMNS)[number]['name'], changes: Partial<Row>): string | undefined =>
  registerCells(buildPrintedRow(0, changes), { language: 'en', zone: 'America/Los_Angeles' })[REGISTER_COLUMNS.findIndex(({ name }) => name === column)]

describe('a row of the printed register', () => {
  it.each([
    [{ stop: 2, caution: 1, unknown: 0 }, '2 stops, signed'],
    [{ stop: 0, caution: 5, unknown: 0 }, 'Caution 5'],
    [{ stop: 0, caution: 1, unknown: 2 }, 'Caution 1; 2 not known'],
    [{ stop: 0, caution: 0, unknown: 1 }, 'No stop; 1 not known'],
    [{ stop: 0, caution: 0, unknown: 0 }, 'No stop'],
  ])('says of %j the worst there is, and never that all passed', (tally, words) => {
    expect(cell('checks', { tally })).toBe(words)
  })

  it('reads a rate for each plant before the one on a hectare', () => {
    expect(cell('rate', { sprayPerEach: { each: 'plant', litres: '0.05' }, sprayLPerHa: '279.35' })).toBe('50\u00a0mL/plant\n279\u00a0L')
    expect(cell('rate', { sprayLPerHa: '421.6' })).toBe('422\u00a0L')
  })
})
