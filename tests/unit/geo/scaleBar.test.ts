import { describe, expect, it } from 'vitest'
import { scaleBar } from '../../../shared/geo/scaleBar.ts'

describe('the scale bar', () => {
  it.each([
    { roomM: 120, units: 'metric', value: 100, unit: 'm', metres: 100 }, { roomM: 2_500, units: 'metric', value: 2, unit: 'km', metres: 2_000 },
    // The international foot is 0.3048 m, the mile 1609.344 m (NIST SP 811 B.8).
    { roomM: 120, units: 'us', value: 200, unit: 'ft', metres: 60.96 }, { roomM: 2_500, units: 'us', value: 1, unit: 'mi', metres: 1_609.344 },
    { roomM: 1_600, units: 'us', value: 5_000, unit: 'ft', metres: 1_524 },
  ] as const)('in $roomM m is $value $unit', ({ roomM, units, ...bar }) => { expect(scaleBar(roomM, units)).toEqual(bar) })

  it('needs room', () => { expect(() => scaleBar(0, 'us')).toThrow(RangeError) })
})
