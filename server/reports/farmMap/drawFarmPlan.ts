import { SITE_MARKS } from '../../../shared/geo/siteMarks.ts'
import { formatHectares, formatNumber } from '../../../shared/units/formatQuantity.ts'
import type { FarmMapData } from '../farmMapReportData.ts'
import { addElement, type Canvas, type Element } from '../parts/canvas.ts'
import { drawGround } from '../parts/drawGround.ts'
import { nameSurroundings, writeAt, writeBlock } from '../parts/planLabels.ts'
import { fitPlan, type PlanBox } from '../parts/planScale.ts'
import { toPageLines, toPageRings, tracePath } from '../parts/planShapes.ts'
import type { Drawing } from '../parts/planTypes.ts'
import { drawScaleFoot, SCALE_FOOT_HEIGHT } from '../parts/scaleFoot.ts'
import { measureText } from '../parts/setText.ts'
import { ELDER, STYLES } from '../parts/styles.ts'
import type { Say } from '../register/say.ts'
import { drawMapKey } from './drawMapKey.ts'
import { nameMarks } from './nameMarks.ts'
import type { PlanGround } from './planGround.ts'

const WHITE = 0.025
const MARK = 10
const OUTSIDE = { ...STYLES.small, size: 6.5, leading: 7.5, weight: 'bold', color: ELDER } as const

type Site = FarmMapData['sites'][number]
interface FarmPlan { data: FarmMapData; ground: PlanGround; frame: PlanBox; say: Say }

/** Draws the farm to scale in its frame, north up, with key, scale bar and north arrow under it. */
export function drawFarmPlan(canvas: Canvas, parent: Element, { data, ground, frame, say }: FarmPlan): void {
  const { language } = data
  const view = fitPlan(ground.whole, frame, WHITE)
  const drawing: Drawing = { canvas, frame, view, origin: ground.whole.origin }
  const denominator = formatNumber(view.denominator, {}, language)
  const bbox: [number, number, number, number] = [frame.x, frame.y, frame.x + frame.width, frame.y + frame.height + SCALE_FOOT_HEIGHT]
  addElement(canvas, parent, 'Figure', () => {
    const { doc } = canvas
    doc.save().rect(frame.x, frame.y, frame.width, frame.height).clip()
    drawGround(drawing, data.ground)
    drawBlocks(drawing, data)
    drawSites(drawing, data, ground)
    nameAll(drawing, data, say)
    doc.restore()
    doc.lineWidth(0.6).rect(frame.x, frame.y, frame.width, frame.height).stroke('#000000')
    drawScaleFoot(canvas, { view, frame, words: { scale: say('scale', { denominator }), north: say('north') }, language })
    drawMapKey(canvas, { data, frame, say })
  }, { alt: altOf(data, say, denominator), bbox, placement: 'Block' })
}

function drawBlocks(drawing: Drawing, { blocks }: FarmMapData): void {
  const { canvas } = drawing
  for (const { geometry } of blocks) {
    const rings = toPageRings(geometry, drawing)
    tracePath(canvas, rings, { closes: true })
    canvas.doc.fill('#FFFFFF', 'even-odd')
    canvas.doc.lineJoin('miter').lineWidth(1.1)
    tracePath(canvas, rings, { closes: true })
    canvas.doc.stroke(ELDER)
  }
}

function drawSites(drawing: Drawing, { sites }: FarmMapData, { rings }: PlanGround): void {
  const { canvas } = drawing
  const { doc } = canvas
  for (const ring of rings) {
    if (ring === null) continue
    doc.lineWidth(0.8).dash(3.2, { space: 2.2 })
    tracePath(canvas, toPageRings(ring, drawing), { closes: true })
    doc.stroke('#000000').undash()
  }
  for (const { kind, geometry } of sites) {
    const [x, y] = geometry.type === 'Point' ? (toPageLines(geometry, drawing)[0]?.[0] ?? [0, 0]) : [Number.NaN, 0]
    if (Number.isNaN(x)) continue
    for (const [width, color] of [[4.4, '#FFFFFF'], [1.7, '#000000']] as const) {
      doc.save().translate(x - MARK / 2, y - MARK / 2).scale(MARK / 16).lineWidth(width).path(SITE_MARKS[kind]).stroke(color).restore()
    }
  }
}

function nameAll(drawing: Drawing, data: FarmMapData, say: Say): void {
  const { blocks, ground, sites, language } = data
  const own = new Set(sites.map(({ name }) => name))
  const withDistance = ({ name, keepClearM }: Site): string => (keepClearM === null ? name : say('siteDistance', { name, metres: formatNumber(keepClearM, {}, language) }))
  nameSurroundings(drawing, {
    neighbours: [],
    sites: [
      ...ground.flatMap(({ kind, name, geometry }) => (name === null || own.has(name) ? [] : [{ kind, name, geometry }])),
      ...sites.flatMap((site) => (site.geometry.type === 'Point' ? [] : [{ kind: site.kind, geometry: site.geometry, name: withDistance(site) }])),
    ],
  })
  nameMarks(drawing, data, withDistance)
  for (const { code, areaM2, geometry } of blocks) {
    const notes = [say('area', { hectares: formatHectares(areaM2, language) })]
    if (!writeBlock(drawing, { code, notes, geometry, treated: [] }, { isAlone: false })) writeOver(drawing, code, toPageRings(geometry, drawing))
  }
}

/** The code over a block that has no room for it. */
function writeOver({ canvas }: Drawing, code: string, rings: readonly (readonly [number, number])[][]): void {
  const [xs, ys] = [rings.flat().map(([x]) => x), rings.flat().map(([, y]) => y)]
  const x = (Math.min(...xs) + Math.max(...xs)) / 2
  writeAt(canvas, { x, y: Math.min(...ys) - OUTSIDE.leading / 2 - 1, width: measureText(canvas, code, OUTSIDE) }, [{ text: code, style: OUTSIDE }])
}

function altOf({ farm, blocks, sites, language }: FarmMapData, say: Say, denominator: string): string {
  const blockWords = blocks.map(({ code, areaM2 }) => `${code} ${say('area', { hectares: formatHectares(areaM2, language) })}`)
  const siteWords = sites.map(({ name, keepClearM }) => (keepClearM === null ? name : say('siteDistance', { name, metres: formatNumber(keepClearM, {}, language) })))
  const list = (words: readonly string[]): string => (words.length === 0 ? say('altNone') : words.join('; '))
  return say('alt', { farm: farm.name, denominator, blocks: list(blockWords), sites: list(siteWords) })
}
