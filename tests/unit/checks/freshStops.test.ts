import { describe, expect, it } from 'vitest'
import { buildCheck, words } from '../../../shared/checks/buildCheck.ts'
import { freshStops } from '../../../shared/checks/freshStops.ts'
import type { Check, Verdict } from '../../../shared/contract/record.ts'

const stop = (basis: string, about = 'component:0', verdict: Verdict = 'stop'): Check => buildCheck({
  code: 'certifier.status', verdict, rests: 'certifier', about, title: words('checks.status.title', { material: 'Copper wash' }), text: words('checks.status.prohibited', { basis }),
})

describe('stops that an amendment brings', () => {
  it('are those that did not stand word for word about the same thing', () => {
    const [stood, other, elsewhere] = [stop('Letter of 3 May'), stop('Letter of 9 June'), stop('Letter of 3 May', 'component:1')]
    expect(freshStops([stood, other, elsewhere], [stood])).toEqual([other, elsewhere])
  })

  it('count one that was only a caution before, and no caution of now', () => {
    expect(freshStops([stop('x')], [stop('x', 'component:0', 'caution')])).toHaveLength(1)
    expect(freshStops([stop('x', 'component:0', 'caution')], [])).toEqual([])
  })

  it('know a stop again whose params were stored in another order', () => {
    const check = { ...stop('x'), text: words('checks.lotLeft.short', { left: 1, short: 2 }) }
    expect(freshStops([check], [{ ...check, text: words('checks.lotLeft.short', { short: 2, left: 1 }) }])).toEqual([])
  })
})
