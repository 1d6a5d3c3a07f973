export interface Air {
  /** Air temperature, °C. */
  tempC: number
  /** Relative humidity, percent. */
  rh: number
  /** Height above the sea, metres; given, the wet bulb is a psychrometer's at the pressure up there. */
  altitudeM?: number | undefined
}

export interface AirFigures {
  wetBulbC: number
  /** Air less wet bulb, °C. */
  deltaTC: number
  dewPointC: number
  /** Vapour pressure deficit, kPa. */
  vpdKPa: number
  method: 'stull' | 'psychrometer'
}

/**
 * What follows from air temperature and humidity, unrounded. Near a limit the two methods of the wet bulb can differ by up to 1 °C.
 * @throws {RangeError} outside −20 to 50 °C, 5 to 99 % (where the sea-level formula was fitted), or −500 to 5000 m.
 * @source wet bulb at sea level: R. Stull 2011, J. Appl. Meteor. Climatol. 50, 2267; at a height: FAO Irrigation and Drainage Paper 56,
 * eq. 7, 11 and 15 for an aspirated psychrometer; dew point and deficit from FAO-56 eq. 11.
 * @example airFigures({ tempC: 20, rh: 50 }).wetBulbC // 13.699…
 */
export function airFigures({ tempC, rh, altitudeM }: Air): AirFigures {
  if (!(tempC >= -20 && tempC <= 50)) throw new RangeError(`tempC must be from -20 to 50, is ${tempC}`)
  if (!(rh >= 5 && rh <= 99)) throw new RangeError(`rh must be from 5 to 99, is ${rh}`)
  const vapourKPa = saturationKPa(tempC) * (rh / 100)
  const wetBulbC = altitudeM === undefined ? stullWetBulb(tempC, rh) : psychrometerWetBulb(tempC, vapourKPa, pressureKPa(altitudeM))
  return {
    wetBulbC,
    deltaTC: tempC - wetBulbC,
    dewPointC: dewPoint(vapourKPa),
    vpdKPa: saturationKPa(tempC) - vapourKPa,
    method: altitudeM === undefined ? 'stull' : 'psychrometer',
  }
}

/** True where `airFigures` answers. */
export function hasAirFigures({ tempC, rh }: Air): boolean {
  return tempC >= -20 && tempC <= 50 && rh >= 5 && rh <= 99
}

function saturationKPa(tempC: number): number {
  return 0.6108 * Math.exp((17.27 * tempC) / (tempC + 237.3))
}

function dewPoint(vapourKPa: number): number {
  const log = Math.log(vapourKPa / 0.6108)
  return (237.3 * log) / (17.27 - log)
}

function stullWetBulb(tempC: number, rh: number): number {
  return (
    tempC * Math.atan(0.151977 * Math.sqrt(rh + 8.313659)) + Math.atan(tempC + rh) - Math.atan(rh - 1.676331)
    + 0.00391838 * rh ** 1.5 * Math.atan(0.023101 * rh) - 4.686035
  )
}

function pressureKPa(altitudeM: number): number {
  if (!(altitudeM >= -500 && altitudeM <= 5000)) throw new RangeError(`altitudeM must be from -500 to 5000, is ${altitudeM}`)
  return 101.3 * ((293 - 0.0065 * altitudeM) / 293) ** 5.26
}

const ASPIRATED = 0.000662

/** The wet bulb at which the psychrometer's equation gives this vapour pressure; halved down to a millionth of a degree. */
function psychrometerWetBulb(tempC: number, vapourKPa: number, airKPa: number): number {
  let low = tempC - 60
  let high = tempC
  while (high - low > 1e-6) {
    const middle = (low + high) / 2
    const given = saturationKPa(middle) - ASPIRATED * airKPa * (tempC - middle)
    if (given < vapourKPa) low = middle
    else high = middle
  }
  return (low + high) / 2
}
