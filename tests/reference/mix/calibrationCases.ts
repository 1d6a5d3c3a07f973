import { convertQuantity } from '../../../shared/units/convertQuantity.ts'
import type { UnitCode } from '../../../shared/units/unitTable.ts'
import type { ReferenceCase } from '../referenceCase.ts'

const inUnit = (value: number, from: UnitCode, to: UnitCode): number => Number(convertQuantity({ value: String(value), unit: from }, to))
const squareFeet = (ft2: number): number => ft2 * inUnit(1, 'ft', 'm') ** 2
const flOz = (count: number): number => inUnit(count, 'flozUS', 'L')

const rate = (answer: { rateLPerHa: number }): number => answer.rateLPerHa
const gallonsPerAcre = (answer: { rateLPerHa: number }): number => inUnit(answer.rateLPerHa, 'L/ha', 'galUS/acre')
const kmH = (answer: { kmH: number }): number => answer.kmH
const mph = (answer: { kmH: number }): number => inUnit(answer.kmH, 'kmh', 'mph')

const IRISH = 'Irish Independent farm pages, "Useful formulae for working out nozzle selection" (article 26717877)'
const UFDC = 'Univ. of Florida, band-spraying calibration table, UFDC UF00067548 p. 6'
const LSU = 'LSU AgCenter, "Ounces Equal Gallons: Sprayer Calibration" (Barbosa, Koske, Parish)'
const AGDEX = 'Alberta Agdex 606-1 p. 11'
const BRINKMAN = 'Royal Brinkman, "Nozzle coding" (flow at 2 bar, L/ha at 6 km/h and 0.5 m)'
const ONE_INCH_M = inUnit(1, 'in', 'm')

