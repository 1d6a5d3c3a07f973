import { formatCheckCode } from '../../../shared/evidence/checkCode.ts'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import { translate } from '../../../shared/messages/translate.ts'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'
import { formatNumber } from '../../../shared/units/formatQuantity.ts'
import { certificateLine } from '../parts/certificateLine.ts'
import type { PageFoot } from '../parts/pageFoot.ts'
import type { RunningHead } from '../parts/runningHead.ts'
import type { SeasonReportData } from '../seasonReportData.ts'

/** Words and figures of a season's report in its language. */
export interface SeasonWords {
  say(id: string, params?: Record<string, string | number>, plural?: number): string
  day(civilDate: string): string
  count(value: number): string
  figure(value: string, digits: number): string
}

export function openSeasonWords({ language }: Pick<SeasonReportData, 'language'>): SeasonWords {
  return {
    say: (id, params = {}, plural) => translate(language, `seasonPrint.${id}`, params, plural),
    day: (civilDate) => formatDay(language, civilDate).replaceAll(' ', '\u00a0'),
    count: (value) => formatNumber(value, { digits: 0 }, language),
    figure: (value, digits) => formatNumber(value, { digits }, language),
  }
}

/** What stands at the head and the foot of every page; `hasCode` where the first page bears the QR code. */
export function seasonFrames(data: SeasonReportData, { say, count, day }: SeasonWords, document: string): { head: RunningHead; foot: PageFoot; hasCode: boolean } {
  const { farm, season, isRunning, head, printedAt, figures: { from, to }, checkPage, checkUrl } = data
  const code = head === null ? '' : formatCheckCode(head.digest)
  const work = from === null || to === null ? null : { from, to }
  const moment = `${day(civilDateIn(farm.zone, printedAt))}, ${civilTimeIn(farm.zone, printedAt)}`
  return {
    hasCode: checkUrl !== null,
    head: { farm: farm.name, register: say(isRunning ? 'runningOn' : 'running', { season }), document, certificate: certificateLine(data, work) },
    foot: {
      checkUrl: checkUrl ?? '', qrAlt: say('qrAlt', { url: checkUrl ?? '' }), shows: say('shows'),
      codeLabel: '', codeText: head === null ? say('footNone') : say('footText', { seq: count(head.seq), code, page: checkPage }),
      codeShort: head === null ? say('footNone') : say('foot', { seq: count(head.seq), code }),
      printed: say('printed', { moment }), pageWord: (page, pages) => say('page', { page, pages }),
    },
  }
}
