import { describe, expect, it } from 'vitest'
import { judgeDeltaT } from '../../../shared/checks/judgeDeltaT.ts'
import { judgeWind } from '../../../shared/checks/judgeWind.ts'
import { recordChecks } from '../../../shared/checks/recordChecks.ts'
import { tallyChecks } from '../../../shared/checks/tallyChecks.ts'
import { checkSchema, VERDICTS } from '../../../shared/contract/record.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import { LANGUAGES } from '../../../shared/messages/translate.ts'
import { buildFacts, buildLabel, buildLot, buildMaterial, buildSheet, buildSheetComponent } from './buildFacts.ts'

const full = buildLabel({ maxRate: { value: '4', unit: 'L/ha' }, minStrengthPct: '0.2', maxStrengthPct: '2', reEntryHours: '12', preHarvestDays: 3 })
const ofCode = (facts: Parameters<typeof recordChecks>[0], code: string) => recordChecks(facts).filter((check) => check.code === code)

describe('wind', () => {
  const wind = (value: string, unit: 'ms' | 'mph' | 'kmh' | 'knot', method: 'foliar' | 'drench' = 'foliar') =>
    judgeWind({ ...buildFacts().content, method, weather: { wind: { value, unit, kind: 'readHere' }, air: null, humidity: null } })

  // 3 mph is 1.34112 m/s and 8 mph 3.57632 m/s exactly (mile 1609.344 m).
  it.each([
    { value: '1.2', unit: 'ms', verdict: 'caution', id: 'under' },
    { value: '1.3', unit: 'ms', verdict: 'pass', id: 'within' },
    { value: '3.6', unit: 'ms', verdict: 'pass', id: 'within' },
    { value: '3.7', unit: 'ms', verdict: 'caution', id: 'over' },
    { value: '3', unit: 'mph', verdict: 'pass', id: 'within' },
    { value: '8', unit: 'mph', verdict: 'pass', id: 'within' },
    { value: '9', unit: 'mph', verdict: 'caution', id: 'over' },
    { value: '0', unit: 'kmh', verdict: 'caution', id: 'under' },
    { value: '8', unit: 'knot', verdict: 'caution', id: 'over' },
  ] as const)('$value $unit is $verdict', ({ value, unit, verdict, id }) => {
    expect(wind(value, unit)).toMatchObject({ code: 'house.wind', rests: 'house', verdict, about: 'wind', text: { id: `checks.wind.${id}` } })
  })

  it('not read is not known', () => {
    expect(judgeWind({ ...buildFacts().content, weather: null })?.verdict).toBe('unknown')
    expect(judgeWind({ ...buildFacts().content, weather: { wind: null, air: null, humidity: null } })).toMatchObject({ verdict: 'unknown', text: { id: 'checks.wind.notRead' } })
  })

  it('does not judge a drench', () => {
    expect(wind('9', 'ms', 'drench')).toBeNull()
  })
})

describe('delta T', () => {
  const air = (value: string, unit: 'degC' | 'degF', humidity: string, method: 'foliar' | 'drench' | 'injected' = 'foliar') =>
    judgeDeltaT({ ...buildFacts().content, method, weather: { wind: null, air: { value, unit, kind: 'readHere' }, humidity: { value: humidity, unit: '%', kind: 'readHere' } } })

  // Wet bulbs by Stull 2011: 20 °C and 50 % give 13.699 °C (NCAR, wetbulb_stull, example 1); the advised band is 2 to 8 °C (T. Wolf; GRDC).
  it.each([
    { value: '20', unit: 'degC', humidity: '50', verdict: 'pass', id: 'within', figure: 6.3 },
    { value: '68', unit: 'degF', humidity: '50', verdict: 'pass', id: 'within', figure: 6.3 },
    { value: '25', unit: 'degC', humidity: '40', verdict: 'caution', id: 'over', figure: 8.6 },
    { value: '10', unit: 'degC', humidity: '90', verdict: 'caution', id: 'under', figure: 1.1 },
  ] as const)('$value $unit at $humidity % is $verdict', ({ value, unit, humidity, verdict, id, figure }) => {
    expect(air(value, unit, humidity)).toMatchObject({ code: 'house.deltaT', rests: 'house', verdict, about: 'air', text: { id: `checks.deltaT.${id}` }, figure: { params: { value: figure } } })
  })

  it('of air or humidity that was not read, or out of the formula’s range, is not known', () => {
    expect(judgeDeltaT({ ...buildFacts().content, weather: null })?.verdict).toBe('unknown')
    expect(air('20', 'degC', '100')?.verdict).toBe('unknown')
  })

  it.each(['drench', 'injected'] as const)('does not judge: %s', (method) => {
    expect(air('30', 'degC', '20', method)).toBeNull()
  })
})

