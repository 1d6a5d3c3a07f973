import type { Writable } from 'node:stream'
import { formatDay } from '../../shared/messages/formatDay.ts'
import { translate } from '../../shared/messages/translate.ts'
import { totalAreaM2 } from '../../shared/geo/totalAreaM2.ts'
import { civilDateIn, civilTimeIn } from '../../shared/time/civilDate.ts'
import { formatHectares } from '../../shared/units/formatQuantity.ts'
import { drawFarmPlan } from './farmMap/drawFarmPlan.ts'
import { isLyingFarm, planGround } from './farmMap/planGround.ts'
import { blockTable, siteTable } from './farmMap/mapTables.ts'
import type { FarmMapData } from './farmMapReportData.ts'
import { addElement, openCanvas, type Canvas, type Element } from './parts/canvas.ts'
import { drawDoubleRule } from './parts/drawRules.ts'
import { drawLedgerTable, type Table } from './parts/ledgerTable.ts'
import { ensureRoom, roomLeft, startFlow, turnPage, type Flow } from './parts/pageFlow.ts'
import { drawLaterFoot } from './parts/pageFoot.ts'
import { drawRunningHead } from './parts/runningHead.ts'
import { SCALE_FOOT_HEIGHT } from './parts/scaleFoot.ts'
import { drawSectionHead, sectionHeadHeight } from './parts/sectionHead.ts'
import { drawText, measureText } from './parts/setText.ts'
import { ELDER, STYLES } from './parts/styles.ts'
import type { Say } from './register/say.ts'

/** The rule, the white over it and one line. */
const FOOT = 25.25
const TITLE = { ...STYLES.stamp, size: 24, leading: 28, color: ELDER }
/** Room for a section's head and its first rows. */
const FEW_ROWS = 70

/** Draws the map of a farm into a stream: one page of map, the way of the farm's shape, and tables. The same data gives the same bytes. */
export function farmMapReport(data: FarmMapData, stream: Writable): void {
  const { farm, language, paper } = data
  const say: Say = (id, params = {}, plural) => translate(language, `mapPrint.${id}`, params, plural)
  const ground = planGround(data)
  const canvas = openCanvas({
    title: `${farm.name}, ${say('title')}`, subject: say('subject'), keywords: '', createdAt: data.printedAt, language, paper, isLying: isLyingFarm(ground, paper),
  }, stream)
  const flow = startFlow(canvas, { first: FOOT, later: FOOT })
  const part = addElement(canvas, canvas.root, 'Sect')
  drawTitle(flow, part, { data, say })
  if (ground === null) addElement(canvas, part, 'P', () => drawText(canvas, say('nothing'), { x: canvas.frame.left, y: flow.y }, STYLES.head))
  else {
    const frame = { x: canvas.frame.left, y: flow.y, width: canvas.frame.width, height: roomLeft(flow) - SCALE_FOOT_HEIGHT }
    drawFarmPlan(canvas, part, { data, ground, frame, say })
    turnPage(flow)
    if (data.blocks.length > 0) drawSection(flow, part, say('blocks'), blockTable(canvas, data, say))
    flow.y += 12
    drawSites(flow, part, { data, say })
  }
  drawFrames(canvas, data, { say, pages: flow.pages })
  canvas.doc.end()
}

function drawTitle(flow: Flow, part: Element, { data, say }: { data: FarmMapData; say: Say }): void {
  const { canvas } = flow
  const { left, right, width } = canvas.frame
  const { blocks, language } = data
  addElement(canvas, part, 'H1', () => drawText(canvas, say('title'), { x: left - 1, y: flow.y }, TITLE))
  const beside = blocks.length === 0 ? say('none') : say('count', { count: blocks.length, area: formatHectares(totalAreaM2(blocks), language) }, blocks.length)
  addElement(canvas, part, 'P', () => drawText(canvas, beside, { x: right - measureText(canvas, beside, STYLES.method), y: flow.y + 11 }, STYLES.method))
  flow.y += TITLE.leading + 2
  flow.y += drawDoubleRule(canvas, { x: left, y: flow.y, width }, [2.2, 0.6]) + 8
}

function drawSites(flow: Flow, part: Element, { data, say }: { data: FarmMapData; say: Say }): void {
  const { canvas } = flow
  if (data.sites.length > 0) return drawSection(flow, part, say('sites'), siteTable(canvas, data, say))
  ensureRoom(flow, FEW_ROWS)
  drawHead(flow, part, say('sites'))
  addElement(canvas, part, 'P', () => drawText(canvas, say('sitesNone'), { x: canvas.frame.left, y: flow.y + 3 }, STYLES.body))
}

function drawSection(flow: Flow, part: Element, title: string, table: Table): void {
  ensureRoom(flow, FEW_ROWS)
  drawHead(flow, part, title)
  drawLedgerTable(flow, part, table)
}

function drawHead(flow: Flow, part: Element, title: string): void {
  const { canvas } = flow
  const head = { title, x: canvas.frame.left, y: flow.y, width: canvas.frame.width }
  drawSectionHead(canvas, part, head)
  flow.y += sectionHeadHeight(canvas, head)
}

/** Running heads and feet, drawn last because only then the number of pages is known. */
function drawFrames(canvas: Canvas, { farm, language, printedAt }: FarmMapData, { say, pages }: { say: Say; pages: number }): void {
  const day = formatDay(language, civilDateIn(farm.zone, printedAt))
  const foot = {
    codeLabel: '', codeShort: say('foot'), printed: say('printed', { moment: `${day}, ${civilTimeIn(farm.zone, printedAt)}` }),
    pageWord: (page: number, all: number) => translate(language, 'pdf.running.page', { page, pages: all }),
  }
  for (let page = 1; page <= pages; page += 1) {
    canvas.doc.switchToPage(page - 1)
    drawRunningHead(canvas, { farm: farm.name, register: day, document: say('title') })
    drawLaterFoot(canvas, { foot, page, pages })
  }
}
