import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { recordChecks } from '../../../shared/checks/recordChecks.ts'
import { unevenShare } from '../../../shared/checks/unevenShare.ts'
import { judgeLabelRate } from '../../../shared/checks/judgeLabelRate.ts'
import { judgeLabelStrength } from '../../../shared/checks/judgeLabelStrength.ts'
import { convertQuantity } from '../../../shared/units/convertQuantity.ts'
import { VOLUME_RATE_UNITS } from '../../../shared/contract/quantity.ts'
import { buildFacts, buildLabel, buildMaterial, buildSheet, buildSheetComponent } from './buildFacts.ts'

const rate = (value: string, unit: 'L/ha' | 'kg/ha' | 'flozUS/acre', perHa: string | null, share = '1', inKg: string | null = null) =>
  judgeLabelRate(
    buildMaterial({ label: buildLabel({ maxRate: { value, unit } }) }),
    buildSheetComponent({ perHa, inKg, inL: inKg === null ? '3.75' : null, ...(perHa === null && { amount: null }) }),
    { share, code: null }, 'component:0',
  )

describe('the most a label allows on a hectare', () => {
  it.each([
    { limit: '5', perHa: '5', verdict: 'pass' },
    { limit: '5', perHa: '4.9', verdict: 'pass' },
    { limit: '5', perHa: '5.001', verdict: 'stop' },
    { limit: '5', perHa: '12', verdict: 'stop' },
  ])('$perHa L/ha against $limit is $verdict', ({ limit, perHa, verdict }) => {
    expect(rate(limit, 'L/ha', perHa)).toMatchObject({ code: 'label.rate', rests: 'label', verdict, about: 'component:0' })
  })

  it('is judged in the label’s own unit', () => {
    // 1 US fluid ounce an acre is 0.0730778 L/ha (231 in³ gallon, international acre): 100 of them are 7.30778 L/ha.
    expect(rate('100', 'flozUS/acre', '7.2')).toMatchObject({ verdict: 'pass', figure: { params: { value: 98.53, unit: 'flozUS/acre' } } })
    expect(rate('100', 'flozUS/acre', '7.31')).toMatchObject({ verdict: 'stop', text: { params: { limit: 100, unit: 'flozUS/acre' } } })
  })

  it('weighs what is weighed and does not guess between weight and volume', () => {
    expect(rate('3', 'kg/ha', '3.5', '1', '3.5')?.verdict).toBe('stop')
    expect(rate('3', 'kg/ha', '3.5')).toMatchObject({ verdict: 'unknown', figure: null, text: { id: 'checks.labelRate.otherMeasure' } })
  })

  it('says not known without a rate, and nothing where the label is silent', () => {
    expect(rate('5', 'L/ha', null)).toMatchObject({ verdict: 'unknown', text: { id: 'checks.labelRate.noAmount' } })
    expect(judgeLabelRate(buildMaterial({ label: buildLabel() }), buildSheetComponent(), { share: '1', code: null }, 'component:0')).toBeNull()
    expect(judgeLabelRate(buildMaterial(), buildSheetComponent(), { share: '1', code: null }, 'component:0')).toBeNull()
  })

  it('names the label and its part as the source', () => {
    expect(rate('5', 'L/ha', '6')?.source).toEqual({ id: 'checks.source.labelPart', params: { material: 'Potash soap', part: 'part 3' } })
  })

  it('counts what was put on, once that is written', () => {
    expect(rate('5', 'L/ha', '6', '0.5')).toMatchObject({ verdict: 'pass', figure: { params: { value: 3 } } })
  })

  it('never stops a rate typed at the limit, whatever the unit', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 9_999_999 }), fc.constantFrom(...VOLUME_RATE_UNITS), (tenThousandths, unit) => {
        const value = `${Math.trunc(tenThousandths / 10_000)}.${String(tenThousandths % 10_000).padStart(4, '0')}`
        const perHa = convertQuantity({ value, unit }, 'L/ha')
        const check = judgeLabelRate(buildMaterial({ label: buildLabel({ maxRate: { value, unit } }) }), buildSheetComponent({ perHa }), { share: '1', code: null }, 'x')
        expect(check?.verdict).toBe('pass')
      }),
    )
  })
})

