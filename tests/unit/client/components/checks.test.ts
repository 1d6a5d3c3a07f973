import { describe, expect, it } from 'vitest'
import { chooseTies, type Tie } from '../../../../src/components/checks/chooseTies.ts'
import { groupChecks, worstFirst } from '../../../../src/components/checks/judgement.ts'
import type { Check } from '../../../../shared/contract/record.ts'

const check = (code: string, rests: Check['rests'], verdict: Check['verdict']): Check => ({
  code, rests, verdict, about: null, figure: null, source: null, band: null,
  title: { id: 'frame.draft', params: {} }, text: { id: 'frame.draft', params: {} },
})
const tie = (about: string, verdict: Tie['verdict'], fromY: number, toY: number): Tie => ({ about, verdict, fromX: 0, fromY, toY })

describe('groupChecks', () => {
  it('stands in the order law, label, certifier, house rule, recipe, whatever the verdicts', () => {
    const groups = groupChecks([check('a', 'recipe', 'stop'), check('b', 'law', 'pass'), check('c', 'house', 'caution'), check('d', 'label', 'unknown')])
    expect(groups.map((group) => group.rests)).toEqual(['law', 'label', 'house', 'recipe'])
  })

  it('has the worst first inside a group and keeps the order of equals', () => {
    const group = groupChecks(['pass', 'unknown', 'caution', 'stop', 'stop'].map((verdict, index) => check(`${index}`, 'label', verdict as Check['verdict'])))[0]
    expect(group?.checks.map((each) => each.code)).toEqual(['3', '4', '2', '1', '0'])
  })
})

describe('worstFirst', () => {
  it('does not reorder what it is given', () => {
    const checks = [check('a', 'law', 'pass'), check('b', 'law', 'stop')]
    expect(worstFirst(checks).map((each) => each.code)).toEqual(['b', 'a'])
    expect(checks.map((each) => each.code)).toEqual(['a', 'b'])
  })
})

describe('chooseTies', () => {
  it('drops the lesser of two that cross', () => {
    expect(chooseTies([tie('wind', 'caution', 10, 90), tie('line:0', 'stop', 50, 20)]).map((each) => each.about)).toEqual(['line:0'])
  })

  it('keeps those that run side by side', () => {
    expect(chooseTies([tie('a', 'pass', 10, 20), tie('b', 'pass', 50, 60)])).toHaveLength(2)
  })

  it('draws one a thing, its worst', () => {
    expect(chooseTies([tie('a', 'pass', 10, 20), tie('a', 'stop', 10, 40)])).toEqual([tie('a', 'stop', 10, 40)])
  })

  it('draws six at most', () => {
    expect(chooseTies(Array.from({ length: 9 }, (_, index) => tie(`${index}`, 'unknown', index * 10, index * 10)))).toHaveLength(6)
  })
})
