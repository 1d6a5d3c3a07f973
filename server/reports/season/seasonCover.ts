import { formatCheckCode } from '../../../shared/evidence/checkCode.ts'
import { certificatesDuring, type CertificateRun } from '../../../shared/season/certificateRuns.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { addElement, type Element } from '../parts/canvas.ts'
import { drawDoubleRule } from '../parts/drawRules.ts'
import { drawFacts, type Fact } from '../parts/factsList.ts'
import type { Flow } from '../parts/pageFlow.ts'
import { drawParagraph } from '../parts/paragraph.ts'
import { drawText, measureText } from '../parts/setText.ts'
import { ELDER, STYLES } from '../parts/styles.ts'
import type { SeasonReportData } from '../seasonReportData.ts'
import type { SeasonWords } from './seasonWords.ts'

const TITLE = { ...STYLES.stamp, size: 34, leading: 38, color: ELDER }
/** So many numbers of withdrawn records are named on the cover. */
const MOST_NAMED = 12

/** A title as large as a number, with words at its right, over the double rule. */
export function drawSeasonTitle(flow: Flow, part: Element, title: string, beside: readonly string[]): void {
  const { canvas } = flow
  const { left, right, width } = canvas.frame
  addElement(canvas, part, 'H1', () => drawText(canvas, title, { x: left - 1, y: flow.y }, TITLE))
  beside.forEach((text, index) => {
    const style = index === 0 ? STYLES.bodyBold : STYLES.body
    addElement(canvas, part, 'P', () => drawText(canvas, text, { x: right - measureText(canvas, text, style), y: flow.y + 10 + index * style.leading }, style))
  })
  flow.y += TITLE.leading + 4
  flow.y += drawDoubleRule(canvas, { x: left, y: flow.y, width }, [2.2, 0.6]) + 8
}

/** The cover: whose season, what was counted, up to which entry; what it is and what it is not. */
export function drawSeasonCover(flow: Flow, part: Element, data: SeasonReportData, words: SeasonWords): void {
  const { say } = words
  const { volume, volumes, season } = data
  const { left, width } = flow.canvas.frame
  drawSeasonTitle(flow, part, say('title', { season }), volumes === 1 ? [] : [say('volume', { volume, volumes })])
  drawFacts(flow, part, { facts: [...farmFacts(data, words), ...countFacts(data, words), ...codeFacts(data, words)], box: { x: left, width, labelWidth: 120 } })
  flow.y += 10
  if (data.rows.length === 0) drawParagraph(flow, part, say('empty'), STYLES.head)
}

function farmFacts({ farm, certificates, isRunning, span, printedAt }: SeasonReportData, words: SeasonWords): Fact[] {
  const { say, day } = words
  const today = civilDateIn(farm.zone, printedAt)
  const days = { from: day(span.from), to: day(span.to) }
  return [
    fact(say('cover.farm'), farm.name),
    ...certificateFacts(certificatesDuring(certificates, { from: span.from, to: isRunning && today >= span.from ? today : span.to }), words),
    fact(say('cover.season'), isRunning ? say('cover.seasonOn', { ...days, today: day(today) }) : say('cover.seasonText', days)),
    fact(say('cover.zone'), say('cover.zoneText', { zone: farm.zone })),
  ]
}

/** The certificates that were in force during the season, as the farm wrote them down; when each runs out is said with it. */
function certificateFacts(runs: readonly CertificateRun[], { say, day }: SeasonWords): Fact[] {
  if (runs.length === 0) return [fact(say('cover.certificate'), say('cover.noCertificate'))]
  return runs.flatMap(({ certificate: { number, body, scope }, from, until }, index) => {
    const days = [...(from === null ? [] : [say('cover.validFrom', { day: day(from) })]), until === null ? say('cover.noExpiry') : say('cover.expires', { day: day(until) })]
    return [
      fact(say('cover.certificate'), say('cover.certificateText', { number, body, days: days.join(', ') })),
      // Said once of those that cover the same.
      ...(scope === null || runs[index + 1]?.certificate.scope === scope ? [] : [fact(say('cover.scope'), scope)]),
    ]
  })
}

function countFacts({ figures }: SeasonReportData, { say, count, day, figure }: SeasonWords): Fact[] {
  const { signed, first, last, withdrawn, from, to, litres, kg } = figures
  const area = say('cover.totalsText', { areaHa: figure(figures.areaHa, 2), litres: figure(litres, 0) })
  const named = withdrawn.slice(0, MOST_NAMED).join(', ')
  return [
    fact(say('cover.records'), first === null || last === null ? say('cover.noRecords') : say('cover.recordsText', { signed: count(signed), first, last })),
    fact(say('cover.withdrawn'), withdrawn.length === 0 ? say('cover.noneWithdrawn') : say(withdrawn.length > MOST_NAMED ? 'cover.withdrawnMore' : 'cover.withdrawnText', { count: count(withdrawn.length), numbers: named })),
    ...(from === null || to === null ? [] : [fact(say('cover.work'), say('cover.workText', { from: day(from), to: day(to) }))]),
    fact(say('cover.totals'), /[1-9]/.test(kg) ? say('cover.totalsKg', { totals: area, kg: figure(kg, 0) }) : area),
  ]
}

function codeFacts({ head }: SeasonReportData, { say, count }: SeasonWords): Fact[] {
  return [
    fact(say('cover.head'), head === null ? say('cover.noHead') : say('cover.headText', { code: formatCheckCode(head.digest), seq: count(head.seq) })),
    fact(say('cover.contents'), say('cover.contentsText')),
  ]
}

const fact = (label: string, text: string): Fact => ({ label, spans: [{ text, style: STYLES.body }] })
