import { formatCheckCode } from '../../../shared/evidence/checkCode.ts'
import type { RecordReportData } from '../recordReportData.ts'
import type { Span } from '../parts/wrapText.ts'
import { bold, plain, type ReportWords } from './reportWords.ts'

/** What a reader must know of the version before its content: that it amends another, was taken back, or is no longer the newest. */
export function entryNotices({ signed, names, newest, state }: RecordReportData, words: ReportWords): Span[][] {
  const { say } = words
  const { record: { version }, entry, replaces, reason, times } = signed
  const notices: Span[][] = []
  const because = reason === null ? [] : plain(` ${say('entry.because', { reason })}`)
  const replaced = replaces === null ? [] : plain(` ${say('entry.replaces', { version: version - 1, code: formatCheckCode(replaces) })}`)
  if (entry === 'amended') notices.push([...bold(say('entry.amended', { version })), ...because, ...replaced])
  if (entry === 'withdrawn') {
    const name = names.signedBy === '' ? say('people.noName') : names.signedBy
    notices.push([...bold(say('entry.withdrawn', { name, moment: words.moment(times.signedAt) })), ...because, ...plain(` ${say('entry.countsNowhere')}`), ...replaced])
  }
  if (newest.version > version) {
    const params = { version, newest: newest.version, code: formatCheckCode(newest.digest) }
    notices.push([...bold(say(state === 'withdrawn' ? 'entry.olderWithdrawn' : 'entry.older', params)), ...plain(` ${say('entry.newest', params)}`)])
  }
  return notices
}
