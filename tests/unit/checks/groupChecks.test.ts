import { describe, expect, it } from 'vitest'
import { groupChecks } from '../../../shared/checks/groupChecks.ts'
import { worstFirst } from '../../../shared/checks/worstFirst.ts'
import type { Check } from '../../../shared/contract/record.ts'

const check = (code: string, rests: Check['rests'], verdict: Check['verdict']): Check => ({
  code, rests, verdict, about: null, figure: null, source: null, band: null,
  title: { id: 'frame.draft', params: {} }, text: { id: 'frame.draft', params: {} },
})

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
