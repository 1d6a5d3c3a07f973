import type { Fact } from '../parts/factsList.ts'
import type { RecordReportData } from '../recordReportData.ts'
import { plainFacts } from './plainFacts.ts'
import { bold, plain, type ReportWords } from './reportWords.ts'

const MINUTE = 60_000
/** A device clock further off than this is told, milliseconds. */
const CLOCK_SLACK = 5 * MINUTE
/** Entered later than this after the end of the work is late, milliseconds. */
const LATE = 24 * 60 * MINUTE

/** Who did, entered, signed and reviewed it, what they wore, and the three clocks: the work's, the device's, the server's; none is corrected. */
export function peopleFacts({ signed, signedWith, names, reviews }: RecordReportData, words: ReportWords): Fact[] {
  const { say, moment } = words
  const { times } = signed
  // A name that was blanked leaves the person's digest in the signed text and nothing to print.
  const nameOf = (name: string): string => (name === '' ? say('people.noName') : name)
  const worked = words.isSameDay(times.startedAt, times.endedAt)
    ? say('stamp.sameDay', { day: words.day(times.startedAt), start: words.time(times.startedAt), end: words.time(times.endedAt) })
    : say('stamp.days', { day: words.day(times.startedAt), start: words.time(times.startedAt), endDay: words.day(times.endedAt), end: words.time(times.endedAt) })
  return [
    { label: say('people.doneBy'), spans: plain(nameOf(names.doneBy)) },
    ...plainFacts(signed.content, 'happened', words),
    { label: say('people.worn'), spans: plain(wornOf(signed, words)) },
    { label: say('people.enteredBy'), spans: enteredBy(nameOf(names.enteredBy), times, words) },
    { label: say('people.worked'), spans: plain(worked) },
    { label: say('people.device'), spans: deviceClock(times, words) },
    { label: say('people.server'), spans: plain(moment(times.receivedAt, { seconds: true })) },
    { label: say('people.signed'), spans: [...bold(moment(times.signedAt, { seconds: true })), ...plain(say(signedWith === 'pin' ? 'people.signedByPin' : 'people.signedBy', { name: nameOf(names.signedBy) }))] },
    { label: say('people.reviewed'), spans: plain(reviewedBy(reviews, words)) },
  ]
}

function wornOf({ content: { protection } }: RecordReportData['signed'], { say, join }: ReportWords): string {
  return protection.length === 0 ? say('people.wornNone') : join(protection.map((item) => say(`protection.${item}`)))
}

/** Who read this version and when; a review changes nothing. */
function reviewedBy(reviews: RecordReportData['reviews'], { say, moment }: ReportWords): string {
  if (reviews.length === 0) return say('people.notReviewed')
  return reviews.map(({ by, at, note }) => {
    const review = say('people.reviewedBy', { name: by === '' ? say('people.noName') : by, moment: moment(at) })
    return note === null ? review : say('people.reviewNote', { review, note })
  }).join('; ')
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
