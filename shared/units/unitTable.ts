/** What a unit measures; only units of one dimension convert into each other. */
export type Dimension =
  | 'volume' | 'mass' | 'area' | 'length' | 'speed' | 'temperature' | 'temperatureStep' | 'pressure' | 'volumePerArea' | 'massPerArea' | 'volumePerTime'

/** SI (or stored) value = (value + `offset`) × `toSi[0]` ÷ `toSi[1]`, both exact decimals. */
export interface UnitRow {
  dimension: Dimension
  toSi: readonly [numerator: string, denominator: string]
  offset: string
}

const unit = (dimension: Dimension, numerator: string, denominator = '1', offset = '0'): UnitRow => ({
  dimension,
  toSi: [numerator, denominator],
  offset,
})

const ACRE_HA = '0.40468564224'

/**
 * Every unit of the product with its exact factor: litres, kilograms, square metres, metres, metres a second, kelvin, pascal,
 * litres a hectare, kilograms a hectare, litres a minute.
 * @source defining constants: US gallon 231 in³, imperial gallon 4.54609 L, international foot 0.3048 m, acre 4046.8564224 m²
 * (international foot), mile 5280 ft, pound 0.45359237 kg, knot 1852 m/h, standard gravity 9.80665 m/s² (NIST SP 811, Handbook 44 App. C).
 */
export const UNITS = {
  L: unit('volume', '1'),
  mL: unit('volume', '0.001'),
  galUS: unit('volume', '3.785411784'),
  flozUS: unit('volume', '3.785411784', '128'),
  tbspUS: unit('volume', '3.785411784', '256'),
  tspUS: unit('volume', '3.785411784', '768'),
  cupUS: unit('volume', '3.785411784', '16'),
  ptUS: unit('volume', '3.785411784', '8'),
  qtUS: unit('volume', '3.785411784', '4'),
  galImp: unit('volume', '4.54609'),
  flozImp: unit('volume', '4.54609', '160'),
  kg: unit('mass', '1'),
  g: unit('mass', '0.001'),
  lb: unit('mass', '0.45359237'),
  oz: unit('mass', '0.45359237', '16'),
  m2: unit('area', '1'),
  ha: unit('area', '10000'),
  acre: unit('area', '4046.8564224'),
  ft2: unit('area', '0.09290304'),
  m: unit('length', '1'),
  km: unit('length', '1000'),
  mi: unit('length', '1609.344'),
  ft: unit('length', '0.3048'),
  in: unit('length', '0.0254'),
  kmh: unit('speed', '1', '3.6'),
  mph: unit('speed', '0.44704'),
  ms: unit('speed', '1'),
  knot: unit('speed', '1852', '3600'),
  degC: unit('temperature', '1', '1', '273.15'),
  degF: unit('temperature', '5', '9', '459.67'),
  /** How far apart two temperatures are, as of a delta T: no zero of its own. */
  diffC: unit('temperatureStep', '1'),
  diffF: unit('temperatureStep', '5', '9'),
  bar: unit('pressure', '100000'),
  psi: unit('pressure', '4.4482216152605', '0.00064516'),
  'L/ha': unit('volumePerArea', '1'),
  'mL/ha': unit('volumePerArea', '0.001'),
  'galUS/acre': unit('volumePerArea', '3.785411784', ACRE_HA),
  'flozUS/acre': unit('volumePerArea', '0.0295735295625', ACRE_HA),
  'ptUS/acre': unit('volumePerArea', '0.473176473', ACRE_HA),
  'galImp/acre': unit('volumePerArea', '4.54609', ACRE_HA),
  'kg/ha': unit('massPerArea', '1'),
  'lb/acre': unit('massPerArea', '0.45359237', ACRE_HA),
  'L/min': unit('volumePerTime', '1'),
  'galUS/min': unit('volumePerTime', '3.785411784'),
} as const satisfies Record<string, UnitRow>

export type UnitCode = keyof typeof UNITS
