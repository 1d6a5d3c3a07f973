import { ExactDecimal } from '../units/exactDecimal.ts'
import { M2_PER_HA } from '../units/hectare.ts'

export type CalibrateInput =
  /** Flow of one nozzle with its spacing, or of the whole boom with its swath. */
  | { kind: 'flow'; flowLPerMin: number; speedKmH: number; widthM: number }
  /** What was caught while a plot was covered. */
  | { kind: 'catch'; volumeL: number; areaM2: number }
  /** Length of a 1/128 acre course, on which US fluid ounces caught are US gallons an acre. */
  | { kind: 'course'; widthIn: number }
  | { kind: 'speed'; distanceM: number; seconds: number }

export type Calibration = { rateLPerHa: number } | { courseFt: number } | { kmH: number }

/**
 * One measured figure of a sprayer, unrounded.
 * @throws {RangeError} if a value is not a finite number above 0.
 * @source F1.1 L/ha = 600·q/(v·w); F1.12 L/ha = 10 000·L/m²; F1.5 ft = 340.3125·12/in, as 43 560/128 ft² are 1/128 acre;
 * F1.7 km/h = 3.6·m/s (tests/reference/mix names the publications).
 * @example calibrateSprayer({ kind: 'flow', flowLPerMin: 1.3, speedKmH: 7.8, widthM: 0.5 }) // { rateLPerHa: 200 }
 */
export function calibrateSprayer(input: CalibrateInput): Calibration {
  switch (input.kind) {
    case 'flow': {
      const swept = readPositive('speedKmH', input.speedKmH).times(readPositive('widthM', input.widthM))
      return { rateLPerHa: readPositive('flowLPerMin', input.flowLPerMin).times(600).div(swept).toNumber() }
    }
    case 'catch':
      return {
        rateLPerHa: readPositive('volumeL', input.volumeL).times(M2_PER_HA).div(readPositive('areaM2', input.areaM2)).toNumber(),
      }
    case 'course':
      return { courseFt: new ExactDecimal('340.3125').times(12).div(readPositive('widthIn', input.widthIn)).toNumber() }
    case 'speed':
      return { kmH: readPositive('distanceM', input.distanceM).times('3.6').div(readPositive('seconds', input.seconds)).toNumber() }
  }
}

function readPositive(name: string, value: number): ExactDecimal {
  if (!Number.isFinite(value) || value <= 0) throw new RangeError(`${name} must be above 0, is ${value}`)
  return new ExactDecimal(value)
}
