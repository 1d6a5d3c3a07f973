import { describe, expect, it } from 'vitest'
import { presentRow } from '../../../../shared/register/presentRow.ts'
import { buildRow } from './buildRow.ts'

const place = { language: 'en', units: 'metric', zone: 'America/Los_Angeles', season: 2026 } as const

describe('presentRow', () => {
  it('shows times of the farm, figures rounded once, blocks and lots as words', () => {
    expect(presentRow(buildRow(), place)).toMatchObject({
      number: '0142',
      day: '16\u00a0Jun',
      start: '05:05',
      codes: 'T1, T2',
      preparation: 'Leaf-mould brew',
      lots: 'Brew 34',
      area: '0.14',
      volume: '346.0',
      rate: '2\u00a0470\u00a0L/ha',
      fullNumber: '2026-0142',
      lateHours: null,
    })
  })

  it('takes the civil day of the farm, not of UTC', () => {
    const row = buildRow({ startedAt: '2026-06-16T03:30:00Z' })
    expect(presentRow(row, place)).toMatchObject({ day: '15\u00a0Jun', start: '20:30' })
    expect(presentRow(row, { ...place, zone: 'Pacific/Auckland' })).toMatchObject({ day: '16\u00a0Jun', start: '15:30' })
  })

  it('prints the whole number outside its own season', () => {
    expect(presentRow(buildRow({ season: 2025, number: '2025-0007' }), place).number).toBe('2025-0007')
  })

  it('leaves what is not there empty and never shows 0 for it', () => {
    const line = presentRow(buildRow({ startedAt: null, totalL: null, sprayLPerHa: null, number: null, state: 'started' }), place)
    expect(line).toMatchObject({ number: null, day: '', start: '', volume: '', rate: '' })
  })

  it('shows what was spread solid by weight', () => {
    const line = presentRow(buildRow({ method: 'solid', totalL: null, sprayLPerHa: null, totalKg: '1250.4', kgPerHa: '625.2' }), place)
    expect(line).toMatchObject({ volume: '', mass: '1\u00a0250.4\u00a0kg', rate: '625\u00a0kg/ha' })
  })

  it('writes decimals as the language does', () => {
    const line = presentRow(buildRow({ areaHa: '1.25', totalL: '637.5', sprayLPerHa: '510' }), { ...place, language: 'es' })
    expect(line).toMatchObject({ area: '1,25', volume: '637,5', rate: '510\u00a0L/ha', day: '16\u00a0jun' })
  })

  it.each([
    ['plant', '0.2', 'en', '0.2\u00a0L/plant'], ['plant', '0.03', 'en', '30\u00a0mL/plant'], ['rowM', '0.1234', 'en', '0.123\u00a0L/row\u00a0m'], ['bed', '16', 'en', '16\u00a0L/bed'], ['pot', '0.25', 'es', '0,25\u00a0L/maceta'],
  ] as const)('reads a rate for each %s of %s L in %s as %s', (each, litres, language, words) => {
    expect(presentRow(buildRow({ sprayPerEach: { each, litres } }), { ...place, language }).rate).toBe(words)
  })
})
