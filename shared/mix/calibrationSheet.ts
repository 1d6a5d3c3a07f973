import type { Fitting, Measured } from '../contract/calibration.ts'
import { ExactDecimal, writeDecimal } from '../units/exactDecimal.ts'
import { convertQuantity } from '../units/convertQuantity.ts'
import { calibrateSprayer } from './calibrateSprayer.ts'
import { flowAtPressure } from './flowAtPressure.ts'
import { NOMINAL_BAR, NOZZLES } from './nozzleSizes.ts'
import { M2_PER_HA } from '../units/hectare.ts'

/** A tip is worn when its flow is off by this much, percent. @source F1.13, Florida Pest Control Examinations p. 213 (common practice; others use 5). */
export const WORN_PERCENT = 10

export interface CaughtNozzle {
  flowLPerMin: string
  /** Off the mean of all that were caught, percent. */
  offMeanPercent: string
  /** Off its nominal flow at the pressure fitted, percent; null where either is not known. */
  offNominalPercent: string | null
  /** More than it should be by 10 % or more, or off the mean by 10 % or more. */
  isWorn: boolean
}

export interface CalibrationSheet {
  /** Unrounded decimal text, as all here. */
  rateLPerHa: string
  galUSPerAcre: string
  /** Flow of the whole sprayer, litres a minute; null where it was not measured. */
  flowLPerMin: string | null
  /** The mean of one nozzle, litres a minute. */
  meanLPerMin: string | null
  /** Length of the course, feet, for a 1/128 acre. */
  courseFt: string | null
  nozzles: CaughtNozzle[]
}

/**
 * Every figure of a calibration from what was measured.
 * @throws {RangeError} if a value is not above 0.
 * @source F1.1, F1.4, F1.5, F1.12, F1.13 (tests/reference/mix names the publications).
 */
export function calibrationSheet(measured: Measured, fitting: Pick<Fitting, 'nozzle' | 'pressureBar'> | null = null): CalibrationSheet {
  const blank = { flowLPerMin: null, meanLPerMin: null, courseFt: null, nozzles: [] }
  switch (measured.kind) {
    case 'flow':
      return { ...blank, ...rateOf(measured.flowLPerMin, measured), flowLPerMin: measured.flowLPerMin }
    case 'plot':
      return { ...blank, ...inBothUnits(new ExactDecimal(positive(measured.volumeL)).times(M2_PER_HA).div(positive(measured.areaM2))) }
    case 'course': {
      const course = calibrateSprayer({ kind: 'course', widthIn: Number(measured.widthIn) })
      if (!('courseFt' in course)) throw new RangeError('a course has a length')
      return {
        ...blank, galUSPerAcre: positive(measured.ounces), courseFt: String(course.courseFt),
        rateLPerHa: convertQuantity({ value: positive(measured.ounces), unit: 'galUS/acre' }, 'L/ha'),
      }
    }
    case 'catch':
      return catchSheet(measured, nominalFlow(fitting))
  }
}

function catchSheet(measured: Extract<Measured, { kind: 'catch' }>, nominal: ExactDecimal | null): CalibrationSheet {
  const minutes = new ExactDecimal(positive(measured.seconds)).div(60)
  const flows = measured.catchesMl.map((ml) => new ExactDecimal(positive(ml)).div(1000).div(minutes))
  const mean = flows.reduce((sum, flow) => sum.plus(flow), new ExactDecimal(0)).div(flows.length)
  const total = mean.times(Math.max(measured.nozzles, flows.length))
  return {
    ...rateOf(total.toString(), measured), flowLPerMin: writeDecimal(total), meanLPerMin: writeDecimal(mean), courseFt: null,
    nozzles: flows.map((flow) => judgeNozzle(flow, mean, nominal)),
  }
}

function judgeNozzle(flow: ExactDecimal, mean: ExactDecimal, nominal: ExactDecimal | null): CaughtNozzle {
  const offMean = percentOff(flow, mean)
  const offNominal = nominal && percentOff(flow, nominal)
  return {
    flowLPerMin: writeDecimal(flow), offMeanPercent: writeDecimal(offMean), offNominalPercent: offNominal && writeDecimal(offNominal),
    isWorn: offMean.abs().gte(WORN_PERCENT) || (offNominal?.gte(WORN_PERCENT) ?? false),
  }
}

/** What one nozzle should give at the pressure fitted; null where it is not known. */
export function nominalFlow(fitting: Pick<Fitting, 'nozzle' | 'pressureBar'> | null): ExactDecimal | null {
  if (!fitting?.nozzle || fitting.pressureBar === null) return null
  const flow = fitting.nozzle.kind === 'iso' ? NOZZLES[fitting.nozzle.size].flowLPerMin : fitting.nozzle.flowLPerMin
  return flow === null ? null : flowAtPressure({ flow, bar: NOMINAL_BAR }, fitting.pressureBar)
}

/** F1.1 for the whole sprayer, decimals all the way. */
function rateOf(flowLPerMin: string, { speedKmH, swathM }: { speedKmH: string; swathM: string }): Pick<CalibrationSheet, 'rateLPerHa' | 'galUSPerAcre'> {
  const swept = new ExactDecimal(positive(speedKmH)).times(positive(swathM))
  return inBothUnits(new ExactDecimal(positive(flowLPerMin)).times(600).div(swept))
}

function inBothUnits(rate: ExactDecimal): Pick<CalibrationSheet, 'rateLPerHa' | 'galUSPerAcre'> {
  const rateLPerHa = writeDecimal(rate)
  return { rateLPerHa, galUSPerAcre: convertQuantity({ value: rateLPerHa, unit: 'L/ha' }, 'galUS/acre') }
}

const percentOff = (value: ExactDecimal, from: ExactDecimal): ExactDecimal => value.div(from).minus(1).times(100)

function positive(text: string): string {
  if (!new ExactDecimal(text).gt(0)) throw new RangeError(`must be above 0, is ${text}`)
  return text
}
