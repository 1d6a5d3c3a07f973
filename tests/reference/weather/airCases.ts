import type { ReferenceCase } from '../referenceCase.ts'

type Air = { wetBulbC: number; deltaTC: number; dewPointC: number; vpdKPa: number }

/** T °C, RH %, then wet bulb and delta T by Stull's formula, dew point (17.27/237.3) and vapour pressure deficit. */
const GRID: readonly (readonly [tempC: number, rh: number, wetBulb: number, deltaT: number, dewPoint: number, vpd: number])[] = [
  [20, 50, 13.6993, 6.301, 9.27, 1.1691],
  [10, 30, 3.263, 6.737, -6.75, 0.8596],
  [10, 90, 8.9197, 1.08, 8.438, 0.1228],
  [15, 60, 10.5167, 4.483, 7.307, 0.6821],
  [20, 30, 10.8166, 9.183, 1.917, 1.6368],
  [25, 40, 16.3841, 8.616, 10.469, 1.9007],
  [28, 45, 19.7208, 8.279, 14.96, 2.079],
  [30, 60, 23.9955, 6.004, 21.381, 1.6972],
  [35, 20, 19.3024, 15.698, 8.694, 4.4981],
  [18, 75, 15.0138, 2.986, 13.505, 0.516],
  [20, 80, 17.5293, 2.471, 16.445, 0.4677],
  [30, 85, 27.8791, 2.121, 27.196, 0.6365],
  [5, 50, 0.8019, 4.198, -4.539, 0.4362],
]

const PSYCHROLIB = 'PsychroLib 2.5.0 (ASHRAE thermodynamic wet bulb) at the standard pressure of that height'

/** Air: published values and grids of the sea-level formula, and the psychrometer at a height. */
export const AIR_CASES: ReferenceCase[] = [
  { ...air('W4.1', 'NCAR NCL manual, wetbulb_stull, Example 1', { tempC: 20, rh: 50 }), read: (one: Air) => one.wetBulbC, expected: 13.69934, tolerance: 1e-4 },
  ...GRID.flatMap(([tempC, rh, wetBulb, deltaT, dewPoint, vpd]): ReferenceCase[] => {
    const row = (name: string) => air(`${tempC} °C ${rh} % ${name}`, 'Stull 2011 and FAO-56 eq. 11, run in their reference programs', { tempC, rh })
    return [
      { ...row('wet bulb'), read: (one: Air) => one.wetBulbC, expected: wetBulb, tolerance: 5.1e-5 },
      { ...row('delta T'), read: (one: Air) => one.deltaTC, expected: deltaT, tolerance: 5.1e-4 },
      { ...row('dew point'), read: (one: Air) => one.dewPointC, expected: dewPoint, tolerance: 6e-4 },
      { ...row('deficit'), read: (one: Air) => one.vpdKPa, expected: vpd, tolerance: 5.1e-5 },
    ]
  }),
  // The aspirated psychrometer of FAO-56 is a model of an instrument: a tenth of a degree or two beside the thermodynamic answer.
  ...([[0, 13.783], [1000, 13.491], [2000, 13.199]] as const).map(([altitudeM, expected]): ReferenceCase => (
    { ...air(`20 °C 50 % at ${altitudeM} m`, PSYCHROLIB, { tempC: 20, rh: 50, altitudeM }), read: (one: Air) => one.wetBulbC, expected, tolerance: 0.2 }
  )),
  // 25.6 °C dry, 19.5 °C wet, 1 200 m: vapour pressure 1.91 kPa, which is 58.2 % of 3.282 kPa.
  { ...air('W4.4 read backwards', 'FAO-56, Example 4', { tempC: 25.6, rh: 58.2, altitudeM: 1200 }), read: (one: Air) => one.wetBulbC, expected: 19.5, tolerance: 0.05 },
]

function air(id: string, source: string, args: Record<string, unknown>): Pick<ReferenceCase, 'id' | 'source' | 'fn' | 'args'> {
  return { id, source, fn: 'air', args }
}
