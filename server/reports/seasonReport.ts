import type { Writable } from 'node:stream'
import { translate } from '../../shared/messages/translate.ts'
import { addElement, openCanvas } from './parts/canvas.ts'
import { drawLedgerTable } from './parts/ledgerTable.ts'
import { backTo, startFlow, turnTo } from './parts/pageFlow.ts'
import { drawFirstFoot, drawLaterFoot, footHeights } from './parts/pageFoot.ts'
import { drawRunningHead, headHeight } from './parts/runningHead.ts'
import { registerTable } from './register/registerTable.ts'
import type { Say } from './register/say.ts'
import { drawSummary } from './season/drawSummary.ts'
import { drawSeasonCover, drawSeasonTitle } from './season/seasonCover.ts'
import { openSeasonWords, seasonFrames } from './season/seasonWords.ts'
import type { SeasonReportData } from './seasonReportData.ts'

/** The rule, the white over it and one line. */
const FOOT = 25.25

/** Draws a volume of the season report into a stream: cover and summary standing, the register lying. The same data gives the same bytes. */
export function seasonReport(data: SeasonReportData, stream: Writable): void {
  const { farm, language, season, volume, volumes } = data
  const words = openSeasonWords(data)
  const { say } = words
  const title = volumes === 1 ? say('title', { season }) : `${say('title', { season })}: ${say('volume', { volume, volumes })}`
  const canvas = openCanvas({ title: `${farm.name}, ${title}`, subject: title, keywords: data.head?.digest ?? '', createdAt: data.printedAt, language }, stream)
  const { head, foot, hasCode } = seasonFrames(data, words, volumes === 1 ? say('document') : say('volume', { volume, volumes }))
  const flow = startFlow(canvas, { first: hasCode ? footHeights(canvas, foot).first : FOOT, later: FOOT }, headHeight(canvas, head))
  const part = addElement(canvas, canvas.root, 'Sect')
  drawSeasonCover(flow, part, data, words)
  if (data.blocks.length > 0) drawSummary(flow, part, data, words)
  if (data.rows.length > 0) {
    turnTo(flow, { isLying: true })
    drawSeasonTitle(flow, part, say('register'), volumes === 1 ? [] : [say('volume', { volume, volumes })])
    const sayRegister: Say = (id, params = {}, plural) => translate(language, `registerPrint.pdf.${id}`, params, plural)
    drawLedgerTable(flow, part, registerTable(canvas, data, sayRegister))
  }
  for (let page = 1; page <= flow.pages; page += 1) {
    backTo(flow, page)
    drawRunningHead(canvas, head)
    if (page === 1 && hasCode) drawFirstFoot(canvas, part, { foot, pages: flow.pages })
    else drawLaterFoot(canvas, { foot, page, pages: flow.pages })
  }
  canvas.doc.end()
}