describe('strength in the finished spray', () => {
  const strength = (low: string | null, high: string | null, inL: string | null, totalL: number | null = 750) =>
    judgeLabelStrength(
      buildMaterial({ label: buildLabel({ minStrengthPct: low, maxStrengthPct: high }) }),
      buildSheetComponent({ inL, inKg: inL === null ? '2' : null }), buildSheet({ totalL }), 'component:0',
    )

  it.each([
    { low: '0.5', high: '2', inL: '3.75', verdict: 'pass', id: 'withinRange', value: 0.5 },
    { low: '0.5', high: '2', inL: '15', verdict: 'pass', id: 'withinRange', value: 2 },
    { low: '0.5', high: '2', inL: '15.1', verdict: 'stop', id: 'overRange', value: 2.013 },
    { low: '0.5', high: '2', inL: '3', verdict: 'caution', id: 'underRange', value: 0.4 },
    { low: null, high: '2', inL: '16', verdict: 'stop', id: 'overMost', value: 2.133 },
    { low: '1', high: null, inL: '3', verdict: 'caution', id: 'underLeast', value: 0.4 },
    { low: '0.1', high: null, inL: '3', verdict: 'pass', id: 'withinLeast', value: 0.4 },
  ])('$inL L in 750 L against $low to $high is $verdict', ({ low, high, inL, verdict, id, value }) => {
    expect(strength(low, high, inL)).toMatchObject({
      verdict, text: { id: `checks.labelStrength.${id}` }, figure: { id: 'checks.figure.percent', params: { value } },
    })
  })

  it('shows more digits rather than "2 is over 2"', () => {
    expect(strength(null, '2', '15.000075')).toMatchObject({ verdict: 'stop', figure: { params: { value: 2.00001 } } })
  })

  it('is not known for a weighed material or an empty mix', () => {
    expect(strength('1', '2', null)).toMatchObject({ verdict: 'unknown', text: { id: 'checks.labelStrength.weighed' } })
    expect(strength('1', '2', '3', null)).toMatchObject({ verdict: 'unknown', text: { id: 'checks.labelStrength.noAmount' } })
    expect(strength('1', '2', '3', 0)?.verdict).toBe('unknown')
    expect(strength(null, null, '3')).toBeNull()
  })
})

describe('the line that got most', () => {
  const most = (lines: { blockId?: string; shareL: string; amountL: string | null; known?: 'measured' | 'counted' | 'workedOut' }[], isUsedKnown = false) => unevenShare({
    content: {
      ...buildFacts().content,
      lines: lines.map(({ blockId = 'b1', amountL, known = 'measured' }) => ({ blockId, startedAt: null, endedAt: null, amount: amountL === null ? null : { known } })),
    },
    sheet: buildSheet({ lines: lines.map(({ shareL, amountL }) => ({ areaHa: 1, shareL, shareKg: null, amountL, amountKg: null })) }),
  }, isUsedKnown)

  it('is judged alone where one line got more for its share than another', () => {
    expect(most([{ shareL: '375', amountL: '705' }, { blockId: 'b2', shareL: '375', amountL: '12.5' }])).toEqual({ share: '1.88', blockId: 'b1' })
  })

  it('names no block where all got alike, or where there is one', () => {
    expect(most([{ shareL: '750', amountL: '375' }])).toEqual({ share: '0.5', blockId: null })
    expect(most([{ shareL: '500', amountL: '250' }, { blockId: 'b2', shareL: '250', amountL: '125' }])).toEqual({ share: '0.5', blockId: null })
  })

  it('counts a line without an amount, and a figure of our own, as its share', () => {
    expect(most([{ shareL: '400', amountL: '300' }, { blockId: 'b2', shareL: '350', amountL: null }])).toEqual({ share: '1', blockId: 'b2' })
    expect(most([{ shareL: '750', amountL: '750.04', known: 'workedOut' }]).share).toBe('1')
    expect(most([{ shareL: '750', amountL: '375', known: 'counted' }]).share).toBe('0.5')
  })

  it('looks only at how it was spread once it is known what went into the tank', () => {
    expect(most([{ shareL: '750', amountL: '375' }], true).share).toBe('1')
    expect(most([{ shareL: '100', amountL: '150' }, { blockId: 'b2', shareL: '100', amountL: '50' }], true)).toEqual({ share: '1.5', blockId: 'b1' })
  })

  it('is whole while nothing has a share', () => {
    expect(most([])).toEqual({ share: '1', blockId: null })
  })
})

describe('what was really used', () => {
  it('is judged instead of what was planned, on the line that got most', () => {
    const material = buildMaterial({ label: buildLabel({ maxRate: { value: '6', unit: 'L/ha' }, maxStrengthPct: '2' }) })
    const content = { ...buildFacts().content, components: [{ materialId: 'm1', lotId: 'l1', used: { value: '7500', unit: 'mL' as const } }] }
    const found = recordChecks(buildFacts({ content, materials: [material] }))
    expect(found.find(({ code }) => code === 'label.rate')).toMatchObject({ verdict: 'stop', text: { id: 'checks.labelRate.over', params: { value: 10 } } })
    expect(found.find(({ code }) => code === 'label.strength')).toMatchObject({ verdict: 'pass', text: { params: { value: 1 } } })
  })
})
