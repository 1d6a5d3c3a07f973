import type { Writable } from 'node:stream'
import { formatDay } from '../../shared/messages/formatDay.ts'
import { translate } from '../../shared/messages/translate.ts'
import { civilDateIn, civilTimeIn } from '../../shared/time/civilDate.ts'
import { addElement, openCanvas, type Canvas } from './parts/canvas.ts'
import { certificateLine, workDays } from './parts/certificateLine.ts'
import { drawLedgerTable } from './parts/ledgerTable.ts'
import { startFlow } from './parts/pageFlow.ts'
import { drawLaterFoot, type LaterFoot } from './parts/pageFoot.ts'
import { drawRunningHead, headHeight, type RunningHead } from './parts/runningHead.ts'
import { drawRegisterCover } from './register/registerCover.ts'
import { registerTable } from './register/registerTable.ts'
import type { Say } from './register/say.ts'
import type { RegisterReportData } from './registerReportData.ts'

/** The rule, the white over it and one line. */
const FOOT = 25.25

/** Draws a volume of the register into a stream. The same data gives the same bytes. */
export function registerReport(data: RegisterReportData, stream: Writable): void {
  const { farm, language, volume, volumes } = data
  const say: Say = (id, params = {}, plural) => translate(language, `registerPrint.pdf.${id}`, params, plural)
  const title = volumes === 1 ? `${say('title')}, ${seasonWords(data, say)}` : `${say('title')}, ${seasonWords(data, say)}: ${say('volume', { volume, volumes })}`
  const canvas = openCanvas({ title: `${farm.name}, ${title}`, subject: title, keywords: '', createdAt: data.printedAt, language, isLying: true }, stream)
  const work = workDays(farm.zone, data.rows.flatMap(({ startedAt, endedAt }) => [startedAt, endedAt]))
  const head: RunningHead = {
    farm: farm.name, register: seasonWords(data, say), document: volumes === 1 ? say('document') : say('volume', { volume, volumes }), certificate: certificateLine(data, work),
  }
  const flow = startFlow(canvas, { first: FOOT, later: FOOT }, headHeight(canvas, head))
  const part = addElement(canvas, canvas.root, 'Sect')
  drawRegisterCover(flow, part, { data, say, seasons: seasonWords(data, say) })
  if (data.rows.length > 0) drawLedgerTable(flow, part, registerTable(canvas, data, say))
  drawFrames(canvas, data, { head, say, pages: flow.pages })
  canvas.doc.end()
}

function seasonWords({ filter }: RegisterReportData, say: Say): string {
  return filter.season === undefined ? say('allSeasons') : say('season', { season: filter.season })
}

/** Running heads and feet, drawn last because only then the number of pages is known. */
function drawFrames(canvas: Canvas, data: RegisterReportData, { head, say, pages }: { head: RunningHead; say: Say; pages: number }): void {
  const { language, farm, printedAt, checkPage } = data
  const moment = `${formatDay(language, civilDateIn(farm.zone, printedAt))}, ${civilTimeIn(farm.zone, printedAt)}`
  const foot: LaterFoot = {
    codeLabel: '', codeShort: say('foot', { page: checkPage }), printed: say('printed', { moment }),
    pageWord: (page, all) => translate(language, 'pdf.running.page', { page, pages: all }),
  }
  for (let page = 1; page <= pages; page += 1) {
    canvas.doc.switchToPage(page - 1)
    drawRunningHead(canvas, head)
    drawLaterFoot(canvas, { foot, page, pages })
  }
}
