import { z } from 'zod'
import { isWithin } from '../units/isWithin.ts'
import { decimalText, signedDecimal, SPEED_UNITS, TEMPERATURE_UNITS } from './quantity.ts'

/** How a weather value is known. A value from a model says so; a forecast never stands here as if it were read. */
export const WEATHER_KINDS = ['readHere', 'felt', 'station', 'model'] as const
const reading = <Unit extends z.ZodType>(value: z.ZodString, unit: Unit) =>
  z.strictObject({ value, unit, kind: z.enum(WEATHER_KINDS) }).nullable().default(null)

export const WIND_POINTS = ['N', 'NE', 'E', 'SE', 'S', 'SW', 'W', 'NW'] as const
const weatherFacts = z.strictObject({
  wind: reading(decimalText, z.enum(SPEED_UNITS)),
  windFrom: z.enum(WIND_POINTS).nullable().default(null),
  air: reading(signedDecimal, z.enum(TEMPERATURE_UNITS)),
  humidity: reading(decimalText.regex(/^(\d{1,2}(\.\d+)?|100(\.0+)?)$/, { error: 'number.percent' }), z.literal('%')),
})
/** Air from −60 to 60 °C and wind up to 75 m/s, in whichever unit it is written; humidity is a percentage by its form. */
export const weatherSchema = weatherFacts.superRefine(({ wind, air }, context) => {
  const refuse = (field: string) => context.addIssue({ code: 'custom', path: [field, 'value'], message: 'number.range' })
  if (wind && decimalText.safeParse(wind.value).success && !isWithin(wind, { low: 0, high: 75, unit: 'ms' })) refuse('wind')
  if (air && signedDecimal.safeParse(air.value).success && !isWithin(air, { low: -60, high: 60, unit: 'degC' })) refuse('air')
})
export type Weather = z.infer<typeof weatherSchema>
