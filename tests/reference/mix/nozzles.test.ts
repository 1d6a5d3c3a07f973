import { describe, expect, it } from 'vitest'
import { calibrationSheet } from '../../../shared/mix/calibrationSheet.ts'
import { flowAtPressure } from '../../../shared/mix/flowAtPressure.ts'
import { NOMINAL_BAR, NOZZLE_SIZES, NOZZLES } from '../../../shared/mix/nozzleSizes.ts'
import { convertQuantity } from '../../../shared/units/convertQuantity.ts'

describe('nozzle sizes', () => {
  // Royal Brinkman, "Nozzle coding": flow at 2 bar and colour, as printed; the tolerance is half of its last digit and the rounding of the nominal.
  it.each([['01', 'orange', 0.33], ['02', 'yellow', 0.65], ['03', 'blue', 0.98], ['05', 'brown', 1.63], ['08', 'white', 2.61]] as const)(
    '%s is %s and gives %d L/min at 2 bar',
    (size, colour, printed) => {
      expect(NOZZLES[size].colour).toBe(colour)
      expect(Math.abs(flowAtPressure({ flow: NOZZLES[size].flowLPerMin, bar: NOMINAL_BAR }, '2').toNumber() - printed)).toBeLessThanOrEqual(0.01)
    },
  )

  // sprayers101.com, "How to use a nozzle flow chart": 04 is 0.4 US gallons a minute at 40 psi. Two digits agree: the nominal is rounded.
  it.each(NOZZLE_SIZES)('%s names its flow in US gallons a minute at 40 psi', (size) => {
    const bar = String(Number(convertQuantity({ value: '40', unit: 'psi' }, 'bar')))
    const litres = flowAtPressure({ flow: NOZZLES[size].flowLPerMin, bar: NOMINAL_BAR }, bar).toString()
    const named = Number(size.startsWith('0') ? `0.${size.slice(1)}` : '1')
    expect(Number(convertQuantity({ value: litres, unit: 'L' }, 'galUS')) / named).toBeCloseTo(1, 1)
  })

  // From memory of ISO 10625, not read in the standard itself: the colours that the table above does not print.
  it.each([['015', 'green'], ['025', 'lilac'], ['04', 'red'], ['06', 'grey'], ['10', 'lightBlue']] as const)('%s is %s', (size, colour) => {
    expect(NOZZLES[size].colour).toBe(colour)
  })
})

describe('pressure and flow', () => {
  // J. Deveau (OMAFA), sprayers101.com, "The pressure/spray/coverage relationship": "4x change in pressure for a 2x change in flow".
  it('goes with the square root', () => {
    expect(flowAtPressure({ flow: '1.3', bar: '2' }, '8').toNumber()).toBeCloseTo(2.6, 12)
  })
  // Iowa State Univ. Crop News 844: a quarter more flow asks for 63 psi instead of 40 (exact 62.5).
  it('asks for half as much pressure again, and a little, for a quarter more flow', () => {
    expect(flowAtPressure({ flow: '1', bar: '40' }, '62.5').toNumber()).toBeCloseTo(1.25, 12)
  })
})

describe('whole calibrations', () => {
  // Orchard mist-blower manual p. 18 (manualshive 942471): 12 nozzles of 1.02 L/min, 6 km/h, 3.0 m.
  it('gives 408 L/ha for the mist-blower of the manual', () => {
    expect(calibrationSheet({ kind: 'catch', catchesMl: ['1020'], seconds: '60', nozzles: 12, speedKmH: '6', swathM: '3' })).toMatchObject({ flowLPerMin: '12.24', rateLPerHa: '408' })
  })
  // LSU AgCenter, "Ounces Equal Gallons", example 1: 40-inch rows, course of 102 ft, 14 oz from both nozzles of a row.
  it('gives 14 gallons an acre on a course of 102 feet', () => {
    const sheet = calibrationSheet({ kind: 'course', widthIn: '40', ounces: '14' })
    expect(sheet.galUSPerAcre).toBe('14')
    expect(Number(sheet.courseFt)).toBeCloseTo(102, 0)
  })
  // Ray's Horticulture, "Calibration with a knapsack sprayer" (2009): 1.01 L on 23.46 m².
  it('gives 430.52 L/ha for the knapsack of the notes', () => {
    expect(Number(calibrationSheet({ kind: 'plot', volumeL: '1.01', areaM2: '23.46' }).rateLPerHa)).toBeCloseTo(430.52, 2)
  })
  // Alberta Agdex 606-1 p. 11 accepts 0.71 to 0.79 around 0.75 L/min (5 %); at 10 %, as here, both pass and 0.83 does not.
  it('takes 0.71 and 0.79 around 0.75 for even', () => {
    const nozzles = (catchesMl: string[]) => calibrationSheet({ kind: 'catch', catchesMl, seconds: '60', nozzles: catchesMl.length, speedKmH: '6', swathM: '1' }).nozzles
    expect(nozzles(['710', '790', '750']).some(({ isWorn }) => isWorn)).toBe(false)
    expect(nozzles(['830', '710', '710']).map(({ isWorn }) => isWorn)).toEqual([true, false, false])
  })
})
