import type { Weather } from '../../../shared/contract/weather.ts'
import type { Fact } from '../parts/factsList.ts'
import type { RecordReportData } from '../recordReportData.ts'
import { bold, plain, type ReportWords } from './reportWords.ts'

/** The sprayer and what the weather was, each value with how it is known, and what follows from air and humidity. */
export function weatherFacts({ signed }: RecordReportData, words: ReportWords): Fact[] {
  const { say } = words
  const { content: { weather } } = signed
  return [
    { label: say('weather.sprayer'), spans: sprayerOf(signed, words) },
    { label: say('weather.wind'), spans: plain(windOf(weather, words)) },
    { label: say('weather.air'), spans: plain(readingOf(weather?.air ?? null, words)) },
    { label: say('weather.humidity'), spans: plain(readingOf(weather?.humidity ?? null, words)) },
    ...airFacts(signed, words),
  ]
}

function sprayerOf({ sprayer }: RecordReportData['signed'], words: ReportWords): Fact['spans'] {
  if (sprayer === null) return plain(words.say('weather.noSprayer'))
  const tank = words.say('weather.tank', { name: sprayer.name, tank: words.short(sprayer.tankL) })
  const flow = sprayer.flowLPerMin === null ? tank : words.say('weather.flow', { tank, flow: words.short(sprayer.flowLPerMin) })
  return [...bold(sprayer.code), ...plain(` ${flow}`)]
}

/** Worked out and never read: each with the method, since a sharp limit can flip with it. */
function airFacts({ computed: { air, lines }, content: { weather } }: RecordReportData['signed'], words: ReportWords): Fact[] {
  const { say } = words
  if (air === null) {
    const why = !weather?.air || !weather.humidity ? 'needsBoth' : lines.length === 0 ? 'notThen' : 'notWorkedOut'
    return [{ label: say('weather.deltaT'), spans: plain(say(`weather.${why}`)) }]
  }
  const degrees = (value: string): string => say('weather.degrees', { value: words.tenths(value) })
  return [
    { label: say('weather.deltaT'), spans: plain(say('weather.workedOut', { value: degrees(air.deltaTC) })) },
    { label: say('weather.wetBulb'), spans: plain(say('weather.byMethod', { value: degrees(air.wetBulbC), method: say(`weather.method.${air.method}`) })) },
    { label: say('weather.dewPoint'), spans: plain(say('weather.workedOut', { value: degrees(air.dewPointC) })) },
  ]
}

function windOf(weather: Weather | null, words: ReportWords): string {
  const { say } = words
  const point = weather?.windFrom ? say(`weather.points.${weather.windFrom}`) : null
  if (!weather?.wind) return point ? say('weather.windFromOnly', { point }) : say('weather.notRead')
  const reading = readingOf(weather.wind, words)
  return point ? say('weather.windFrom', { reading, point }) : reading
}

function readingOf(reading: { value: string; unit: string; kind: string } | null, { say, typed, unit }: ReportWords): string {
  if (!reading) return say('weather.notRead')
  return say('weather.reading', { value: typed(reading.value), unit: unit(reading.unit), kind: say(`weather.${reading.kind}`) })
}
