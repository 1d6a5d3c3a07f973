import { z } from 'zod'
import { canonicalText } from '../../shared/evidence/canonicalText.ts'
import { sha256Hex } from '../../shared/evidence/sha256Hex.ts'
import { asBoundary } from '../../shared/geo/asBoundary.ts'
import { measurePolygon } from '../../shared/geo/measurePolygon.ts'
import { calibrateSprayer } from '../../shared/mix/calibrateSprayer.ts'
import { dilute } from '../../shared/mix/dilute.ts'
import { splitLoads } from '../../shared/mix/splitLoads.ts'
import { convertQuantity, type Quantity } from '../../shared/units/convertQuantity.ts'
import { dimensionOf } from '../../shared/units/dimensionOf.ts'
import { isWithin } from '../../shared/units/isWithin.ts'
import { UNITS, type UnitCode } from '../../shared/units/unitTable.ts'
import { airFigures } from '../../shared/weather/airFigures.ts'
import { plainDecimal } from './plainDecimal.ts'

/** A function of `calc`: the shape of its arguments in words, and what it answers. */
export interface CalcFunction {
  args: string
  answer: string
  /** @throws {RangeError | z.ZodError} if the arguments cannot be used. */
  run: (args: unknown) => unknown
}

/** From absolute zero up. */
const ABOVE_ZERO = { low: -273.15, high: Infinity, unit: 'degC' } as const
const unitCode = z.enum(Object.keys(UNITS) as [UnitCode, ...UnitCode[]])
const positionSchema = z.array(z.number()).min(2)
const ringsSchema = z.array(z.array(positionSchema).min(1)).min(1)
/** Degrees beyond 180 and heights are read: the arithmetic is tried here, not whether a boundary may stand. */
const geometrySchema = z.union([
  z.looseObject({ type: z.literal('Polygon'), coordinates: ringsSchema }),
  z.looseObject({ type: z.literal('MultiPolygon'), coordinates: z.array(ringsSchema).min(1) }),
])

function define<Args extends z.ZodType>(
  words: { args: string; answer: string }, schema: Args, run: (args: z.output<Args>) => unknown,
): CalcFunction {
  return { ...words, run: (args) => run(schema.parse(args)) }
}

/** Everything `calc` can do, by name; each is one call into `shared`. */
export const CALC_FUNCTIONS: Readonly<Record<string, CalcFunction>> = {
  area: define(
    { args: '{geometry: Polygon | MultiPolygon}', answer: '{areaM2, perimeterM}' },
    z.strictObject({ geometry: geometrySchema }),
    ({ geometry }) => measurePolygon(asBoundary(geometry)),
  ),
  convert: define(
    { args: '{value, from, to}', answer: 'number in the unit `to`' },
    z.strictObject({ value: z.number(), from: unitCode, to: unitCode }),
    ({ value, from, to }) => {
      const given = { value: plainDecimal(value), unit: from }
      assertExists(given)
      return Number(convertQuantity(given, to))
    },
  ),
  dilute: define(
    { args: '{total: {value, unit}, n, reading: "to" | "in"}', answer: '{product, water} in the unit of total' },
    z.strictObject({ total: z.strictObject({ value: z.number(), unit: unitCode }), n: z.number(), reading: z.enum(['to', 'in']) }),
    ({ total, n, reading }) => {
      const mix = dilute({ total: { value: plainDecimal(total.value), unit: total.unit }, n: plainDecimal(n), reading })
      return { product: Number(mix.product), water: Number(mix.water) }
    },
  ),
  loads: define(
    { args: '{areaHa, rateLPerHa, tankL}', answer: '{totalL, full, lastL, lastAreaHa}' },
    z.strictObject({ areaHa: z.number(), rateLPerHa: z.number(), tankL: z.number() }),
    ({ areaHa, rateLPerHa, tankL }) => {
      const loads = splitLoads({ areaHa: plainDecimal(areaHa), rateLPerHa: plainDecimal(rateLPerHa), tankL: plainDecimal(tankL) })
      return { totalL: Number(loads.totalL), full: loads.full, lastL: Number(loads.lastL), lastAreaHa: Number(loads.lastAreaHa) }
    },
  ),
  calibrate: define(
    {
      args: '{kind: "flow", flowLPerMin, speedKmH, widthM} | {kind: "catch", volumeL, areaM2} | {kind: "course", widthIn} | {kind: "speed", distanceM, seconds}',
      answer: '{rateLPerHa} | {rateLPerHa} | {courseFt} | {kmH}',
    },
    z.discriminatedUnion('kind', [
      z.strictObject({ kind: z.literal('flow'), flowLPerMin: z.number(), speedKmH: z.number(), widthM: z.number() }),
      z.strictObject({ kind: z.literal('catch'), volumeL: z.number(), areaM2: z.number() }),
      z.strictObject({ kind: z.literal('course'), widthIn: z.number() }),
      z.strictObject({ kind: z.literal('speed'), distanceM: z.number(), seconds: z.number() }),
    ]),
    calibrateSprayer,
  ),
  air: define(
    { args: '{tempC, rh, altitudeM?}', answer: '{wetBulbC, deltaTC, dewPointC, vpdKPa, method}; at a height the wet bulb is a psychrometer\'s, else by the sea-level formula' },
    z.strictObject({ tempC: z.number(), rh: z.number(), altitudeM: z.number().optional() }),
    airFigures,
  ),
  canonical: define(
    { args: '{value: JSON}', answer: '{text, sha256}' },
    z.strictObject({ value: z.unknown() }),
    ({ value }) => {
      const text = canonicalText(value)
      return { text, sha256: sha256Hex(text) }
    },
  ),
}

function assertExists(quantity: Quantity): void {
  if (dimensionOf(quantity.unit) !== 'temperature') return
  if (!isWithin(quantity, ABOVE_ZERO)) throw new RangeError(`${quantity.value} ${quantity.unit} lies below absolute zero`)
}
