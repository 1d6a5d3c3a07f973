import type { Position } from './geometryTypes.ts'

export interface PointProblem {
  code: 'points.unreadable' | 'points.minutes_out_of_range' | 'points.lat_out_of_range' | 'points.lon_out_of_range' | 'points.too_many'
  params: Record<string, string | number>
}

const TOKEN = /[NSEWO]|[+-]?\d{1,9}(?:\.\d{1,20})?|[°'",;]/g
const SIGNS = ['°', "'", '"']

/** One side of a point: its numbers (degrees, minutes, seconds) and its letter, if any. */
interface Half { numbers: string[]; letter: string | null }

/** One typed point as [longitude, latitude] in degrees, or what is wrong with it. */
export function parsePointLine(typed: string): Position | PointProblem {
  const unreadable: PointProblem = { code: 'points.unreadable', params: { text: typed.slice(0, 80) } }
  const tokens = tokenise(typed)
  const halves = tokens && splitHalves(tokens)
  const pair = halves?.map(readHalf)
  const [first, second] = pair ?? []
  if (!first || !second || (first.axis !== null && first.axis === second.axis)) return unreadable
  const isLonFirst = first.axis === 'lon' || second.axis === 'lat'
  const [lat, lon] = isLonFirst ? [second, first] : [first, second]
  if (lat.isOver60 || lon.isOver60) return { code: 'points.minutes_out_of_range', params: unreadable.params }
  if (Math.abs(lat.degrees) > 90) return { code: 'points.lat_out_of_range', params: { lat: lat.degrees } }
  if (Math.abs(lon.degrees) > 180) return { code: 'points.lon_out_of_range', params: { lon: lon.degrees } }
  return [lon.degrees, lat.degrees]
}

function tokenise(typed: string): string[] | null {
  if (typed.length > 120) return null
  const plain = readDecimalCommas(
    typed.toUpperCase().replace(/[′’‘´]/g, "'").replace(/[″“”]/g, '"').replace(/''/g, '"').replace(/º/g, '°').replace(/\u2212/g, '-'),
  )
  return plain.replace(TOKEN, '').trim() === '' && !/\d[+-]/.test(plain) ? (plain.match(TOKEN) ?? null) : null
}

/** `51,5; -0,12` and `51,5 -0,12` have decimal commas; in `51, 0` the comma parts the two. */
function readDecimalCommas(line: string): string {
  const hasOtherParting = line.includes(';') || /^\s*[+-]?\d+,\d+\s+[+-]?\d+,\d+\s*$/.test(line)
  return hasOtherParting ? line.replace(/(\d),(\d)/g, '$1.$2') : line
}

function splitHalves(tokens: readonly string[]): [string[], string[]] | null {
  const letters = tokens.flatMap((token, index) => (/[NSEWO]/.test(token) ? [index] : []))
  const [one = -1, two = -1] = letters
  if (letters.length === 2) {
    const cut = one === 0 ? two : one + 1
    return [tokens.slice(0, cut), tokens.slice(cut)]
  }
  const parting = tokens.findIndex((token) => token === ',' || token === ';')
  if (letters.length > 0) return null
  if (parting > 0) return [tokens.slice(0, parting), tokens.slice(parting + 1)]
  return tokens.length === 2 ? [tokens.slice(0, 1), tokens.slice(1)] : null
}

function readHalf(tokens: readonly string[]): { degrees: number; axis: 'lat' | 'lon' | null; isOver60: boolean } | null {
  const half = readTokens(trimPartings(tokens))
  if (half === null) return null
  const [degrees = '', minutes = '0', seconds = '0'] = half.numbers
  const isNegative = degrees.startsWith('-')
  if (half.letter !== null && isNegative) return null
  const size = Math.abs(Number(degrees)) + Number(minutes) / 60 + Number(seconds) / 3600
  const isSouthOrWest = isNegative || (half.letter !== null && 'SWO'.includes(half.letter))
  const axis = half.letter === null ? null : 'NS'.includes(half.letter) ? 'lat' : 'lon'
  return { degrees: (isSouthOrWest ? -size : size) + 0, axis, isOver60: Number(minutes) >= 60 || Number(seconds) >= 60 }
}

/** Commas between the two halves belong to neither. */
function trimPartings(tokens: readonly string[]): string[] {
  const isParting = (token: string | undefined): boolean => token === ',' || token === ';'
  return tokens.slice(isParting(tokens[0]) ? 1 : 0, isParting(tokens.at(-1)) ? -1 : undefined)
}

function readTokens(tokens: readonly string[]): Half | null {
  const half: Half = { numbers: [], letter: null }
  for (const [index, token] of tokens.entries()) {
    if (/[NSEWO]/.test(token)) {
      if (index !== 0 && index !== tokens.length - 1) return null
      half.letter = token
    } else if (SIGNS.includes(token)) {
      if (SIGNS.indexOf(token) !== half.numbers.length - 1) return null
    } else if (/^[+-]?\d/.test(token)) half.numbers.push(token)
    else return null
  }
  return isMeasure(half.numbers) ? half : null
}

/** One to three numbers; only the first may have a sign, only the last decimals. */
function isMeasure(numbers: readonly string[]): boolean {
  return (
    numbers.length >= 1 && numbers.length <= 3 &&
    numbers.slice(1).every((number) => /^\d/.test(number)) &&
    numbers.slice(0, -1).every((number) => !number.includes('.'))
  )
}