describe('counts that a mix is measured by', () => {
  it('are not known on each line that lacks them', () => {
    const facts = buildFacts({ sheet: buildSheet({ findings: [{ code: 'sheet.count_needed', params: { each: 'plant' }, path: 'lines.0.counts' }] }) })
    expect(ofCode(facts, 'mix.counts')).toEqual([expect.objectContaining({ verdict: 'unknown', about: 'line:0', title: { id: 'checks.counts.title', params: { code: 'A3' } } })])
    expect(ofCode(buildFacts(), 'mix.counts')).toEqual([])
  })
})

describe('all checks of a record', () => {
  it('always says that no law was looked at', () => {
    expect(ofCode(buildFacts(), 'law.rules')).toEqual([expect.objectContaining({ verdict: 'unknown', rests: 'law' })])
  })

  it('stand by what they rest on, worst first', () => {
    const checks = recordChecks(buildFacts({ materials: [buildMaterial({ label: full })] }))
    expect(checks.map((check) => `${check.rests} ${check.verdict} ${check.code}`)).toEqual([
      'law unknown law.rules',
      'label stop label.rate',
      'label caution label.reEntry',
      'label caution label.preHarvest',
      'label pass label.strength',
      'certifier pass certifier.status',
      'house pass house.wind',
      'house pass house.deltaT',
      'house pass lot.left',
    ])
    expect(tallyChecks(checks)).toEqual({ stop: 1, caution: 2, unknown: 1 })
  })

  it('count one lot once, however often it is named', () => {
    const facts = buildFacts({
      content: { ...buildFacts().content, components: [{ materialId: 'm1', lotId: 'l1' }, { materialId: 'm1', lotId: 'l1' }] },
      sheet: buildSheet({ components: [buildSheetComponent(), buildSheetComponent({ amount: { value: '9', unit: 'L' } })] }),
    })
    expect(ofCode(facts, 'lot.left')).toEqual([expect.objectContaining({ verdict: 'stop', about: 'component:0' })])
  })

  it('say that a component without a lot cannot be traced', () => {
    const facts = buildFacts({ content: { ...buildFacts().content, components: [{ materialId: 'm1', lotId: null }] } })
    expect(ofCode(facts, 'lot.none')).toEqual([expect.objectContaining({ verdict: 'unknown', about: 'component:0' })])
    expect(ofCode(facts, 'lot.left')).toEqual([])
  })

  it('hold for a half-written draft', () => {
    const empty = buildFacts({
      content: { method: 'drench', lines: [], components: [{ materialId: '', lotId: null }], weather: null },
      sheet: buildSheet({ totalL: null, components: [buildSheetComponent({ amount: null, inL: null, perHa: null })] }),
    })
    expect(recordChecks(empty).map((check) => check.code)).toEqual(['law.rules'])
  })

  it('are the same for the same facts, and fit the contract', () => {
    const facts = buildFacts({ materials: [buildMaterial({ label: full })], lots: [buildLot({ expiresOn: '2026-06-01' })] })
    const checks = recordChecks(facts)
    expect(recordChecks(structuredClone(facts))).toEqual(checks)
    for (const check of checks) expect(checkSchema.parse(check)).toEqual(check)
  })

  it('have words in every language, none of them a comfort', () => {
    const variants = [
      buildFacts({ materials: [buildMaterial({ label: full })], lots: [buildLot({ expiresOn: '2026-06-01' })] }),
      buildFacts({ materials: [buildMaterial({ label: full, organicStatus: 'prohibited', statusBasis: null })], lots: [buildLot({ left: { value: '1', unit: 'L' } })] }),
      buildFacts({ content: { ...buildFacts().content, weather: null, components: [{ materialId: 'm1', lotId: null }] } }),
    ]
    const said = variants.flatMap((facts) => recordChecks(facts)).flatMap((check) => [check.title, check.text, check.figure, check.source])
    for (const language of LANGUAGES) {
      for (const message of said) {
        if (message === null) continue
        expect(renderMessage(language, message)).not.toMatch(/\{|\bsafe\b|compliant|\bsegur|conforme/i)
      }
    }
    expect(VERDICTS[0]).toBe('stop')
  })
})
