import { describe, expect, it } from 'vitest'
import type { z } from 'zod'
import { v7 as uuidV7 } from 'uuid'
import { civilDateSchema, idSchema, instantSchema, pageQuerySchema } from '../../../shared/contract/common.ts'
import { createMaterialSchema } from '../../../shared/contract/input.ts'
import { decimalText, signedDecimal } from '../../../shared/contract/quantity.ts'
import { weatherSchema } from '../../../shared/contract/weather.ts'
import { lineText, noteText } from '../../../shared/contract/text.ts'

const faults = (schema: z.ZodType, value: unknown) =>
  schema.safeParse(value).error?.issues.map(({ path, message }) => [...path, message].join(' ')) ?? []

describe('words', () => {
  it.each(['👩‍🌾', '🏴󠁧󠁢󠁳󠁣󠁴󠁿 barley', 'Süd', 'क्ष', 'می‌خواهم', '⠁', '\uD83C\uDDF3\uD83C\uDDF4', 'a\tb', '1️⃣'])('keep %o', (text) => {
    expect(lineText(80).parse(text)).toBe(text.normalize('NFC'))
  })

  it.each(['', ' ', '\u200B\u200D', '\u2800', '\u3164', '\u115F\u1160', '\uFFA0', '\u034F', '\u180E', '\u00AD', '\u2061', '\uFEFF'])('find nothing written in %j', (text) => {
    expect(faults(lineText(80), text)).toContain('text.required')
  })

  it.each(['a\u0000', 'a\u007F', 'a\u0085', 'a\u009B', 'a\uFFFE', 'a\uFDD0', 'a\u{1FFFF}', 'a\u{10FFFE}', 'a\u{E0041}', 'a\u{E007F}', '🏴\u{E0067}', 'a\uD800'])('refuse what does not show in %j', (text) => {
    expect(faults(lineText(80), text)).toEqual(['text.control'])
  })

  it('stand on one line, or on at most 201', () => {
    expect(faults(lineText(80), 'a\nb')).toEqual(['text.line_break'])
    expect(faults(noteText(4000), `a${'\r\n'.repeat(200)}b`)).toEqual([])
    expect(faults(noteText(4000), `a${'\n'.repeat(201)}b`)).toEqual(['text.too_many_lines'])
  })
})

describe('ids, times and numbers', () => {
  it('spells an id in lower case', () => {
    const id = uuidV7()
    expect(idSchema.parse(id.toUpperCase())).toBe(id)
    expect(faults(idSchema, `${id}0`)).toEqual(['id.format'])
  })

  it.each([
    ['2026-06-16T06:30:00.123456789-10:00', []], ['2026-06-16T06:30:00Z', []], ['2026-06-16T06:30:00.1234567890123Z', ['time.invalid']],
    ['2026-06-16T06:30:00', ['time.zone_needed']], ['2026-02-30T06:30:00Z', ['time.invalid']], ['2200-01-01T00:00:00Z', ['time.range']], ['tomorrow', ['time.invalid']],
  ])('reads the instant %s: %j', (text, expected) => {
    expect(faults(instantSchema, text)).toEqual(expected)
  })

  it.each([['1970-01-01', []], ['2199-12-31', []], ['1969-12-31', ['date.years']], ['2200-01-01', ['date.years']], ['2026-02-30', ['date.invalid']], ['tomorrow', ['date.invalid']]])('reads the date %s: %j', (text, expected) => {
    expect(faults(civilDateSchema, text)).toEqual(expected)
  })

  it.each(['0', '0.5', '10', '1234567.1234', '1.0'])('takes %s', (text) => {
    expect(decimalText.safeParse(text).success).toBe(true)
  })

  it.each(['00', '05', '007.5', '12345678', '1.', '.5', '1.00005', '-1'])('refuses %s', (text) => {
    expect(faults(decimalText, text)).toEqual(['number.format'])
  })

  it('takes no leading zero below zero either', () => {
    expect(signedDecimal.safeParse('-0.5').success).toBe(true)
    expect(faults(signedDecimal, '-05')).toEqual(['number.format'])
  })

  it('reads how long a list shall be from plain digits', () => {
    expect(pageQuerySchema.parse({}).limit).toBe(50)
    expect(pageQuerySchema.parse({ limit: '200' }).limit).toBe(200)
    for (const limit of ['0', '201', '1e2', '0x10', ' 5', '5.0', '', '1000']) expect(faults(pageQuerySchema, { limit })).toHaveLength(1)
  })
})

describe('weather', () => {
  const reading = (value: string, unit: string) => ({ value, unit, kind: 'readHere' })
  it.each([
    [{ air: reading('60', 'degC') }, []], [{ air: reading('60.1', 'degC') }, ['air value number.range']], [{ air: reading('-76', 'degF') }, []],
    [{ air: reading('140.1', 'degF') }, ['air value number.range']], [{ wind: reading('75', 'ms') }, []], [{ wind: reading('75.01', 'ms') }, ['wind value number.range']],
    [{ wind: reading('271', 'kmh') }, ['wind value number.range']], [{ wind: reading('9999999', 'knot') }, ['wind value number.range']],
    [{ humidity: reading('100.1', '%') }, ['humidity value number.percent']], [{ air: reading('warm', 'degC') }, ['air value number.format']],
  ])('%j: %j', (weather, expected) => {
    expect(faults(weatherSchema, weather)).toEqual(expected)
  })
})

describe('a label', () => {
  const facts = { id: uuidV7(), name: 'Soap', kind: 'soap', organicStatus: 'allowed' }
  it.each([
    ['volume', { maxRate: { value: '2', unit: 'flozUS/acre' }, minStrengthPct: '0.5', maxStrengthPct: '100' }, []],
    ['mass', { maxRate: { value: '2', unit: 'lb/acre' } }, []],
    ['mass', { maxRate: { value: '2', unit: 'L/ha' } }, ['label maxRate unit unit.needs_mass']],
    ['volume', { maxRate: { value: '2', unit: 'kg/ha' } }, ['label maxRate unit unit.needs_volume']],
    ['volume', { minStrengthPct: '2', maxStrengthPct: '1.9' }, ['label maxStrengthPct label.most_below_least']],
    ['volume', { maxStrengthPct: '100.1' }, ['label maxStrengthPct number.percent']],
    ['volume', { minStrengthPct: '101' }, ['label minStrengthPct number.percent']],
  ])('of something measured by %s with %j: %j', (measuredIn, label, expected) => {
    expect(faults(createMaterialSchema, { ...facts, measuredIn, label })).toEqual(expected)
  })
})
