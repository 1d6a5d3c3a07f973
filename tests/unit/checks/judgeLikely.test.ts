import { describe, expect, it } from 'vitest'
import { judgeLikely } from '../../../shared/checks/judgeLikely.ts'
import type { FactLine, RecordFacts } from '../../../shared/checks/recordFacts.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import { messageFor } from '../../../shared/messages/messageFor.ts'
import { LANGUAGES } from '../../../shared/messages/translate.ts'
import { buildFacts, buildSheet, buildSheetComponent } from './buildFacts.ts'

const line = (endedAt: string | null, blockId = 'b1'): FactLine => ({ blockId, startedAt: '2026-06-16T10:00:00Z', endedAt, amount: null })
const content = (over: Partial<RecordFacts['content']>): RecordFacts['content'] => ({ ...buildFacts().content, ...over })
/** 750 L; 400 L in 20 min is 20 L/min, so that it takes 37.5 min. */
const loads = { full: 1, count: 2, tankL: 400, lastL: 350, lastAreaHa: 0.35, fullMinutes: 20, lastMinutes: 17.5 }
const timed = (endedAt: string | null, over: Partial<RecordFacts['sheet']> = {}) => judgeLikely(buildFacts({ content: content({ lines: [line(endedAt)] }), sheet: buildSheet({ loads, ...over }) }))

describe('the time on a block', () => {
  it.each([
    { endedAt: '2026-06-16T10:00:00Z', id: 'none', says: '750 L went on in 0 min' },
    { endedAt: '2026-06-16T10:18:00Z', id: 'fast', says: '750 L in 18 min. At 20 L/min it takes 38 min.' },
    { endedAt: '2026-06-16T22:30:00Z', id: 'long', says: '12.5 h without a break for 750 L' },
  ])('$id is asked about, with the sum', ({ endedAt, id, says }) => {
    const [check, ...others] = timed(endedAt)
    expect(others).toEqual([])
    expect(check).toMatchObject({ code: 'house.time', verdict: 'caution', rests: 'house', about: 'line:0', text: { id: `likely.time.${id}` } })
    expect(renderMessage('en', check?.text ?? { id: '', params: {} }).replaceAll('\u00A0', ' ')).toContain(says)
  })

  it.each(['2026-06-16T10:19:00Z', '2026-06-16T22:00:00Z', null])('to %s is not', (endedAt) => {
    expect(timed(endedAt)).toEqual([])
  })

  it('is held against no flow where none is known, and by what was written of the line', () => {
    expect(timed('2026-06-16T10:01:00Z', { loads: null })).toEqual([])
    expect(timed('2026-06-16T10:18:00Z', { lines: [{ areaHa: 0.75, shareL: '750', shareKg: null, amountL: '300', amountKg: null }] })).toEqual([])
  })

  it('asks once, of the worst line, and names all that are meant', () => {
    const [one] = buildSheet().lines
    const lines = [line('2026-06-16T22:30:00Z'), line('2026-06-16T10:00:00Z', 'b2')]
    const checks = judgeLikely(buildFacts({ content: content({ lines }), sheet: buildSheet({ lines: [one, one].flatMap((each) => each ?? []) }) }))
    expect(checks.map(({ about, title, text }) => [about, title.params['code'], text.id, text.params['code']])).toEqual([['line:1', 'A2, A3', 'likely.time.none', 'A2']])
  })
})

describe('what went on the land', () => {
  it.each([['374', 1], ['674', 1], ['675', 0], ['750', 0], ['765', 0], ['766', 1], [null, 0]] as const)('%s L of 750 L asks %d questions', (appliedL, count) => {
    const checks = judgeLikely(buildFacts({ sheet: buildSheet({ appliedL }) }))
    expect(checks).toHaveLength(count)
    if (appliedL === '374') expect(checks[0]?.text).toEqual({ id: 'likely.applied.text', params: { applied: 374, total: 750, unit: 'L', rest: 376 } })
    if (appliedL === '766') expect(checks[0]?.text).toEqual({ id: 'likely.applied.over', params: { applied: 766, total: 750, unit: 'L' } })
  })
})

describe('what was taken of an ingredient', () => {
  it.each([['37.5', 1000], ['11.25', 300], ['11.2', null], ['1.25', 33.3], ['1.3', null], ['3.75', null]] as const)('%s L beside 3.75 L', (value, percent) => {
    const used = { value, unit: 'L' as const }
    const checks = judgeLikely(buildFacts({ content: content({ components: [{ materialId: 'm1', lotId: 'l1', used }] }), sheet: buildSheet({ components: [buildSheetComponent()] }) }))
    expect(checks.map(({ code, text }) => [code, text.params['percent']])).toEqual(percent === null ? [] : [['house.used', percent]])
  })
})

describe('readings of no day for work outside', () => {
  // Beaufort 9, strong gale, begins at 20.8 m/s (WMO No. 8, wind speed equivalents); 113 °F is 45 °C exactly.
  it.each([
    { wind: ['40', 'ms'], air: ['60', 'degC'], method: 'drench', codes: ['house.windRead', 'house.airRead'] },
    { wind: ['20.8', 'ms'], air: ['45', 'degC'], method: 'foliar', codes: [] },
    { wind: ['47', 'mph'], air: ['113', 'degF'], method: 'foliar', codes: ['house.windRead'] },
    { wind: ['2', 'ms'], air: ['-11', 'degC'], method: 'solid', codes: ['house.airRead'] },
  ] as const)('$wind, $air, $method', ({ wind, air, method, codes }) => {
    const weather = { wind: { value: wind[0], unit: wind[1], kind: 'readHere' as const }, air: { value: air[0], unit: air[1], kind: 'readHere' as const }, humidity: null }
    expect(judgeLikely(buildFacts({ content: content({ method, weather }) })).map(({ code }) => code)).toEqual(codes)
  })
})

it('asks in every language, the limits and worked-out figures in the reader’s measures', () => {
  const weather = { wind: null, air: { value: '60', unit: 'degC' as const, kind: 'readHere' as const }, humidity: null }
  const checks = judgeLikely(buildFacts({ content: content({ lines: [line('2026-06-16T10:18:00Z')], weather }), sheet: buildSheet({ loads, appliedL: '100' }) }))
  expect(checks.map(({ code }) => code)).toEqual(['house.time', 'house.applied', 'house.airRead'])
  for (const language of LANGUAGES) for (const { text } of checks) expect(renderMessage(language, text)).toMatch(/\?$/)
  const us = checks.map(({ text }) => renderMessage('en', messageFor(text, 'us')).replaceAll('\u00A0', ' '))
  expect(us).toEqual([
    '198 US gal in 18 min. At 5.28 US gal/min it takes 38 min. Which figure is wrong?', '26.4 of 198 US gal: 172 US gal are left over. Is an amount wrong?', '60 °C is outside 14 to 113 °F. Is the unit right?',
  ])
})
