import { describe, expect, it } from 'vitest'
import { judgeLotLeft } from '../../../shared/checks/judgeLotLeft.ts'
import { dayOfUse } from '../../../shared/checks/dayOfUse.ts'
import { judgeLotThere } from '../../../shared/checks/judgeLotThere.ts'
import { judgeLotUse } from '../../../shared/checks/judgeLotUse.ts'
import { judgeStatus } from '../../../shared/checks/judgeStatus.ts'
import { buildFacts, buildLabel, buildLot, buildMaterial, buildSheetComponent } from './buildFacts.ts'

describe('organic status', () => {
  it.each([
    { organicStatus: 'prohibited', statusBasis: 'letter of 3 May', verdict: 'stop', id: 'prohibited' },
    { organicStatus: 'prohibited', statusBasis: null, verdict: 'stop', id: 'prohibitedBare' },
    { organicStatus: 'restricted', statusBasis: 'only on fruit', verdict: 'caution', id: 'restricted' },
    { organicStatus: 'restricted', statusBasis: null, verdict: 'caution', id: 'restrictedBare' },
    { organicStatus: 'allowed', statusBasis: 'plan, line 14', verdict: 'pass', id: 'allowed' },
    { organicStatus: 'allowed', statusBasis: null, verdict: 'unknown', id: 'allowedBare' },
    { organicStatus: 'unknown', statusBasis: 'a neighbour said so', verdict: 'unknown', id: 'unknown' },
  ] as const)('$organicStatus on "$statusBasis" is $verdict', ({ verdict, id, ...material }) => {
    expect(judgeStatus(buildMaterial(material), 'component:2')).toMatchObject({
      code: 'certifier.status', rests: 'certifier', verdict, about: 'component:2', text: { id: `checks.status.${id}` },
    })
  })
})

describe('use by', () => {
  const labelled = buildMaterial({ label: buildLabel() })

  it.each([
    { name: 'the day itself is in time', expiresOn: '2026-06-16', origin: 'bought', material: labelled, verdict: 'pass', rests: 'label' },
    { name: 'a bought, labelled lot past it is a stop', expiresOn: '2026-06-15', origin: 'bought', material: labelled, verdict: 'stop', rests: 'label' },
    { name: 'a bought lot without a label is a caution', expiresOn: '2026-06-15', origin: 'bought', material: buildMaterial(), verdict: 'caution', rests: 'house' },
    { name: 'a made lot is a caution', expiresOn: '2026-06-15', origin: 'made', material: labelled, verdict: 'caution', rests: 'house' },
  ] as const)('$name', ({ expiresOn, origin, material, verdict, rests }) => {
    expect(judgeLotUse(dayOfUse(buildFacts()), buildLot({ expiresOn, origin }), material, 'component:0')).toMatchObject({ code: 'lot.pastUse', verdict, rests })
  })

  it('goes by the first start written, in the farm’s zone, not by the day it is entered', () => {
    const startedAt = ['2026-06-17T05:00:00Z', '2026-06-17T03:30:00Z', null]
    const facts = buildFacts({ content: { ...buildFacts().content, lines: startedAt.map((start) => ({ blockId: 'b1', startedAt: start, endedAt: null, amount: null })) }, now: '2026-07-01T12:00:00Z' })
    expect(judgeLotUse(dayOfUse(facts), buildLot({ expiresOn: '2026-06-16' }), labelled, 'component:0')?.verdict).toBe('pass')
  })

  it('says nothing without a date', () => {
    expect(judgeLotUse(dayOfUse(buildFacts()), buildLot(), labelled, 'component:0')).toBeNull()
  })
})

describe('a lot that was not there yet', () => {
  const startedAt = '2026-06-17T03:30:00Z' // 16 June on the farm
  const facts = buildFacts({ content: { ...buildFacts().content, lines: [{ blockId: 'b1', startedAt, endedAt: null, amount: null }] } })

  it('is a caution with both days', () => {
    expect(judgeLotThere(dayOfUse(facts), buildLot({ receivedOn: '2026-06-17' }), buildMaterial(), 'component:0')).toMatchObject({
      code: 'lot.notThere', verdict: 'caution', rests: 'house', text: { params: { usedOn: '2026-06-16', receivedOn: '2026-06-17' } },
    })
  })

  it.each(['2026-06-16', '2025-01-01'])('is none where it came on %s', (receivedOn) => {
    expect(judgeLotThere(dayOfUse(facts), buildLot({ receivedOn }), buildMaterial(), 'component:0')).toBeNull()
  })
})

describe('what a lot holds', () => {
  const left = (value: string, amounts: ({ value: string; unit: 'L' | 'mL' | 'kg' | 'galUS' } | null)[]) =>
    judgeLotLeft(buildLot({ left: { value, unit: 'L' } }), amounts.map((amount) => buildSheetComponent({ amount })), 'component:0')

  it('says what it takes and what it leaves', () => {
    expect(left('11.4', [{ value: '3.75', unit: 'L' }])).toMatchObject({
      verdict: 'pass', text: { id: 'checks.lotLeft.enough', params: { taken: 3.75, left: 11.4, rest: 7.65, unit: 'L' } }, figure: { params: { value: 3.75 } },
    })
  })

  it('lets it be emptied exactly', () => {
    expect(left('11.4', [{ value: '11400', unit: 'mL' }])).toMatchObject({ verdict: 'pass', text: { params: { rest: 0 } } })
  })

  it.each([['37.5', '0.81234567'], ['80.952380952381', '19.047619'], ['1234.5678', '0.0049999'], ['0.5', '3.14159265']])('gives figures of %s and %s that add up as they are read', (held, takes) => {
    const { text } = left(held, [{ value: takes, unit: 'L' }])
    const { left: has, taken, rest, short } = text.params as Record<string, number>
    expect(Number(((has ?? 0) - (taken ?? 0)).toFixed(9))).toBe(rest ?? -(short ?? 0))
  })

  it('stops when short, all components together, and says by how much', () => {
    expect(left('5', [{ value: '3', unit: 'L' }, { value: '2500', unit: 'mL' }])).toMatchObject({
      verdict: 'stop', rests: 'house', text: { id: 'checks.lotLeft.short', params: { taken: 5.5, left: 5, short: 0.5 } },
    })
  })

  it.each([{ amount: null, id: 'noAmount' }, { amount: { value: '1', unit: 'kg' }, id: 'otherMeasure' }] as const)('does not know with $amount', ({ amount, id }) => {
    expect(left('5', [amount])).toMatchObject({ verdict: 'unknown', figure: null, text: { id: `checks.lotLeft.${id}` } })
  })
})
