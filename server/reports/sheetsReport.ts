import type { Writable } from 'node:stream'
import { addElement, openCanvas } from './parts/canvas.ts'
import { backTo, startFlow, turnPage } from './parts/pageFlow.ts'
import { drawFirstFoot, drawLaterFoot, footHeights, type PageFoot } from './parts/pageFoot.ts'
import { drawRunningHead, headHeight, type RunningHead } from './parts/runningHead.ts'
import { drawRecord, recordFoot, recordHead } from './recordReport.ts'
import { openSeasonWords } from './season/seasonWords.ts'
import type { SheetsReportData } from './seasonReportData.ts'

interface Sheet { from: number; to: number; head: RunningHead; foot: PageFoot }

/** Draws the sheets of a volume's records one after the other, each with its own head, check code and QR code, over one count of pages. */
export function sheetsReport(data: SheetsReportData, stream: Writable): void {
  const { farm, language, season, volume, volumes, records } = data
  const { say } = openSeasonWords(data)
  const title = volumes === 1 ? say('sheets.title', { season }) : say('sheets.volume', { season, volume, volumes })
  const canvas = openCanvas({ title: `${farm.name}, ${title}`, subject: title, keywords: '', createdAt: data.printedAt, language }, stream)
  const sheets: Sheet[] = []
  let flow: ReturnType<typeof startFlow> | null = null
  for (const record of records) {
    const foot = recordFoot(record)
    const head = recordHead(record)
    const heights = footHeights(canvas, foot)
    const height = headHeight(canvas, head)
    if (flow === null) {
      flow = startFlow(canvas, heights, height)
    } else {
      flow.footHeights = heights
      flow.headHeight = height
      turnPage(flow)
      flow.firstPage = flow.pages
    }
    const from = flow.pages
    drawRecord(flow, record)
    sheets.push({ from, to: flow.pages, head, foot })
  }
  const part = addElement(canvas, canvas.root, 'Sect')
  const pages = flow?.pages ?? 0
  for (const { from, to, head, foot } of sheets) {
    for (let page = from; page <= to; page += 1) {
      if (flow) backTo(flow, page)
      drawRunningHead(canvas, { ...head, register: title })
      const own = { ...foot, pageWord: () => say('page', { page, pages }) }
      if (page === from) drawFirstFoot(canvas, part, { foot: own, pages })
      else drawLaterFoot(canvas, { foot: own, page, pages })
    }
  }
  canvas.doc.end()
}
