import { describe, expect, it } from 'vitest'
import { calibrateSprayer, type CalibrateInput } from '../../../shared/mix/calibrateSprayer.ts'

const bad: CalibrateInput[] = [
  { kind: 'flow', flowLPerMin: 0, speedKmH: 7.8, widthM: 0.5 },
  { kind: 'flow', flowLPerMin: 1.3, speedKmH: -1, widthM: 0.5 },
  { kind: 'flow', flowLPerMin: 1.3, speedKmH: 7.8, widthM: Number.NaN },
  { kind: 'catch', volumeL: Number.POSITIVE_INFINITY, areaM2: 9 },
  { kind: 'course', widthIn: 0 },
  { kind: 'speed', distanceM: 100, seconds: 0 },
]

describe('calibrateSprayer', () => {
  it.each(bad)('refuses %o', (input) => {
    expect(() => calibrateSprayer(input)).toThrow(RangeError)
  })

  it('rate by flow is rate by catch over the same ground', () => {
    // 1.3 L/min at 7.8 km/h on 0.5 m: in one minute 65 m².
    expect(calibrateSprayer({ kind: 'flow', flowLPerMin: 1.3, speedKmH: 7.8, widthM: 0.5 })).toEqual(
      calibrateSprayer({ kind: 'catch', volumeL: 1.3, areaM2: 65 }),
    )
  })
})