/** Sprayer calibration: F1.* and W1.* of the published formulas and examples. */
export const CALIBRATION_CASES: ReferenceCase[] = [
  flow('F1.1/W1.1', IRISH, { flowLPerMin: 1.3, speedKmH: 7.8, widthM: 0.5 }, rate, 200, 1e-9),
  flow('F1.2 5940 for inches', 'UF/IFAS EDIS WG013 Eq. 1; MU Extension G1270a', usFlow(1, 1, ONE_INCH_M), gallonsPerAcre, 5940, 1e-6),
  flow('F1.3 495 for feet', 'Mesa County CO weed page, "Stationary calibration method"', usFlow(1, 1, inUnit(1, 'ft', 'm')), gallonsPerAcre, 495, 1e-7),
  flow('W1.8 (inputs published, answer COMPUTED)', 'Cornell (Landers) boom calibration sheet', usFlow(0.2694, 4, inUnit(20, 'in', 'm')), gallonsPerAcre, 20, 0.005),
  flow('W1.18', 'orchard mist-blower manual p. 18 (manualshive 942471)', { flowLPerMin: 12.24, speedKmH: 6, widthM: 3 }, rate, 408, 1e-9),
  ...[[0.33, 65], [0.65, 131], [0.98, 196], [1.63, 327], [2.61, 523]].map(([litres = 0, perHa = 0]) =>
    flow(`nozzle of ${litres} L/min`, BRINKMAN, { flowLPerMin: litres, speedKmH: 6, widthM: 0.5 }, rate, perHa, 1.001)),
  caught('W1.2', "Ray's Horticulture, \"Calibration with a knapsack sprayer\" (Aug 2009)", 1.01, 23.46, rate, 430.52, 0.01),
  caught('W1.3', UFDC, flOz(26), squareFeet(300), gallonsPerAcre, 29.5, 0.05),
  caught('W1.3 exact', `${UFDC}, exact value COMPUTED`, flOz(26), squareFeet(300), gallonsPerAcre, 29.494, 5e-4),
  caught('W1.4', UFDC, flOz(8), squareFeet(225), gallonsPerAcre, 12.1, 0.05),
  caught('F1.4 fl oz caught on 1/128 acre', LSU, flOz(1), squareFeet(340.3125), gallonsPerAcre, 1, 1e-9),
  caught('W1.6', `${LSU}, example 1`, flOz(14), squareFeet(340.3125), gallonsPerAcre, 14, 1e-9),
  caught('W1.7', '"1/128 method of calibration", slide deck (slidegur 5284)', flOz(40), squareFeet(340.3125), gallonsPerAcre, 40, 1e-9),
  caught('F1.12/W1.15 (COMPUTED)', 'asianturfgrass.com, metric restatement of the Kansas State hand-sprayer worksheet', 0.45, 9, rate, 500, 1e-9),
  ...[[30, 136], [28, 146], [24, 170], [20, 204], [16, 255], [12, 340], [40, 102]].map(([widthIn = 0, feet = 0]): ReferenceCase => ({
    id: `F1.5/W1.5 ${widthIn} in`, source: `${LSU}, table`, fn: 'calibrate', args: { kind: 'course', widthIn },
    read: (answer: { courseFt: number }) => answer.courseFt, expected: feet, tolerance: 0.5,
  })),
  speed('W1.9', 'turf-sprayer operator manual, speed section', inUnit(150, 'ft', 'm'), 19.7, mph, 5.2, 0.05),
  speed('F1.7/W1.9 metric', 'turf-sprayer operator manual, speed section', 45.7, 19.7, kmH, 8.4, 0.05),
  speed('W1.10 6:00', AGDEX, 800, 360, kmH, 8, 1e-9),
  speed('W1.10 4:48', AGDEX, 800, 288, kmH, 10, 1e-9),
  speed('W1.10 4:00', AGDEX, 800, 240, kmH, 12, 1e-9),
  speed('W1.19', 'spreader manual p. 64', 100, 45, kmH, 8, 1e-9),
  speed('F1.6', 'U. Idaho Minidoka, "Calibration procedure for band application": 88 ft a minute is 1 mph', inUnit(88, 'ft', 'm'), 60, mph, 1, 1e-9),
  load('W1.11', AGDEX, inUnit(30, 'acre', 'ha'), 40 / inUnit(1, 'acre', 'ha'), 400, (answer) => answer.totalL, 1200, 1e-9),
  load('F1.10/W1.16 total (COMPUTED)', 'formula F1.10', 7.3, 300, 400, (answer) => answer.totalL, 2190, 1e-9),
  load('F1.10/W1.16 full loads (COMPUTED)', 'formula F1.10', 7.3, 300, 400, (answer) => answer.full, 5, 0),
  load('F1.10/W1.16 last load (COMPUTED)', 'formula F1.10', 7.3, 300, 400, (answer) => answer.lastL, 190, 1e-9),
  load('F1.10/W1.16 its area (COMPUTED)', 'formula F1.10', 7.3, 300, 400, (answer) => answer.lastAreaHa, 0.6333, 5e-5),
]

function usFlow(gallonsPerMin: number, milesPerHour: number, widthM: number) {
  return { flowLPerMin: inUnit(gallonsPerMin, 'galUS', 'L'), speedKmH: inUnit(milesPerHour, 'mph', 'kmh'), widthM }
}

function flow(
  id: string, source: string, args: { flowLPerMin: number; speedKmH: number; widthM: number },
  read: (answer: { rateLPerHa: number }) => number, expected: number, tolerance: number,
): ReferenceCase {
  return { id, source, fn: 'calibrate', args: { kind: 'flow', ...args }, read, expected, tolerance }
}

function caught(
  id: string, source: string, volumeL: number, areaM2: number,
  read: (answer: { rateLPerHa: number }) => number, expected: number, tolerance: number,
): ReferenceCase {
  return { id, source, fn: 'calibrate', args: { kind: 'catch', volumeL, areaM2 }, read, expected, tolerance }
}

function speed(
  id: string, source: string, distanceM: number, seconds: number,
  read: (answer: { kmH: number }) => number, expected: number, tolerance: number,
): ReferenceCase {
  return { id, source, fn: 'calibrate', args: { kind: 'speed', distanceM, seconds }, read, expected, tolerance }
}

type LoadsAnswer = { totalL: number; full: number; lastL: number; lastAreaHa: number }

function load(
  id: string, source: string, areaHa: number, rateLPerHa: number, tankL: number,
  read: (answer: LoadsAnswer) => number, expected: number, tolerance: number,
): ReferenceCase {
  return { id, source, fn: 'loads', args: { areaHa, rateLPerHa, tankL }, read, expected, tolerance }
}
