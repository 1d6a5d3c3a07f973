import type { Weather } from '../contract/weather.ts'
import { convertQuantity } from '../units/convertQuantity.ts'
import { airFigures, hasAirFigures, type AirFigures } from './airFigures.ts'

/** Wet bulb, delta T, dew point and deficit of written weather; null while a value is missing or out of the formulas' range. */
export function airOf(weather: Pick<Weather, 'air' | 'humidity'> | null): AirFigures | null {
  if (!weather?.air || !weather.humidity) return null
  const air = { tempC: Number(convertQuantity(weather.air, 'degC')), rh: Number(weather.humidity.value) }
  return hasAirFigures(air) ? airFigures(air) : null
}
