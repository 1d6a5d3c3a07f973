import { describe, expect, it } from 'vitest'
import { workingLines } from '../../../shared/checks/workingLines.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import { recordSheet } from '../../../shared/mix/recordSheet.ts'
import type { UnitSystem } from '../../../shared/units/readingUnit.ts'
import type { SheetInput } from '../../../shared/mix/sheetTypes.ts'

const spoken = (input: Partial<SheetInput>, sizedFrom: 'water' | 'sprayRate' = 'water', units: UnitSystem = 'metric'): string[] => {
  const sheet = recordSheet({
    lines: [{ areaM2: 19_700 }], tankL: '400', components: [], ...input,
    water: input.water ?? { sizedFrom, value: sizedFrom === 'water' ? '750' : '400', unit: sizedFrom === 'water' ? 'L' : 'L/ha' },
  })
  return workingLines(sheet, { names: ['Nettle ferment', 'Potash soap'], sizedFrom, units }).map((line) => renderMessage('en', line).replaceAll('\u00A0', ' '))
}

describe('how a sheet was worked out', () => {
  it('says each sum, in the order they follow from each other', () => {
    expect(spoken({ components: [{ basis: { kind: 'ratio', parts: '20' } }, { basis: { kind: 'perTank', value: '1.9', unit: 'L' } }] })).toEqual([
      'Nettle ferment: 750 L ÷ 20 = 37.5 L',
      // (750 + 37.5) ÷ (1 − 1.9 ÷ 400) is 791.258 L, so 1.97815 tanks.
      'Potash soap: 1.9 L × 1.9781 tanks = 3.7585 L',
      'Mix: 750 L + 41.2585 L = 791.258 L',
      'On 1 ha: 791.258 L ÷ 1.97 ha = 401.654 L/ha',
      'Loads: 791.258 L ÷ 400 L = 1 full, 391.258 L left',
    ])
  })

  it('begins with the rate where the water is sized from it', () => {
    expect(spoken({ components: [{ basis: { kind: 'perArea', value: '2', unit: 'L/ha' } }] }, 'sprayRate')).toEqual([
      'Mix: 400 L/ha × 1.97 ha = 788 L',
      'Carrier water: 788 L − 3.94 L = 784.06 L',
      'Nettle ferment: 2 L/ha × 1.97 ha = 3.94 L',
      'Loads: 788 L ÷ 400 L = 1 full, 388 L left',
    ])
  })

  it('says the same sums in US customary measures, each of which adds up as printed', () => {
    expect(spoken({ components: [{ basis: { kind: 'perArea', value: '2', unit: 'L/ha' } }] }, 'sprayRate', 'us')).toEqual([
      // 400 L/ha ÷ 9.353956 = 42.7627 US gal/acre; 1.97 ha = 4.86798 acre; 788 L = 208.168 US gal (NIST SP 811 B.8).
      'Mix: 42.7627 US gal/acre × 4.868 acre = 208.168 US gal',
      'Carrier water: 208.168 US gal − 1.0408 US gal = 207.127 US gal',
      'Nettle ferment: 0.2138 US gal/acre × 4.868 acre = 1.0408 US gal',
      'Loads: 208.168 US gal ÷ 105.669 US gal = 1 full, 102.499 US gal left',
    ])
  })

  it('says nothing of what is not known', () => {
    expect(spoken({ lines: [], components: [{ basis: { kind: 'ratio', parts: '' } }] })).toEqual([])
  })
})
