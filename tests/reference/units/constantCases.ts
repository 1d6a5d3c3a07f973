import type { ReferenceCase } from '../referenceCase.ts'

const GNU = 'GNU Units 2.22 definitions.units (cites NIST SP 811, NIST Handbook 44 App. C, SP 447), by running it'
const DEFINITION = 'definition of the unit'

/** Exact by definition: the text `convertQuantity` must give, to the last digit. */
export const EXACT_CONSTANTS = [
  { from: 'galUS', to: 'L', text: '3.785411784', source: `${GNU}; SP 811 B.8: 231 in³` },
  { from: 'flozUS', to: 'mL', text: '29.5735295625', source: GNU },
  { from: 'tbspUS', to: 'mL', text: '14.78676478125', source: GNU },
  { from: 'tspUS', to: 'mL', text: '4.92892159375', source: GNU },
  { from: 'cupUS', to: 'mL', text: '236.5882365', source: GNU },
  { from: 'ptUS', to: 'mL', text: '473.176473', source: GNU },
  { from: 'qtUS', to: 'mL', text: '946.352946', source: `${GNU}; SP 811 B.8: 9.463 529 46e-4 m³` },
  { from: 'galImp', to: 'L', text: '4.54609', source: GNU },
  { from: 'flozImp', to: 'mL', text: '28.4130625', source: GNU },
  { from: 'in', to: 'm', text: '0.0254', source: GNU },
  { from: 'ft', to: 'm', text: '0.3048', source: GNU },
  { from: 'acre', to: 'm2', text: '4046.8564224', source: `${GNU}; SP 811 B.8: 43 560 ft², of the international foot` },
  { from: 'ft2', to: 'm2', text: '0.09290304', source: 'NIST SP 811 B.8: 9.290 304 E-02 m²' },
  { from: 'mi', to: 'm', text: '1609.344', source: 'NIST SP 811 B.8: 1.609 344 E+03 m' },
  { from: 'mi', to: 'ft', text: '5280', source: 'NIST Handbook 44 App. C: 1 mile = 5280 feet' },
  { from: 'km', to: 'm', text: '1000', source: DEFINITION },
  { from: 'galUS/min', to: 'L/min', text: '3.785411784', source: `${GNU}; SP 811 B.8: 231 in³` },
  { from: 'lb', to: 'kg', text: '0.45359237', source: GNU },
  { from: 'oz', to: 'g', text: '28.349523125', source: `${DEFINITION}: 1/16 lb` },
  { from: 'mph', to: 'kmh', text: '1.609344', source: GNU },
  { from: 'mph', to: 'ms', text: '0.44704', source: GNU },
  { from: 'knot', to: 'kmh', text: '1.852', source: `${DEFINITION}: 1852 m an hour` },
  { from: 'ha', to: 'm2', text: '10000', source: DEFINITION },
  { from: 'ms', to: 'kmh', text: '3.6', source: DEFINITION },
] as const

/** Printed with so many digits: half a unit of the last printed one is allowed. */
export const PRINTED_CONSTANTS: ReferenceCase[] = [
  constant('US gal/acre', 1, 'galUS/acre', 'L/ha', 9.353956229, 5e-10),
  constant('imperial gal/acre', 1, 'galImp/acre', 'L/ha', 11.233633036, 5e-10),
  constant('fl oz/acre', 1, 'flozUS/acre', 'mL/ha', 73.07778304, 5e-9),
  constant('US pint/acre', 1, 'ptUS/acre', 'L/ha', 1.169244529, 5e-10),
  constant('lb/acre', 1, 'lb/acre', 'kg/ha', 1.120851156, 5e-10),
  constant('knot', 1, 'knot', 'ms', 0.514444, 5e-7),
  constant('psi in Pa', 1, 'psi', 'bar', 0.06894757293168, 5e-15),
  constant('bar in psi', 1, 'bar', 'psi', 14.503773773, 5e-10),
  constant('W2.14 12.5 US gal/ac (COMPUTED)', 12.5, 'galUS/acre', 'L/ha', 116.9245, 1e-4),
  constant('W2.14 30 fl oz/ac (COMPUTED)', 30, 'flozUS/acre', 'mL/ha', 2192.333, 1e-3),
  constant('W2.14 40 lb/ac (COMPUTED)', 40, 'lb/acre', 'kg/ha', 44.83405, 1e-4),
  constant('F1.6 mph of ft/s: 3600/5280 (prints 0.682 at U. Idaho Minidoka)', 0.3048, 'ms', 'mph', 0.6818, 5e-5),
]

function constant(id: string, value: number, from: string, to: string, expected: number, tolerance: number): ReferenceCase {
  return { id, source: GNU, fn: 'convert', args: { value, from, to }, read: (answer: number) => answer, expected, tolerance }
}
