import { describe, expect, it } from 'vitest'
import { checkFor } from '../../../shared/checks/checkFor.ts'
import { judgeDeltaT } from '../../../shared/checks/judgeDeltaT.ts'
import { judgeWind } from '../../../shared/checks/judgeWind.ts'
import { messageFor } from '../../../shared/messages/messageFor.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import type { Check } from '../../../shared/contract/record.ts'

const foliar = { method: 'foliar', lines: [], components: [] } as const
const noWind = { wind: null, windFrom: null, air: null, humidity: null }
const said = (check: Check | null): string[] => (check === null ? [] : [check.text, check.figure].flatMap((message) => (message === null ? [] : [renderMessage('en', message).replaceAll('\u00a0', ' ')])))
const windOf = (value: string): Check | null => judgeWind({ ...foliar, weather: { ...noWind, wind: { value, unit: 'mph', kind: 'readHere' } } })
const inUs = (check: Check | null): Check | null => check && checkFor(check, 'us')

describe('a check in a reader’s measures', () => {
  it('says the wind in miles an hour, the figure and the band too', () => {
    expect(said(inUs(windOf('5')))).toEqual(['2.91 to 8.05 mph (3 to 8 mph).', '5 mph'])
    expect(inUs(windOf('12'))).toMatchObject({ verdict: 'caution', band: { low: 2.91, high: 8.05, value: 12, unit: 'mph' } })
  })

  it('never rounds a figure onto the limit it is over', () => {
    const over = inUs(windOf('8.054'))
    expect(over).toMatchObject({ verdict: 'caution', band: { high: 8.05, value: 8.054 } })
  })

  it('turns how far two temperatures are apart, not a temperature: 5 °C apart is 9 °F apart', () => {
    const air = { value: '25', unit: 'degC', kind: 'readHere' } as const
    const check = judgeDeltaT({ ...foliar, weather: { ...noWind, air, humidity: { value: '60', unit: '%', kind: 'readHere' } } })
    expect(inUs(check)?.band).toMatchObject({ low: 3.6, high: 14.4, unit: 'diffF' })
    expect(Number(inUs(check)?.band?.value)).toBeCloseTo(Number(check?.band?.value) * 1.8, 1)
    expect(said(inUs(check))[0]).toMatch(/^3\.6 to 14\.4 °F/)
  })

  it('leaves metric, other checks and what was typed as they are', () => {
    const check = windOf('5') as Check
    expect(checkFor(check, 'metric').text).toEqual(check.text)
    const typed = { id: 'versions.amount', params: { value: 5, unit: 'L' } }
    expect(messageFor(typed, 'us')).toBe(typed)
    expect(messageFor({ id: 'versions.figure.workedOut', params: { value: 100, unit: 'L' } }, 'us')).toEqual({ id: 'versions.figure.workedOut', params: { value: 26.4172, unit: 'galUS' } })
  })

  it('names the unit of a strength in the words, whoever reads', () => {
    const text = { id: 'checks.labelStrength.withinMost', params: { material: 'Soap', part: 4, total: 200, high: 3 } }
    expect(renderMessage('en', text).replaceAll('\u00a0', ' ')).toBe('Soap: 4 L in 200 L. Label: at most 3 %.')
    expect(renderMessage('en', messageFor(text, 'us')).replaceAll('\u00a0', ' ')).toBe('Soap: 1.06 US gal in 52.8 US gal. Label: at most 3 %.')
  })
})
