import type { Weather } from '../../../shared/contract/weather.ts'
import type { Fact } from '../parts/factsList.ts'
import type { RecordReportData } from '../recordReportData.ts'
import { LINES_BESIDE_PLAN, pairBlocks } from './blockLines.ts'
import { bold, plain, type ReportWords } from './reportWords.ts'
import { PLAIN_FIELDS } from '../../../shared/records/plainFields.ts'

/** What was treated, and for what. */
export function placeFacts({ signed }: RecordReportData, words: ReportWords): Fact[] {
  const { say } = words
  const blocks = pairBlocks(signed).map(({ block }) => block)
  const isMany = blocks.length > LINES_BESIDE_PLAN
  const crops = [...new Set(blocks.map(({ crop }) => crop ?? say('facts.noCrop')))]
  const named = blocks.flatMap(({ code, name }, index) => {
    const separator = index === 0 ? '' : index === blocks.length - 1 ? say('list.and', { first: '', last: '' }) : say('list.next', { first: '', last: '' })
    return [...plain(separator), ...bold(code), ...plain(` ${name}`)]
  })
  const versions = words.join(blocks.map(({ code, version }) => say('facts.boundary', { code, version })))
  return [
    { label: say('facts.blocks'), spans: isMany ? plain(say('facts.manyBlocks', { count: blocks.length })) : named },
    ...(isMany ? [] : [{ label: say('facts.crop'), spans: plain(words.join(crops)) }]),
    ...PLAIN_FIELDS.filter(({ isLong }) => !isLong).map(({ name }) => ({
      label: words.plainLabel(name), spans: plain(signed.content[name] ?? words.plainNone(name)),
    })),
    { label: say('facts.boundaries'), spans: plain(isMany ? say('facts.manyBoundaries') : versions) },
    { label: say('facts.zone'), spans: plain(signed.farm.zone.replaceAll('_', ' ')) },
    ...(signed.reason === null ? [] : [{ label: say('facts.reason'), spans: plain(signed.reason) }]),
  ]
}

/** The sprayer and what the weather was, each value with how it is known. */
export function weatherFacts({ signed }: RecordReportData, words: ReportWords): Fact[] {
  const { say } = words
  const { sprayer, content: { weather } } = signed
  const tank = sprayer
    ? [...bold(sprayer.code), ...plain(` ${say('weather.tank', { name: sprayer.name, tank: words.short(sprayer.tankL) })}`)]
    : plain(say('weather.noSprayer'))
  return [
    { label: say('weather.sprayer'), spans: tank },
    { label: say('weather.wind'), spans: plain(windOf(weather, words)) },
    { label: say('weather.air'), spans: plain(readingOf(weather?.air ?? null, words)) },
    { label: say('weather.humidity'), spans: plain(readingOf(weather?.humidity ?? null, words)) },
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

const MINUTE = 60_000
/** A device clock further off than this is told, milliseconds. */
const CLOCK_SLACK = 5 * MINUTE
/** Entered later than this after the end of the work is late, milliseconds. */
const LATE = 24 * 60 * MINUTE

/** Who did, entered and signed it, and the three clocks: the work's, the device's, the server's; none is corrected. */
export function peopleFacts({ signed, names }: RecordReportData, words: ReportWords): Fact[] {
  const { say, moment } = words
  const { times } = signed
  // A name that was blanked leaves the person's digest in the signed text and nothing to print.
  const nameOf = (name: string): string => (name === '' ? say('people.noName') : name)
  const worked = words.isSameDay(times.startedAt, times.endedAt)
    ? say('stamp.sameDay', { day: words.day(times.startedAt), start: words.time(times.startedAt), end: words.time(times.endedAt) })
    : say('stamp.days', { day: words.day(times.startedAt), start: words.time(times.startedAt), endDay: words.day(times.endedAt), end: words.time(times.endedAt) })
  return [
    { label: say('people.doneBy'), spans: plain(nameOf(names.doneBy)) },
    { label: say('people.enteredBy'), spans: enteredBy(nameOf(names.enteredBy), times, words) },
    { label: say('people.worked'), spans: plain(worked) },
    { label: say('people.device'), spans: deviceClock(times, words) },
    { label: say('people.server'), spans: plain(moment(times.receivedAt, { seconds: true })) },
    { label: say('people.signed'), spans: [...bold(moment(times.signedAt, { seconds: true })), ...plain(say('people.signedBy', { name: nameOf(names.signedBy) }))] },
  ]
}

type Times = RecordReportData['signed']['times']

function enteredBy(name: string, { endedAt, receivedAt }: Times, words: ReportWords): Fact['spans'] {
  const after = Date.parse(receivedAt) - Date.parse(endedAt)
  const params = { name, span: spanOf(after, words) }
  if (after < 0) return plain(words.say('people.before', params))
  return after > LATE ? bold(words.say('people.afterLate', params)) : plain(words.say('people.after', params))
}

function deviceClock({ deviceAt, receivedAt }: Times, words: ReportWords): Fact['spans'] {
  if (deviceAt === null) return plain(words.say('people.noDevice'))
  const ahead = Date.parse(deviceAt) - Date.parse(receivedAt)
  const moment = words.moment(deviceAt, { seconds: true })
  if (Math.abs(ahead) <= CLOCK_SLACK) return plain(moment)
  return bold(words.say(ahead > 0 ? 'people.deviceAhead' : 'people.deviceBehind', { moment, span: spanOf(ahead, words) }))
}

/** A span in minutes under an hour and a half, hours under three days, else days; never longer than it was. */
function spanOf(milliseconds: number, { say }: ReportWords): string {
  const minutes = Math.floor(Math.abs(milliseconds) / MINUTE)
  if (minutes < 90) return say('people.minutes', { count: minutes })
  if (minutes < 72 * 60) return say('people.hours', { count: Math.floor(minutes / 60) })
  return say('people.days', { count: Math.floor(minutes / 1440) })
}
